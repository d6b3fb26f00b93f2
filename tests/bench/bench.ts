import { chainBench } from './chains';
import { listBench } from './lists';
import { stepBench } from './step';
import { yardBench } from './yard';

/** `npm run bench`: a step, chains, a full yard, its lists. The machine may be shared: ratios are what to compare. */
const print = (line: string): void => {
	process.stdout.write(`${line}\n`);
};
stepBench(print);
await chainBench(print);
yardBench(print);
await listBench(print);
