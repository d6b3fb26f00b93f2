import { STATES } from '../../vocabulary';
import type { StepHours } from '../hours/result';
import { workedSlots } from '../plan/candidates';

const SHUT = STATES.indexOf('shut');

/** Starts that a step keeps to (a launch its slots), in slot positions, with the exact length of its work. */
export interface KeptStarts {
	readonly starts: Float64Array;
	readonly duration: number;
}

/** Whether every slot of a work is workable. */
function goesThrough({ state }: StepHours, start: number, duration: number): boolean {
	const { first, end } = workedSlots(start, start + duration);
	return first >= 0 && end <= state.length && !state.subarray(first, end).includes(SHUT);
}

/** 1 for slots that are of use to a step: workable, and where it keeps to starts worked from one. */
export function usableSlots(hours: StepHours, kept: KeptStarts | null): Uint8Array {
	if (kept === null) return hours.state.map((state) => (state === SHUT ? 0 : 1));
	const usable = new Uint8Array(hours.state.length);
	for (const start of kept.starts) {
		if (!goesThrough(hours, start, kept.duration)) continue;
		const { first, end } = workedSlots(start, start + kept.duration);
		usable.fill(1, first, end);
	}
	return usable;
}

/** 1 for slots that a step would need from one of its starts; all of them where it keeps to none. */
export function neededSlots(count: number, kept: KeptStarts | null): Uint8Array {
	const needed = new Uint8Array(count).fill(kept === null ? 1 : 0);
	for (const start of kept?.starts ?? []) {
		const { first, end } = workedSlots(start, start + (kept?.duration ?? 0));
		needed.fill(1, Math.max(0, first), Math.max(0, end));
	}
	return needed;
}

/**
 * What a step may do next in [from, to): the first stretch that begins there, or the first start
 * it keeps to that can be gone through with; null without one. Slot positions.
 */
export function nextWork(
	hours: StepHours,
	kept: KeptStarts | null,
	from: number,
	to: number
): { readonly from: number; readonly to: number } | null {
	if (kept === null)
		return hours.stretches.find((stretch) => stretch.from >= from && stretch.from < to) ?? null;
	const start = kept.starts.find(
		(it) => it >= from && it < to && goesThrough(hours, it, kept.duration)
	);
	return start === undefined ? null : { from: start, to: start + kept.duration };
}
