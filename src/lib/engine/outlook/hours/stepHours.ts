import { marked } from '../../coating/cure';
import {
	LIMITERS,
	STATES,
	STEP_FLAGS,
	type Limiter,
	type State,
	type StepFlag
} from '../../vocabulary';
import { errorSeries, type ErrorSeries } from './errors';
import { judge, SHUT, slotStates, type Judgement } from './judge';
import type { StepHours } from './result';
import { shutShortRuns, stretchesOf } from './stretches';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import type { Step, UsualErrors } from './step';

/** Version of what the engine computes; part of the key under which outlooks are kept. */
export const ENGINE_VERSION = '5';

const SLOT_MINUTES = SLOT_SECONDS / 60;

/** Slots a duration takes, rounded up to whole ones. */
export function durationSlotsOf(durationMinutes: number): number {
	return Math.max(1, Math.ceil(durationMinutes / SLOT_MINUTES - 1e-9));
}

export interface HoursOptions {
	/** Instead of the default usual errors of a forecast. */
	readonly usualErrors?: UsualErrors;
	/** Usual errors on each face, where members tell them; instead of those by lead. */
	readonly errors?: readonly ErrorSeries[];
	/** UTC epoch seconds; no start before it. */
	readonly from?: number;
}

/** The usual errors on each face: as given, else by lead. */
export function errorsOf(
	conditions: readonly FaceConditions[],
	{ errors, usualErrors }: HoursOptions
): readonly ErrorSeries[] {
	if (errors !== undefined) return errors;
	const byLead = errorSeries(conditions[0].weather, usualErrors);
	return conditions.map(() => byLead);
}

/** What a person must know of the workable slots from the first start on. */
function stepFlags(
	{ phases, weather: { knownTo } }: Judgement,
	state: Uint8Array,
	firstStart: number
): StepFlag[] {
	const flags = new Set<StepFlag>();
	for (const { wetEnds, setEnds, clocks } of phases) {
		for (let i = Math.max(0, firstStart); i < state.length; i++) {
			if (state[i] === SHUT) continue;
			if (setEnds[i] > knownTo && wetEnds[i] <= knownTo) flags.add('setPastEnd');
			for (const { clock, ends } of clocks) {
				const end = Math.min(ends[i], state.length, Math.max(knownTo, i + 1));
				if (marked(clock.extrapolated, i + 1, end)) flags.add('extrapolated');
				if (marked(clock.standstill, i + 1, end)) flags.add('standstill');
			}
		}
	}
	return STEP_FLAGS.filter((flag) => flags.has(flag));
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
	const judgement = judge(step, conditions, site, errorsOf(conditions, options));
	const states = slotStates(judgement);
	const durationSlots = durationSlotsOf(step.durationMinutes);
	shutShortRuns(states, durationSlots);
	const { grid } = judgement.weather;
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
