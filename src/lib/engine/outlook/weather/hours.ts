import type { Forecast, Hourly, HourlyVariable } from './forecast';
import { SLOT_SECONDS, type SlotGrid } from './slots';

/**
 * Hours onto quarter-hours. An instant at a stamp holds there and runs linearly to the next; a sum
 * belongs to the period that ends at its stamp. NaN is missing throughout.
 */

const HOUR = 3600;
/** A provider's coarser stretch: no wider than this, and only at leads over COARSE_LEAD. */
const COARSEST = 6 * HOUR;
const COARSE_LEAD = 48 * HOUR;
const SLOTS_PER_HOUR = HOUR / SLOT_SECONDS;

/** The periods between the stamps of a forecast, laid on the grid. */
export interface Periods {
	/** Per period k (stamp k to k + 1): first slot, one past the last, hours. */
	readonly first: Int32Array;
	readonly end: Int32Array;
	readonly hours: Float64Array;
	/** 1 where the period is wider than an hour and may be interpolated. */
	readonly coarse: Uint8Array;
	/** 1 where the period is a gap in the data. */
	readonly gap: Uint8Array;
	/** Period of each slot; −1 outside the forecast. */
	readonly ofSlot: Int32Array;
}

/** Periods of a forecast on a grid. Slots outside the forecast belong to none. */
export function periodsOf(forecast: Forecast, grid: SlotGrid): Periods {
	const { time } = forecast.hourly;
	const count = time.length - 1;
	const periods: Periods = {
		first: new Int32Array(count),
		end: new Int32Array(count),
		hours: new Float64Array(count),
		coarse: new Uint8Array(count),
		gap: new Uint8Array(count),
		ofSlot: new Int32Array(grid.count).fill(-1)
	};
	const slotOf = (t: number): number =>
		Math.max(0, Math.min(grid.count, (t - grid.start) / SLOT_SECONDS));
	for (let k = 0; k < count; k++) {
		const width = time[k + 1] - time[k];
		const wide = width > HOUR;
		const bridged = wide && width <= COARSEST && time[k + 1] - forecast.issuedAt > COARSE_LEAD;
		periods.first[k] = slotOf(time[k]);
		periods.end[k] = slotOf(time[k + 1]);
		periods.hours[k] = width / HOUR;
		periods.coarse[k] = bridged ? 1 : 0;
		periods.gap[k] = wide && !bridged ? 1 : 0;
		periods.ofSlot.fill(k, periods.first[k], periods.end[k]);
	}
	return periods;
}

/** The values of a variable with NaN for missing; null where the forecast does not carry it. */
export function valuesOf(hourly: Hourly, variable: HourlyVariable): Float64Array | null {
	const series = hourly[variable];
	if (series === undefined || series.every((value) => value === null)) return null;
	return Float64Array.from(series, (value) => value ?? NaN);
}

/** An instant, linear between its stamps; unknown in the hours beside a missing one and in gaps. */
export function instantSlots(values: Float64Array, periods: Periods, grid: SlotGrid): Float64Array {
	const out = new Float64Array(grid.count).fill(NaN);
	for (let k = 0; k < periods.first.length; k++) {
		if (periods.gap[k]) continue;
		const from = values[k];
		const slots = periods.hours[k] * SLOTS_PER_HOUR;
		const rise = (values[k + 1] - from) / slots;
		// A period cut by the grid's start keeps its own zero.
		const origin = periods.end[k] - slots;
		for (let i = periods.first[k]; i < periods.end[k]; i++) out[i] = from + rise * (i - origin);
	}
	return out;
}

/** Degrees on the circle, the shorter way round; NaN as for instants. */
export function directionSlots(
	values: Float64Array,
	periods: Periods,
	grid: SlotGrid
): Float64Array {
	const out = new Float64Array(grid.count).fill(NaN);
	for (let k = 0; k < periods.first.length; k++) {
		if (periods.gap[k]) continue;
		const from = values[k];
		const turn = ((((values[k + 1] - from + 180) % 360) + 360) % 360) - 180;
		const slots = periods.hours[k] * SLOTS_PER_HOUR;
		const origin = periods.end[k] - slots;
		for (let i = periods.first[k]; i < periods.end[k]; i++)
			out[i] = (from + (turn * (i - origin)) / slots + 360) % 360;
	}
	return out;
}

/** A value of the period ending at its stamp, held over it. */
export function heldSlots(values: Float64Array, periods: Periods, grid: SlotGrid): Float64Array {
	const out = new Float64Array(grid.count).fill(NaN);
	for (let k = 0; k < periods.first.length; k++) {
		if (!periods.gap[k]) out.fill(values[k + 1], periods.first[k], periods.end[k]);
	}
	return out;
}

/** An amount of the period ending at its stamp as an amount an hour, spread evenly. */
export function hourlyAmountSlots(
	values: Float64Array,
	periods: Periods,
	grid: SlotGrid
): Float64Array {
	const out = new Float64Array(grid.count).fill(NaN);
	for (let k = 0; k < periods.first.length; k++) {
		if (periods.gap[k]) continue;
		out.fill(values[k + 1] / periods.hours[k], periods.first[k], periods.end[k]);
	}
	return out;
}
