import { LEAST_MINUTES, logMinutesAt, timeCurve, type ClockSide } from './curve';
import type { TimeTable } from './times';

/** Rates 1/τ of a time table at close, even steps of temperature, for clocks that run many times. */
export interface RateTable {
	/** Per minute, at LEAST + i/STEPS °C. */
	readonly rates: Float64Array;
}

/** °C; beyond these the end values stand. */
const LEAST = -45;
const MOST = 95;
/** Nodes a kelvin: between them the rate is linear, within 2 parts in a million of Arrhenius' law. */
const STEPS = 32;
const LAST = (MOST - LEAST) * STEPS;

const remembered = new WeakMap<object, Partial<Record<ClockSide, RateTable>>>();

/**
 * The rates of a table for one end of a window, as {@link logMinutesAt} gives them at the nodes.
 * Worked out once for a table with rows.
 */
export function rateTable(table: Exclude<TimeTable, null>, side: ClockSide): RateTable {
	if (typeof table === 'number')
		return { rates: new Float64Array(LAST + 1).fill(1 / Math.max(table, LEAST_MINUTES)) };
	const ofTable = remembered.get(table) ?? {};
	remembered.set(table, ofTable);
	ofTable[side] ??= ratesOf(table, side);
	return ofTable[side];
}

function ratesOf(table: Exclude<TimeTable, null>, side: ClockSide): RateTable {
	const curve = timeCurve(table);
	const rates = new Float64Array(LAST + 1);
	for (let i = 0; i <= LAST; i++)
		rates[i] = Math.exp(-logMinutesAt(curve, LEAST + i / STEPS, side));
	return { rates };
}

/** Rate at a temperature (°C), per minute; 0 where the clock stands still. */
export function rateAt({ rates }: RateTable, temperature: number): number {
	const position = (temperature - LEAST) * STEPS;
	if (!(position > 0)) return rates[0];
	if (position >= LAST) return rates[LAST];
	const node = position | 0;
	return rates[node] + (position - node) * (rates[node + 1] - rates[node]);
}
