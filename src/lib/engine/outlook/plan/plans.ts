import { taskOf } from '../../coating/tasks/tasks';
import type { Job, JobStep } from '../job/job';
import type { StepOutlook } from '../job/stepOutlook';
import type { YardWeather } from '../weather/yardWeather';
import { abradingBefore, abradingPlaces, placeSets } from './abrading';
import type { Chain } from './chain';
import { planOf, type ChainStep } from './describe';
import { gapsOf } from './gaps';
import { chosenLaunch, positionOf } from './launch';
import { launchClosesAfter } from './launchReady';
import {
	bySoonest,
	bySurest,
	firstOutOfReach,
	soonest,
	surest,
	type PlanBounds,
	type RankedWay
} from './objectives';
import type { Plan, Plans } from './plan';
import { isCoat } from './planStep';

/** Starts that meet a launch at a slot position: not so early that a coat stands ashore too long. */
function launchAllows(steps: readonly ChainStep[], launch: number): (Uint8Array | null)[] {
	const last = steps.findLastIndex(({ outlook }) => isCoat(outlook.step.kind));
	// A launch among the steps has its own wait and end; without one the boat goes in at the slot.
	const launches = steps.some(({ outlook }) => outlook.step.kind === 'launch');
	return steps.map(({ outlook: { step, planStep } }, i) => {
		const { start, finish } = planStep.candidates;
		if (step.kind === 'launch') return Uint8Array.from(start, (it) => (it <= launch ? 1 : 0));
		if (i !== last || launches) return null;
		const closes = launchClosesAfter(step, planStep.faces, finish);
		return closes === null ? null : Uint8Array.from(closes, (it) => (it >= launch ? 1 : 0));
	});
}

interface Found {
	readonly steps: readonly ChainStep[];
	readonly way: RankedWay;
}

/** What a plan is ranked by, and the bounds it must keep. */
interface Wanted {
	readonly search: (chain: Chain, bounds: PlanBounds) => RankedWay | null;
	readonly order: (a: RankedWay, b: RankedWay) => number;
	readonly boundsOf: (steps: readonly ChainStep[]) => PlanBounds;
}

/**
 * The three plans of a job.
 *
 * @param outlooks - of the job's own steps
 * @param judge - judges a step that a plan puts in
 */
export function plansOf(
	yard: YardWeather,
	job: Job,
	outlooks: readonly StepOutlook[],
	judge: (step: JobStep) => StepOutlook
): Plans {
	const { grid } = yard.weather;
	const plain = outlooks.map((outlook, index): ChainStep => ({ index, outlook }));
	const chains = new Map<string, { steps: readonly ChainStep[]; chain: Chain }>();
	const chainWith = (places: readonly number[]) => {
		const key = places.join(' ');
		const before = chains.get(key);
		if (before !== undefined) return before;
		const steps = plain.flatMap((step) => {
			if (!places.includes(step.index)) return [step];
			const abrading = judge(abradingBefore(job.steps[step.index], taskOf('drySanding')));
			return [{ index: -1, outlook: abrading }, step];
		});
		const planSteps = steps.map(({ outlook }) => outlook.planStep);
		const made = {
			steps,
			chain: { steps: planSteps.map(({ candidates }) => candidates), gaps: gapsOf(planSteps) }
		};
		chains.set(key, made);
		return made;
	};
	const placesOfJob = abradingPlaces(job.steps);
	/** The best without abrading put in; failing that with the fewest, the best of those. */
	const find = ({ search, order, boundsOf }: Wanted): Found | null => {
		const bestOf = (level: readonly (readonly number[])[]): Found | null =>
			level
				.flatMap((places): Found[] => {
					const { chain, steps } = chainWith(places);
					const way = search(chain, boundsOf(steps));
					return way === null ? [] : [{ steps, way }];
				})
				.sort((a, b) => order(a.way, b.way))[0] ?? null;
		const without = bestOf([[]]);
		if (without !== null) return without;
		const { chain, steps } = chainWith([]);
		const bounds = boundsOf(steps);
		/** A way once the maxima before some coats are let go: what abrading can win at most. */
		const mayHelp = (places: readonly number[]): boolean => {
			const gaps = chain.gaps.filter(
				({ to, isMaximum }) => isMaximum !== true || !places.includes(to)
			);
			return firstOutOfReach({ steps: chain.steps, gaps }, bounds) === null;
		};
		for (const level of placeSets(placesOfJob, mayHelp)) {
			const found = bestOf(level);
			if (found !== null) return found;
		}
		return null;
	};
	const told = (wanted: Wanted): Plan | null => {
		const found = find(wanted);
		return found === null ? null : planOf(yard, found.steps, found.way, job.launch);
	};
	const free = (): PlanBounds => ({});
	const launch = chosenLaunch(job.launch);
	const position = launch === null ? null : positionOf(grid, launch);
	return {
		soonest: told({ search: soonest, order: bySoonest, boundsOf: free }),
		surest: told({ search: surest, order: bySurest, boundsOf: free }),
		byDate:
			position === null
				? null
				: told({
						search: surest,
						order: bySurest,
						boundsOf: (steps) => ({ readyBy: position, allowed: launchAllows(steps, position) })
					})
	};
}
