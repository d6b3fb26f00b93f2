import { LIMITERS } from '../../vocabulary';
import { SHUT, type SlotStates } from './judge';
import type { BestHours, Stretch } from './result';
import { BROKEN } from './roomSeries';
import { limiterCode } from './limit';
import { windowMinima } from './windows';

const SHORT = limiterCode('short');

/** Shuts, with limiter `short`, runs of workable slots in which the step cannot be finished. */
export function shutShortRuns(states: SlotStates, durationSlots: number): void {
	const { state, limiter, room } = states;
	let from = 0;
	for (let i = 0; i <= state.length; i++) {
		if (i < state.length && state[i] !== SHUT) continue;
		if (i > from && i - from < durationSlots) {
			state.fill(SHUT, from, i);
			limiter.fill(SHORT, from, i);
			room.fill(BROKEN, from, i);
		}
		from = i + 1;
	}
}

/**
 * The stretches of a step and the best start of all.
 *
 * @param firstStart - no start before this slot
 */
export function stretchesOf(
	states: SlotStates,
	durationSlots: number,
	firstStart: number
): { stretches: Stretch[]; best: BestHours | null; startRoom: Float64Array; bindsAt: Int32Array } {
	const { state, limiter, room } = states;
	const count = state.length;
	const rooms = new Float64Array(room);
	const leastRoom = new Float64Array(count);
	const leastAt = new Int32Array(count);
	const ends = new Int32Array(count);
	for (let i = 0; i < count; i++) ends[i] = Math.min(i + durationSlots, count);
	windowMinima(rooms, 0, ends, leastRoom, leastAt);

	const stretches: Stretch[] = [];
	let best: BestHours | null = null;
	let i = Math.max(0, firstStart);
	while (i < count) {
		if (state[i] === SHUT) {
			i++;
			continue;
		}
		let to = i;
		while (to < count && state[to] !== SHUT) to++;
		const lastStart = to - durationSlots;
		if (lastStart >= i) {
			let bestStart = i;
			for (let s = i + 1; s <= lastStart; s++)
				if (leastRoom[s] > leastRoom[bestStart]) bestStart = s;
			const stretchRoom = leastRoom[bestStart];
			stretches.push({ from: i, to, lastStart, bestStart, room: stretchRoom });
			if (best === null || stretchRoom > best.room) {
				best = {
					start: bestStart,
					finish: bestStart + durationSlots,
					room: stretchRoom,
					limiter: LIMITERS[limiter[leastAt[bestStart]]]
				};
			}
		}
		i = to;
	}
	return { stretches, best, startRoom: leastRoom, bindsAt: leastAt };
}
