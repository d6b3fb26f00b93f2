import type { StepChances } from '../members/chances';
import type { StepHours } from '../hours/result';
import { POSITION_ROUNDING, type Candidates } from './chain';

/** Scores are whole numbers, so that sums of them are exact: a billionth of a logarithm's unit. */
const SCORE_UNIT = 1e9;

/** Score of k of n members: log((k + ½)/(n + 1)), in whole units. */
export function memberScore(k: number, n: number): number {
	return Math.round(Math.log((k + 0.5) / (n + 1)) * SCORE_UNIT);
}

type Starts = Omit<Candidates, 'ready'>;

/** When and for how long a step may be worked, in slot positions. */
export interface StartRule {
	/** No start before it. */
	readonly notBefore: number;
	/** Exact length of the work; hours are taken in whole slots. */
	readonly duration: number;
	/** The only starts there are (a launch keeps to its slots), rising; null: every slot. */
	readonly only: Float64Array | null;
}

/** The starts a step may take: those whose whole duration is workable. */
export function startsOf(hours: StepHours, chances: StepChances | null, rule: StartRule): Starts {
	const scores =
		chances === null
			? null
			: Float64Array.from({ length: chances.members + 1 }, (_, k) =>
					memberScore(k, chances.members)
				);
	const { duration, only } = rule;
	const start = only === null ? everySlot(hours, rule) : theseSlots(hours, rule, only);
	const scoreAt = (it: number): number =>
		scores === null || chances === null
			? 0
			: scores[
					only === null
						? chances.starts[it]
						: membersThrough(chances, workedSlots(it, it + duration))
				];
	return {
		start,
		finish: start.map((it) => it + duration),
		room: start.map((it) => hours.startRoom[bindingStart(hours, it, it + duration)]),
		score: start.map(scoreAt)
	};
}

function everySlot({ startRoom, durationSlots }: StepHours, { notBefore }: StartRule) {
	const last = startRoom.length - durationSlots;
	const slots: number[] = [];
	for (let i = Math.max(0, Math.ceil(notBefore - POSITION_ROUNDING)); i <= last; i++)
		if (startRoom[i] >= 0) slots.push(i);
	return Float64Array.from(slots);
}

function theseSlots(
	hours: StepHours,
	{ notBefore, duration }: StartRule,
	only: Float64Array
): Float64Array {
	return only.filter((start) => {
		if (start < Math.max(0, notBefore) - POSITION_ROUNDING) return false;
		const finish = start + duration;
		if (workedSlots(start, finish).end > hours.startRoom.length) return false;
		return hours.startRoom[bindingStart(hours, start, finish)] >= 0;
	});
}

/** The slots that work between two positions touches: first, and one past the last. */
export function workedSlots(
	start: number,
	finish: number
): { readonly first: number; readonly end: number } {
	return {
		first: Math.floor(start + POSITION_ROUNDING),
		end: Math.ceil(finish - POSITION_ROUNDING)
	};
}

/**
 * The whole-slot start whose room is that of work between two positions. Work off the quarter-hour
 * may touch a slot more than its duration has: of the two starts that cover it the worse.
 */
export function bindingStart(
	{ startRoom, durationSlots }: StepHours,
	start: number,
	finish: number
): number {
	const { first, end } = workedSlots(start, finish);
	const second = end - durationSlots;
	return second > first && !(startRoom[second] >= startRoom[first]) ? second : first;
}

/** Members in which every slot of a work is workable. */
function membersThrough(
	{ masks }: StepChances,
	{ first, end }: { readonly first: number; readonly end: number }
): number {
	return masks.filter((mask) => !mask.subarray(first, end).includes(0)).length;
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
