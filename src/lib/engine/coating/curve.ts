import type { TimeTable } from './times';

const KELVIN = 273.15;
/** How far outside its rows a table is carried along the end segment's slope, K. */
const REACH = 5;

/** Times under this are taken as this, min: under a thousandth of a second, and no clock is infinite. */
export const LEAST_MINUTES = 1e-5;

/** Which end of a window a clock counts to. Each takes the safe side outside the rows. */
export type ClockSide = 'earliest' | 'latest';

/** A time table ready for use: ln τ is linear in 1/T between the rows (Arrhenius). */
export interface TimeCurve {
	/** Kelvin of the rows, rising. */
	readonly kelvin: readonly number[];
	/** ln of minutes at the rows. */
	readonly logMinutes: readonly number[];
	/** Per segment between two rows: ln τ = intercept + slope/T. */
	readonly slope: readonly number[];
	readonly intercept: readonly number[];
}

/** The curve of a table with rows; a constant becomes a single row. Null: the tin sets no limit. */
export function timeCurve(table: Exclude<TimeTable, null>): TimeCurve {
	const rows: readonly (readonly [number, number])[] =
		typeof table === 'number' ? [[20, table]] : table;
	const kelvin = rows.map(([temperature]) => temperature + KELVIN);
	const logMinutes = rows.map(([, minutes]) => Math.log(Math.max(minutes, LEAST_MINUTES)));
	const slope = kelvin
		.slice(1)
		.map((t, i) => (logMinutes[i + 1] - logMinutes[i]) / (1 / t - 1 / kelvin[i]));
	const intercept = slope.map((it, i) => logMinutes[i] - it / kelvin[i]);
	return { kelvin, logMinutes, slope, intercept };
}

const interpolate = (curve: TimeCurve, segment: number, kelvin: number): number =>
	curve.intercept[segment] + curve.slope[segment] / kelvin;

/**
 * Natural logarithm of the minutes at a temperature (°C); +Infinity where the clock stands still.
 *
 * Outside the rows the end segment's slope holds for 5 K. Hotter: earliest clocks keep the value
 * at +5 K, latest clocks go on along the slope. Colder: earliest clocks stand still, latest clocks
 * keep the value at −5 K. Each is the safe side.
 */
export function logMinutesAt(curve: TimeCurve, temperature: number, side: ClockSide): number {
	const { kelvin, logMinutes } = curve;
	const last = kelvin.length - 1;
	if (last === 0) return logMinutes[0];
	const t = temperature + KELVIN;
	if (t < kelvin[0]) {
		if (t >= kelvin[0] - REACH) return interpolate(curve, 0, t);
		return side === 'earliest' ? Infinity : interpolate(curve, 0, kelvin[0] - REACH);
	}
	if (t > kelvin[last]) {
		const capped = side === 'earliest' ? Math.min(t, kelvin[last] + REACH) : t;
		return interpolate(curve, last - 1, capped);
	}
	let segment = 0;
	while (segment < last - 1 && t > kelvin[segment + 1]) segment++;
	return interpolate(curve, segment, t);
}

/** Minutes at a constant temperature (°C); Infinity where the clock stands still. */
export function minutesAt(
	table: Exclude<TimeTable, null>,
	temperature: number,
	side: ClockSide
): number {
	return Math.exp(logMinutesAt(timeCurve(table), temperature, side));
}

/** True where a temperature lies outside the rows of a table with more than one. */
export function outsideRows(curve: TimeCurve, temperature: number): boolean {
	const last = curve.kelvin.length - 1;
	const t = temperature + KELVIN;
	return last > 0 && (t < curve.kelvin[0] || t > curve.kelvin[last]);
}
