import { LIMITERS, STATES, type Limiter, type State, type StepFlag } from '../../vocabulary';
import { judge, SHUT, slotStates, type JudgeOptions, type Judgement } from './judge';
import type { StepHours } from './result';
import { shutShortRuns, stretchesOf } from './stretches';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import type { Step } from './step';

/** Version of what the engine computes; part of the key under which outlooks are kept. */
export const ENGINE_VERSION = '1';

const SLOT_MINUTES = SLOT_SECONDS / 60;

/** Slots a duration takes, rounded up to whole ones. */
export function durationSlotsOf(durationMinutes: number): number {
	return Math.max(1, Math.ceil(durationMinutes / SLOT_MINUTES - 1e-9));
}

export interface HoursOptions extends JudgeOptions {
	/** UTC epoch seconds; no start before it. */
	readonly from?: number;
}

const PHASE_FLAGS = ['setPastEnd', 'extrapolated', 'standstill'] as const satisfies StepFlag[];

/** Whether a mask marks any workable slot from the first start on. */
function marksWorkable(mask: Uint8Array, state: Uint8Array, firstStart: number): boolean {
	for (let i = Math.max(0, firstStart); i < mask.length; i++)
		if (mask[i] === 1 && state[i] !== SHUT) return true;
	return false;
}

function stepFlags(judgement: Judgement, state: Uint8Array, firstStart: number): StepFlag[] {
	return PHASE_FLAGS.filter((flag) =>
		judgement.phases.some((phase) => marksWorkable(phase[flag], state, firstStart))
	);
}

/**
 * The hours of a step over the grid of its conditions: may a brush be moving in each slot, why
 * not, with how much room, and where it can be started and finished. With several faces the worse
 * binds.
 *
 * @param conditions - what each face meets; one at least, all on one weather
 */
export function stepHours(
	step: Step,
	conditions: readonly FaceConditions[],
	site: Site,
	options: HoursOptions = {}
): StepHours {
	const judgement = judge(step, conditions, site, options);
	const states = slotStates(judgement, conditions);
	const durationSlots = durationSlotsOf(step.durationMinutes);
	shutShortRuns(states, durationSlots);
	const { grid } = judgement;
	const firstStart =
		options.from === undefined ? 0 : Math.ceil((options.from - grid.start) / SLOT_SECONDS);
	return {
		...states,
		...stretchesOf(states, durationSlots, firstStart),
		flags: stepFlags(judgement, states.state, firstStart),
		durationSlots,
		silentDrying: judgement.silentDrying
	};
}

/** Slots [from, to) of one state and limiter. */
export interface HoursRun {
	readonly from: number;
	readonly to: number;
	readonly state: State;
	readonly limiter: Limiter;
}

/** The slots [from, to) as runs of equal state and limiter; open runs are one whatever has least room. */
export function runsOf(hours: StepHours, from: number, to: number): HoursRun[] {
	const runs: HoursRun[] = [];
	const open = STATES.indexOf('open');
	const limiterOf = (i: number): number => (hours.state[i] === open ? 0 : hours.limiter[i]);
	let start = from;
	for (let i = from + 1; i <= to; i++) {
		const ends =
			i === to || hours.state[i] !== hours.state[start] || limiterOf(i) !== limiterOf(start);
		if (!ends) continue;
		runs.push({
			from: start,
			to: i,
			state: STATES[hours.state[start]],
			limiter: LIMITERS[limiterOf(start)]
		});
		start = i;
	}
	return runs;
}
