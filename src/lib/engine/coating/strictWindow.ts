/**
 * The stricter reading of a recoat window that some public specifications use (UFGS 09971): both
 * ends are read from the highest surface temperature held for an hour since the coat. It is not
 * monotone (a hot hour moves both ends to sooner), so plans are made on the additive clock and
 * checked against it.
 */

/** Bands of surface temperature, °C, rising; hours of the window in each. A null maximum is none. */
export interface StrictBand {
	/** The band holds up to here, included. */
	readonly to: number;
	readonly minMinutes: number;
	readonly maxMinutes: number | null;
}

const SLOT_MINUTES = 15;
const SLOTS_PER_HOUR = 4;

/**
 * The highest temperature held for an hour within slots [from, to): the highest of the lowest of
 * any four slots on end. NaN where it was never an hour, or a slot is unknown.
 */
export function highestHeldHour(temperature: Float64Array, from: number, to: number): number {
	let highest = NaN;
	for (let i = Math.max(0, from); i + SLOTS_PER_HOUR <= Math.min(to, temperature.length); i++) {
		let lowest = Infinity;
		for (let k = i; k < i + SLOTS_PER_HOUR; k++) {
			if (temperature[k] !== temperature[k]) return NaN;
			lowest = Math.min(lowest, temperature[k]);
		}
		if (!(lowest <= highest)) highest = lowest;
	}
	return highest;
}

/** The band a temperature falls in; null over the last. */
export function strictBandOf(bands: readonly StrictBand[], temperature: number): StrictBand | null {
	return bands.find(({ to }) => temperature <= to) ?? null;
}

export type StrictVerdict = 'inside' | 'early' | 'late' | 'tooHot' | 'unknown';

/**
 * Whether a next coat begun and finished at some slots lies inside the stricter window of a coat
 * begun and finished at others: the least waiting is from finish to start, the most on both strokes.
 */
export function strictVerdict(
	bands: readonly StrictBand[],
	temperature: Float64Array,
	coat: { readonly start: number; readonly finish: number },
	next: { readonly start: number; readonly finish: number }
): StrictVerdict {
	const held = highestHeldHour(temperature, coat.finish, next.start);
	const waited = (next.start - coat.finish) * SLOT_MINUTES;
	// Under an hour since the coat nothing was held for one: no band allows so little.
	if (Number.isNaN(held)) return waited < SLOTS_PER_HOUR * SLOT_MINUTES ? 'early' : 'unknown';
	const band = strictBandOf(bands, held);
	if (band === null) return 'tooHot';
	if (waited < band.minMinutes) return 'early';
	const strokes = Math.max(next.start - coat.start, next.finish - coat.finish) * SLOT_MINUTES;
	return band.maxMinutes !== null && strokes > band.maxMinutes ? 'late' : 'inside';
}
