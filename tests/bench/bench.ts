import { chainBench } from './chains';
import { stepBench } from './step';
import { yardBench } from './yard';

/** `npm run bench`: a step, chains, a full yard. The machine may be shared: ratios are what to compare. */
const print = (line: string): void => {
	process.stdout.write(`${line}\n`);
};
stepBench(print);
await chainBench(print);
yardBench(print);
