import highsLoader from 'highs';
import { jobOutlook, yardWeather } from '../../src/lib/engine';
import { within, type Chain } from '../../src/lib/engine/outlook/plan/chain';
import { gapsOf } from '../../src/lib/engine/outlook/plan/gaps';
import { surest, type RankedWay } from '../../src/lib/engine/outlook/plan/objectives';
import { forecastOf, SAND, SITE, START } from './bay';
import { jobsOf } from './fleet';
import { median } from './median';

/**
 * The chain planner against every way tried and against an exact mixed-integer solver, on the same
 * chains: value in ratio, and time.
 */
const DAYS = 6;
const MEMBERS = 11;
const CHAINS = 12;
/** Ways beyond which trying them all is not waited for. */
const MOST_WAYS = 4_000_000;
const RUNS = 21;

function chainsOf(): Chain[] {
	const yard = yardWeather({
		site: { ...SITE },
		forecast: forecastOf(DAYS, MEMBERS),
		looseSand: SAND
	});
	return jobsOf(4 * CHAINS, 10 * CHAINS)
		.map((job) => {
			const { steps } = jobOutlook(yard, job, { from: START });
			const planSteps = steps.slice(0, 3).map(({ planStep }) => planStep);
			return { steps: planSteps.map((it) => it.candidates), gaps: gapsOf(planSteps) };
		})
		.filter((chain) => surest(chain) !== null)
		.slice(0, CHAINS);
}

/** Least room and score of the best way, every way tried; null where they are too many. */
function everyWay(chain: Chain): Pick<RankedWay, 'room' | 'score'> | null {
	if (chain.steps.reduce((ways, step) => ways * step.start.length, 1) > MOST_WAYS) return null;
	let best: Pick<RankedWay, 'room' | 'score'> | null = null;
	const taken: number[] = [];
	const go = (room: number, score: number): void => {
		const step = taken.length;
		if (step === chain.steps.length) {
			if (best === null || room > best.room || (room === best.room && score > best.score))
				best = { room, score };
			return;
		}
		const here = chain.steps[step];
		for (let k = 0; k < here.start.length; k++) {
			const holds = chain.gaps.every(
				({ from, to, earliest, latest }) =>
					to !== step || within(here.start[k], earliest[taken[from]], latest[taken[from]])
			);
			if (!holds) continue;
			taken.push(k);
			go(Math.min(room, here.room[k]), score + here.score[k]);
			taken.pop();
		}
	};
	go(Infinity, 0);
	return best;
}

/** The chain as a mixed-integer program in LP text: one binary a start, one row a start and gap. */
function program(chain: Chain, floor: number | null): string {
	const name = (step: number, k: number): string => `x${step}_${k}`;
	const rows: string[] = [];
	const binaries: string[] = [];
	const objective: string[] = [];
	chain.steps.forEach((step, i) => {
		const names = [...step.start].map((_, k) => name(i, k));
		binaries.push(...names);
		rows.push(`one${i}: ${names.join(' + ')} = 1`);
		if (floor === null)
			rows.push(
				`room${i}: ${[...step.room].map((room, k) => `${room} ${names[k]}`).join(' + ')} - r >= 0`
			);
		else {
			step.room.forEach((room, k) => {
				if (room < floor) rows.push(`shut${i}_${k}: ${names[k]} = 0`);
			});
			objective.push(...[...step.score].map((score, k) => `${score / 1e9} ${names[k]}`));
		}
	});
	chain.gaps.forEach(({ from, to, earliest, latest }, g) => {
		chain.steps[from].start.forEach((_, k) => {
			const after = [...chain.steps[to].start].flatMap((start, q) =>
				within(start, earliest[k], latest[k]) ? [name(to, q)] : []
			);
			rows.push(
				`gap${g}_${k}: ${[...after, `- ${name(from, k)}`].join(' + ').replaceAll('+ -', '-')} >= 0`
			);
		});
	});
	return [
		'Maximize',
		` obj: ${floor === null ? 'r' : objective.join(' + ').replaceAll('+ -', '- ')}`,
		'Subject To',
		...rows.map((row) => ` ${row}`),
		...(floor === null ? ['Bounds', ' 0 <= r <= 3'] : []),
		'Binary',
		` ${binaries.join(' ')}`,
		'End'
	].join('\n');
}

const milliseconds = (work: () => void): number => {
	const from = performance.now();
	work();
	return performance.now() - from;
};

export async function chainBench(print: (line: string) => void): Promise<void> {
	const highs = await highsLoader();
	const chains = chainsOf();
	print(`\n${chains.length} chains of three steps over ${DAYS} days`);
	let planner = 0;
	let solver = 0;
	let tried = 0;
	let plannerOfTried = 0;
	let worstRoom = 1;
	let worstScore = 1;
	let triedChains = 0;
	let triedRatio = 1;
	for (const chain of chains) {
		const own = surest(chain);
		if (own === null) continue;
		const took = median(RUNS, () => surest(chain));
		planner += took;
		let room = NaN;
		let score = NaN;
		solver += milliseconds(() => {
			room = highs.solve(program(chain, null)).ObjectiveValue;
			// A hair under, for the solver's own tolerance.
			score = highs.solve(program(chain, own.room)).ObjectiveValue;
		});
		worstRoom = Math.min(worstRoom, own.room / room);
		worstScore = Math.min(worstScore, Math.exp(own.score / 1e9 - score));
		let best: ReturnType<typeof everyWay> = null;
		const all = milliseconds(() => (best = everyWay(chain)));
		if (best !== null) {
			const { room: bestRoom, score: bestScore }: Pick<RankedWay, 'room' | 'score'> = best;
			triedChains++;
			tried += all;
			plannerOfTried += took;
			if (bestRoom !== own.room || bestScore !== own.score) triedRatio = NaN;
		}
	}
	print(
		`against the mixed-integer solver: least room ${worstRoom.toFixed(6)}, product of shares ${worstScore.toFixed(6)} of the solver’s at worst; ${(solver / planner).toFixed(0)} × the planner’s time (${(planner / chains.length).toFixed(2)} ms a chain)`
	);
	print(
		`against every way tried, ${triedChains} chains: value ${triedRatio.toFixed(6)}, ${(tried / plannerOfTried).toFixed(0)} × the planner’s time`
	);
}
