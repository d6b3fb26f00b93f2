import { LIMITERS } from '../../vocabulary';
import type { StepOutlook } from '../job/stepOutlook';
import { SLOT_SECONDS } from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';
import { holdChance } from './hold';
import { nextBounds } from './inverse';
import { bindingStart } from './candidates';
import { instantAt, slipAt, slipOf, type LaunchWish } from './launch';
import { launchClosesAfter, launchReadyAfter } from './launchReady';
import type { RankedWay } from './objectives';
import type { LaunchReady, Plan, PlannedStep } from './plan';
import { isCoat } from './planStep';

/** A step of a chain, with its place in the job; −1 for one that the planner put in. */
export interface ChainStep {
	readonly index: number;
	readonly outlook: StepOutlook;
}

function plannedStep(
	{ index, outlook }: ChainStep,
	taken: number,
	{ weather: { grid } }: YardWeather
): PlannedStep {
	const { planStep, hours } = outlook;
	const { candidates, isFixed } = planStep;
	const start = candidates.start[taken];
	const finish = candidates.finish[taken];
	const next = nextBounds(planStep, { start, finish });
	return {
		step: index < 0 ? null : index,
		kind: outlook.step.kind,
		start: grid.start + start * SLOT_SECONDS,
		finish: grid.start + finish * SLOT_SECONDS,
		isFixed,
		room: isFixed ? null : candidates.room[taken],
		limiter: isFixed
			? null
			: LIMITERS[hours.limiter[hours.bindsAt[bindingStart(hours, start, finish)]]],
		earliestNext: instantAt(grid, next.earliest),
		latestNext: instantAt(grid, next.latest)
	};
}

function launchReadyOf(
	steps: readonly ChainStep[],
	starts: Int32Array,
	{ weather: { grid, knownTo } }: YardWeather
): LaunchReady & { readonly position: number } {
	let earliest = -Infinity;
	let latest = -Infinity;
	let closes = Infinity;
	steps.forEach(({ outlook: { step, planStep } }, i) => {
		const { faces, candidates } = planStep;
		const finish = candidates.finish.slice(starts[i], starts[i] + 1);
		earliest = Math.max(earliest, launchReadyAfter(step, faces, finish, 'sunlit')[0]);
		latest = Math.max(latest, candidates.ready[starts[i]]);
		const until = launchClosesAfter(step, faces, finish);
		// Each new coat begins its time ashore anew.
		if (isCoat(step.kind)) closes = until === null ? Infinity : until[0];
	});
	return {
		earliest: instantAt(grid, Math.min(earliest, latest)),
		latest: instantAt(grid, latest),
		isAssumed: latest > knownTo,
		closes: instantAt(grid, closes),
		position: latest
	};
}

const isLaunch = ({ outlook }: ChainStep): boolean => outlook.step.kind === 'launch';

/** Where the boat goes in: the start of its last launch. */
function launchedAt(steps: readonly ChainStep[], starts: Int32Array): number {
	const last = steps.findLastIndex(isLaunch);
	return steps[last].outlook.planStep.candidates.start[starts[last]];
}

/** A way through a chain told as a plan. */
export function planOf(
	yard: YardWeather,
	steps: readonly ChainStep[],
	way: RankedWay,
	wish: LaunchWish
): Plan {
	const { grid } = yard.weather;
	const { position, ...launchReady } = launchReadyOf(steps, way.starts, yard);
	const launches = steps.some(isLaunch);
	const held = steps.map(({ outlook: { chances, faces } }) => ({
		masks: chances?.masks ?? [],
		faces: yard.members.map((_, member) => faces.map((face) => face.members[member]))
	}));
	return {
		steps: steps.map((step, i) => plannedStep(step, way.starts[i], yard)),
		inserted: steps.filter(({ index }) => index < 0).length,
		room: Number.isFinite(way.room) ? way.room : null,
		holdChance: holdChance(
			steps.map(({ outlook }) => outlook.planStep),
			held,
			way.starts
		),
		launchReady,
		slip: launches
			? slipAt(wish, yard.site.timeZone, instantAt(grid, launchedAt(steps, way.starts)))
			: slipOf(wish, yard.site.timeZone, grid.start + position * SLOT_SECONDS)
	};
}
