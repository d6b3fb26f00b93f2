import { SLOT_SECONDS } from '../outlook/weather/slots';
import { logMinutesAt, outsideRows, timeCurve, type ClockSide } from './curve';
import type { TimeTable } from './times';

const SLOT_MINUTES = SLOT_SECONDS / 60;

/**
 * A clock toward one property of a coat over a grid of quarter-hours: progress φ with
 * dφ/dt = 1/τ(Ts(t)), done at φ = 1. Additive in time as the equivalent age of ASTM C1074.
 */
export interface CureClock {
	/** Progress made from slot 0 to each slot's start; one entry more than slots. */
	readonly progress: Float64Array;
	/** Slots so far (as `progress`) whose temperature is unknown, outside the rows, standing still. */
	readonly unknown: Int32Array;
	readonly extrapolated: Int32Array;
	readonly standstill: Int32Array;
}

/**
 * The clock of a table over surface temperatures (°C per slot, NaN unknown).
 *
 * @param curingMin - °C under which earliest clocks stand still; −Infinity for none
 */
export function cureClock(
	table: Exclude<TimeTable, null>,
	surfaceTemperature: Float64Array,
	side: ClockSide,
	curingMin = -Infinity
): CureClock {
	const count = surfaceTemperature.length;
	const curve = timeCurve(table);
	const constantRate =
		curve.kelvin.length === 1 ? SLOT_MINUTES * Math.exp(-curve.logMinutes[0]) : null;
	const progress = new Float64Array(count + 1);
	const unknown = new Int32Array(count + 1);
	const extrapolated = new Int32Array(count + 1);
	const standstill = new Int32Array(count + 1);
	// A constant time on no curing minimum asks for no temperature.
	const needed = constantRate === null || curingMin > -Infinity;
	for (let i = 0; i < count; i++) {
		const temperature = surfaceTemperature[i];
		const isKnown = temperature === temperature || !needed;
		const still = side === 'earliest' && temperature < curingMin;
		let rate = 0;
		if (isKnown && !still) {
			rate = constantRate ?? SLOT_MINUTES * Math.exp(-logMinutesAt(curve, temperature, side));
		}
		progress[i + 1] = progress[i] + rate;
		unknown[i + 1] = unknown[i] + (isKnown ? 0 : 1);
		extrapolated[i + 1] = extrapolated[i] + (isKnown && outsideRows(curve, temperature) ? 1 : 0);
		standstill[i + 1] = standstill[i] + (isKnown && rate === 0 ? 1 : 0);
	}
	return { progress, unknown, extrapolated, standstill };
}

/** Rounding of a sum of many slots; a clock this near to done is done. */
const DONE = 1 - 1e-9;

/**
 * For every slot, the first slot whose start lies at or after the finish of a coat laid by that
 * slot's start: the coat is wet in [i, end). `count + 1` where the grid ends before it is done.
 */
export function finishSlots(clock: CureClock): Int32Array {
	const last = clock.progress.length - 1;
	const ends = new Int32Array(last + 1);
	let end = 0;
	for (let i = 0; i <= last; i++) {
		if (end < i) end = i;
		while (end <= last && clock.progress[end] - clock.progress[i] < DONE) end++;
		ends[i] = end;
	}
	return ends;
}

/**
 * Exact finish of a clock started at a slot position (slots from the grid's start, fractions
 * allowed), as a slot position; null where the grid ends first.
 */
export function finishPosition(clock: CureClock, startPosition: number): number | null {
	const { progress } = clock;
	const last = progress.length - 1;
	const at = (position: number): number => {
		const slot = Math.min(Math.floor(position), last - 1);
		return progress[slot] + (position - slot) * (progress[slot + 1] - progress[slot]);
	};
	if (startPosition < 0 || startPosition > last) return null;
	const target = at(startPosition) + 1;
	let slot = Math.floor(startPosition);
	while (slot < last && progress[slot + 1] < target - (1 - DONE)) slot++;
	if (slot >= last) return null;
	const rate = progress[slot + 1] - progress[slot];
	const within = rate > 0 ? (target - progress[slot]) / rate : 1;
	return Math.max(startPosition, slot + Math.min(within, 1));
}
