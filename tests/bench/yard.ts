import { jobOutlook, yardWeather, type Job } from '../../src/lib/engine';
import { forecastOf, SAND, SITE, START } from './bay';
import { jobsOf } from './fleet';

/**
 * A full yard: every job's hours, chances and plans, job by job on one core. Prints time, memory,
 * time per slot and member, the ratio to bare `Math.exp`, and how the time grows with faces and
 * steps, with slots and with members.
 */
const FACES = 400;
const STEPS = 1_000;
const DAYS = 16;
const MEMBERS = 51;
const LAUNCH_AFTER_DAYS = 14;
const DAY = 86_400;

interface Size {
	readonly faces: number;
	readonly steps: number;
	readonly days: number;
	readonly members: number;
}

let planned = 0;

interface Took {
	/** Seconds on the clock, and of processor: what a shared machine takes away is in the first only. */
	readonly clock: number;
	readonly processor: number;
}

/** What the whole yard takes, its forecast and jobs at hand. */
function run({ faces, steps, days, members }: Size): Took {
	const forecast = forecastOf(days, members);
	const jobs = jobsOf(faces, steps).map((job): Job => ({
		...job,
		launch: { launchBy: START + LAUNCH_AFTER_DAYS * DAY, dayRate: 38 }
	}));
	const from = performance.now();
	const usage = process.cpuUsage();
	const yard = yardWeather({ site: { ...SITE }, forecast, looseSand: SAND });
	for (const job of jobs) {
		const { plans } = jobOutlook(yard, job, { from: START });
		if (plans.surest !== null) planned++;
	}
	const { user, system } = process.cpuUsage(usage);
	return { clock: (performance.now() - from) / 1000, processor: (user + system) / 1e6 };
}

/** Seconds of so many bare calls of Math.exp. */
function bareExp(calls: number): number {
	let sum = 0;
	const from = performance.now();
	for (let i = 0; i < calls; i++) sum += Math.exp(-(i % 4096) / 4096);
	const seconds = (performance.now() - from) / 1000;
	return sum > 0 ? seconds : NaN;
}

const megabytes = (): number => Math.round(process.memoryUsage().rss / 1e6);

export function yardBench(print: (line: string) => void): void {
	const full: Size = { faces: FACES, steps: STEPS, days: DAYS, members: MEMBERS };
	run({ ...full, faces: 60, steps: 150, members: 4 });
	const slots = DAYS * 96;
	print(`\nA yard: ${FACES} faces, ${STEPS} steps on two of them each, ${DAYS} days`);
	const alone = [1, 2, 3]
		.map(() => run({ ...full, members: 0 }))
		.sort((a, b) => a.processor - b.processor)[1];
	const told = ({ clock, processor }: Took): string =>
		`${clock.toFixed(2)} s, of processor ${processor.toFixed(2)} s`;
	print(
		`forecast alone                    ${told(alone)}, ${((alone.processor / (FACES * slots)) * 1e9).toFixed(0)} ns a face and slot, ${megabytes()} MB`
	);
	planned = 0;
	const all = run(full);
	const each = FACES * slots * MEMBERS;
	const exp = bareExp(each);
	print(
		`with ${MEMBERS} members                   ${told(all)}, ${((all.processor / each) * 1e9).toFixed(0)} ns a face, slot and member, ${(all.processor / exp).toFixed(1)} × one exp each, ${megabytes()} MB, ${planned} jobs planned`
	);
	const growth = (words: string, small: Size, large: Size, factor: number): void => {
		const ratio = run(large).processor / run(small).processor;
		print(
			`${words.padEnd(33)} ${ratio.toFixed(2)} × the time for ${factor} ×: exponent ${(Math.log(ratio) / Math.log(factor)).toFixed(2)}`
		);
	};
	const base: Size = { faces: 100, steps: 250, days: 8, members: 12 };
	growth('boats', base, { ...base, faces: 400, steps: 1_000 }, 4);
	growth('slots', { ...base, days: 4 }, { ...base, days: 16 }, 4);
	growth('members', base, { ...base, members: 48 }, 4);
}
