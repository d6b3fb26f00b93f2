import { cureClock, progressAt } from '../../coating/cure';
import type { ClockSide } from '../../coating/curve';
import { asksNoWait, type TimeTable } from '../../coating/times';
import type { FaceConditions } from '../weather/slots';

/** Slots of a day, and of the days whose mean cycle stands for what lies past the forecast. */
const DAY = 96;
const LAST_DAYS = 3;
const MOST_DAYS = 2 * 365;

/** A cure clock on one side of a face, for starts anywhere: before the grid, on it, past the forecast. */
interface FaceClock {
	/** Progress at slot starts up to the forecast's end; one entry more than slots. */
	readonly progress: Float64Array;
	/** First slot of unknown temperature from each slot on; null where there is none. */
	readonly nextUnknown: Int32Array | null;
	/** Progress a slot before the grid: none for earliest clocks, the first day's most for latest ones. */
	readonly before: number;
	/** Progress from the forecast's end over the mean day of its last three, slot by slot; null without them. */
	readonly cycle: Float64Array | null;
	readonly side: ClockSide;
}

/** Progress within the mean cycle of the last days before a slot, beginning at that slot. */
function meanCycle(progress: Float64Array, unknown: Int32Array | null): Float64Array | null {
	const end = progress.length - 1;
	const days = Math.min(LAST_DAYS, Math.floor(end / DAY));
	if (days === 0) return null;
	if (unknown !== null && unknown[end - days * DAY] < end) return null;
	const cycle = new Float64Array(DAY + 1);
	for (let slot = 0; slot <= DAY; slot++) {
		for (let day = 1; day <= days; day++) {
			const first = end - day * DAY;
			cycle[slot] += (progress[first + slot] - progress[first]) / days;
		}
	}
	return cycle;
}

/** The clock of a table on a face's temperature. */
function faceClock(
	table: Exclude<TimeTable, null>,
	face: FaceConditions,
	temperature: Float64Array,
	side: ClockSide,
	curingMin: number
): FaceClock {
	const end = Math.min(face.weather.knownTo, temperature.length);
	const clock = cureClock(table, temperature, side, curingMin);
	const progress = clock.progress.subarray(0, end + 1);
	const unknown = clock.unknown !== null && clock.unknown[end] > 0 ? clock.unknown : null;
	let nextUnknown: Int32Array | null = null;
	if (unknown !== null) {
		nextUnknown = new Int32Array(end + 1).fill(end);
		for (let i = end - 1; i >= 0; i--)
			nextUnknown[i] = unknown[i + 1] > unknown[i] ? i : nextUnknown[i + 1];
	}
	let before = 0;
	if (side === 'latest')
		for (let i = 0; i < Math.min(DAY, end); i++)
			before = Math.max(before, progress[i + 1] - progress[i]);
	return { progress, nextUnknown, before, cycle: meanCycle(progress, nextUnknown), side };
}

/** Rounding of a sum of many slots. */
const ROUNDING = 1e-9;

/** Progress past the forecast's end at a position. */
function progressPast({ progress, cycle }: FaceClock, position: number): number {
	const end = progress.length - 1;
	if (cycle === null) return progress[end];
	const past = position - end;
	const days = Math.floor(past / DAY);
	return progress[end] + days * cycle[DAY] + progressAt(cycle, past - days * DAY);
}

/** Position past the forecast's end at which a progress is made; +Infinity where it never is. */
function positionPast({ progress, cycle }: FaceClock, target: number): number {
	const end = progress.length - 1;
	if (cycle === null || !(cycle[DAY] > 0)) return Infinity;
	const rest = target - progress[end];
	const days = Math.floor(rest / cycle[DAY]);
	if (days > MOST_DAYS) return Infinity;
	const inDay = rest - days * cycle[DAY];
	let slot = 0;
	while (slot < DAY - 1 && cycle[slot + 1] < inDay) slot++;
	const rate = cycle[slot + 1] - cycle[slot];
	return end + days * DAY + slot + (rate > 0 ? Math.min(1, (inDay - cycle[slot]) / rate) : 0);
}

/** Where clocks started at rising positions are done. */
function doneOn(clock: FaceClock, positions: Float64Array, isCarriedOn: boolean): Float64Array {
	const { progress, nextUnknown, before, side } = clock;
	const end = progress.length - 1;
	const done = new Float64Array(positions.length);
	let slot = 0;
	positions.forEach((position, k) => {
		const started =
			position < 0
				? position * before
				: position <= end
					? progressAt(progress, position)
					: progressPast(clock, position);
		const target = started + 1;
		if (target <= 0) {
			done[k] = position + 1 / before;
			return;
		}
		slot = Math.max(slot, Math.min(end, Math.max(0, Math.floor(position))));
		while (slot < end && progress[slot + 1] < target - ROUNDING) slot++;
		const unknown = nextUnknown?.[Math.min(end, Math.max(0, Math.floor(position)))] ?? end;
		if (unknown < Math.min(slot, end)) {
			// Nobody can tell: an earliest clock is never through, a latest one might be at once.
			done[k] = side === 'earliest' ? Infinity : Math.max(position, unknown);
		} else if (slot < end) {
			const rate = progress[slot + 1] - progress[slot];
			const part = rate > 0 ? Math.min(1, (target - progress[slot]) / rate) : 1;
			done[k] = Math.max(position, slot + part);
		} else done[k] = isCarriedOn ? positionPast(clock, target) : Infinity;
	});
	return done;
}

/** What a clock on several sides of a face is asked. */
export interface ClockQuestion {
	readonly table: TimeTable;
	readonly sides: readonly FaceConditions[];
	/** Which end of a window it counts to. */
	readonly side: ClockSide;
	/** Earliest clocks run on the shaded run, latest ones on the sunlit one, unless said. */
	readonly run?: 'shaded' | 'sunlit';
	/** °C under which earliest clocks stand still; −Infinity for none. */
	readonly curingMin: number;
	/** Past the forecast's end on the mean cycle of its last three days; else nothing is done there. */
	readonly isCarriedOn?: boolean;
}

/**
 * Where a property of a coat finished (or begun) at rising slot positions is reached, on the worst
 * of the sides: the last for an earliest clock, the first for a latest one. A table of null is no
 * limit: reached at once, and never passed. One of nought is reached at once. +Infinity: not within what is known.
 */
export function reachedAt(question: ClockQuestion, positions: Float64Array): Float64Array {
	const { table, sides, side, curingMin, isCarriedOn = false } = question;
	const isEarliest = side === 'earliest';
	if (isEarliest && asksNoWait(table)) return positions.slice();
	if (table === null) return new Float64Array(positions.length).fill(Infinity);
	const run = question.run ?? (isEarliest ? 'shaded' : 'sunlit');
	const worst = new Float64Array(positions.length).fill(isEarliest ? -Infinity : Infinity);
	for (const face of sides) {
		const temperature = run === 'shaded' ? face.surfaceShaded : face.surfaceSunlit;
		const clock = faceClock(table, face, temperature, side, isEarliest ? curingMin : -Infinity);
		doneOn(clock, positions, isCarriedOn).forEach((done, k) => {
			worst[k] = isEarliest ? Math.max(worst[k], done) : Math.min(worst[k], done);
		});
	}
	// Sums of many slots may fall back by a rounding; what is later is never through sooner.
	for (let k = 1; k < worst.length; k++)
		if (worst[k] < worst[k - 1] && worst[k - 1] - worst[k] < 1e-6) worst[k] = worst[k - 1];
	return worst;
}
