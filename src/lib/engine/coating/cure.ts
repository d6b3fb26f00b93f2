import { SLOT_SECONDS } from '../outlook/weather/slots';
import { logMinutesAt, outsideRows, timeCurve, type ClockSide } from './curve';
import { rateAt, type RateTable } from './rates';
import type { TimeTable } from './times';

const SLOT_MINUTES = SLOT_SECONDS / 60;

/**
 * A clock toward one property of a coat over a grid of quarter-hours: progress φ with
 * dφ/dt = 1/τ(Ts(t)), done at φ = 1. Additive in time as the equivalent age of ASTM C1074.
 */
export interface CureClock {
	/** Progress made from slot 0 to each slot's start; one entry more than slots. */
	readonly progress: Float64Array;
	/**
	 * Slots so far (as `progress`) whose temperature is unknown, outside the rows, standing still;
	 * null where there is none.
	 */
	readonly unknown: Int32Array | null;
	readonly extrapolated: Int32Array | null;
	readonly standstill: Int32Array | null;
}

/** Sums of a mark over the slots before each; null without a mark. */
function sumsOf(marks: Uint8Array | null): Int32Array | null {
	if (marks === null) return null;
	const sums = new Int32Array(marks.length + 1);
	for (let i = 0; i < marks.length; i++) sums[i + 1] = sums[i] + marks[i];
	return sums;
}

/** Whether a clock's mark lies in slots [from, to). */
export function marked(sums: Int32Array | null, from: number, to: number): boolean {
	return sums !== null && sums[to] > sums[from];
}

/** Clocks already run on a temperature: coats of one sheet on one face ask alike. */
const remembered = new WeakMap<Float64Array, Map<TimeTable, Map<string, CureClock>>>();

/**
 * The clock of a table over surface temperatures (°C per slot, NaN unknown), run once for the same
 * table and array.
 *
 * @param curingMin - °C under which earliest clocks stand still; −Infinity for none
 */
export function cureClock(
	table: Exclude<TimeTable, null>,
	surfaceTemperature: Float64Array,
	side: ClockSide,
	curingMin = -Infinity
): CureClock {
	const least = side === 'earliest' ? curingMin : -Infinity;
	const ofTemperature =
		remembered.get(surfaceTemperature) ?? new Map<TimeTable, Map<string, CureClock>>();
	remembered.set(surfaceTemperature, ofTemperature);
	const ofTable = ofTemperature.get(table) ?? new Map<string, CureClock>();
	ofTemperature.set(table, ofTable);
	const key = `${side} ${least}`;
	const clock = ofTable.get(key) ?? runClock(table, surfaceTemperature, side, least);
	ofTable.set(key, clock);
	return clock;
}

function runClock(
	table: Exclude<TimeTable, null>,
	surfaceTemperature: Float64Array,
	side: ClockSide,
	least: number
): CureClock {
	const count = surfaceTemperature.length;
	const curve = timeCurve(table);
	const constantRate =
		curve.kelvin.length === 1 ? SLOT_MINUTES * Math.exp(-curve.logMinutes[0]) : null;
	const progress = new Float64Array(count + 1);
	let unknown: Uint8Array | null = null;
	let extrapolated: Uint8Array | null = null;
	let standstill: Uint8Array | null = null;
	// A constant time on no curing minimum asks for no temperature.
	const needed = constantRate === null || least > -Infinity;
	for (let i = 0; i < count; i++) {
		const temperature = surfaceTemperature[i];
		let rate = 0;
		if (temperature !== temperature && needed) {
			unknown ??= new Uint8Array(count);
			unknown[i] = 1;
		} else {
			if (outsideRows(curve, temperature)) {
				extrapolated ??= new Uint8Array(count);
				extrapolated[i] = 1;
			}
			if (!(temperature < least))
				rate = constantRate ?? SLOT_MINUTES * Math.exp(-logMinutesAt(curve, temperature, side));
			if (rate === 0) {
				standstill ??= new Uint8Array(count);
				standstill[i] = 1;
			}
		}
		progress[i + 1] = progress[i] + rate;
	}
	return {
		progress,
		unknown: sumsOf(unknown),
		extrapolated: sumsOf(extrapolated),
		standstill: sumsOf(standstill)
	};
}

/**
 * Progress alone, by a table of rates: for the many members of an ensemble. At an unknown
 * temperature the rate is the coldest's; whoever asks marks such slots.
 */
export function cureProgress(
	rates: RateTable,
	surfaceTemperature: Float64Array,
	curingMin: number
): Float64Array {
	const count = surfaceTemperature.length;
	const progress = new Float64Array(count + 1);
	for (let i = 0; i < count; i++) {
		const temperature = surfaceTemperature[i];
		progress[i + 1] =
			progress[i] + (temperature < curingMin ? 0 : SLOT_MINUTES * rateAt(rates, temperature));
	}
	return progress;
}

/** Rounding of a sum of many slots; a clock this near to done is done. */
export const DONE = 1 - 1e-9;

/**
 * For every slot, the first slot whose start lies at or after the finish of a coat laid by that
 * slot's start: the coat is wet in [i, end). `count + 1` where the grid ends before it is done.
 */
export function finishSlots(progress: Float64Array): Int32Array {
	const last = progress.length - 1;
	const ends = new Int32Array(last + 1);
	let end = 0;
	for (let i = 0; i <= last; i++) {
		if (end < i) end = i;
		const target = progress[i] + DONE;
		while (end <= last && progress[end] < target) end++;
		ends[i] = end;
	}
	return ends;
}

/** Progress at a slot position (slots from the grid's start, fractions allowed). */
export function progressAt(progress: Float64Array, position: number): number {
	const last = progress.length - 1;
	const slot = Math.min(Math.floor(position), last - 1);
	return progress[slot] + (position - slot) * (progress[slot + 1] - progress[slot]);
}

/**
 * Exact finish of a clock started at a slot position (slots from the grid's start, fractions
 * allowed), as a slot position; null where the grid ends first.
 *
 * @param from - a slot at or before the finish, where the search begins; for callers that walk
 */
export function finishPosition(
	progress: Float64Array,
	startPosition: number,
	from = 0
): number | null {
	const last = progress.length - 1;
	if (startPosition < 0 || startPosition > last) return null;
	const target = progressAt(progress, startPosition) + 1;
	let slot = Math.max(Math.floor(startPosition), from);
	while (slot < last && progress[slot + 1] < target - (1 - DONE)) slot++;
	if (slot >= last) return null;
	const rate = progress[slot + 1] - progress[slot];
	const within = rate > 0 ? (target - progress[slot]) / rate : 1;
	return Math.max(startPosition, slot + Math.min(within, 1));
}
