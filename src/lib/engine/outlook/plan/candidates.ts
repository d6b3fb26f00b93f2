import type { StepChances } from '../members/chances';
import type { StepHours } from '../hours/result';
import type { Candidates } from './chain';

/** Scores are whole numbers, so that sums of them are exact: a billionth of a logarithm's unit. */
const SCORE_UNIT = 1e9;

/** Score of k of n members: log((k + ½)/(n + 1)), in whole units. */
export function memberScore(k: number, n: number): number {
	return Math.round(Math.log((k + 0.5) / (n + 1)) * SCORE_UNIT);
}

type Starts = Omit<Candidates, 'ready'>;

/**
 * The starts a step may take: those whose whole duration is workable.
 *
 * @param firstStart - no start before this slot
 * @param duration - exact length of the work in slots; hours are taken in whole slots
 */
export function startsOf(
	hours: StepHours,
	chances: StepChances | null,
	firstStart: number,
	duration: number
): Starts {
	const { startRoom, durationSlots } = hours;
	const last = startRoom.length - durationSlots;
	const slots: number[] = [];
	for (let i = Math.max(0, firstStart); i <= last; i++) if (startRoom[i] >= 0) slots.push(i);
	const scores =
		chances === null
			? null
			: Float64Array.from({ length: chances.members + 1 }, (_, k) =>
					memberScore(k, chances.members)
				);
	const start = Float64Array.from(slots);
	return {
		start,
		finish: start.map((it) => it + duration),
		room: start.map((it) => startRoom[it]),
		score: start.map((it) => (scores === null || chances === null ? 0 : scores[chances.starts[it]]))
	};
}

/** The one start of a step that is fixed, at exact slot positions. It counts for no room or chance. */
export function fixedStart(start: number, finish: number): Starts {
	return {
		start: Float64Array.of(start),
		finish: Float64Array.of(finish),
		room: Float64Array.of(Infinity),
		score: Float64Array.of(0)
	};
}
