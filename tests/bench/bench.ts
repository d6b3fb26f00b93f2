import { stepBench } from './step';
import { yardBench } from './yard';

/** `npm run bench`: one step, then a full yard. The machine may be shared: ratios are what to compare. */
const print = (line: string): void => {
	process.stdout.write(`${line}\n`);
};
stepBench(print);
yardBench(print);
