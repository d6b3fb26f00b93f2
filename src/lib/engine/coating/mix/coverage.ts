/**
 * Theoretical spread, m²/L: volume solids % × 10 ÷ dry film µm. A litre leaves its solids on the
 * boat and nothing else; no loss. Source: spreading-rate notes of the trade, plain geometry.
 */
export function coverage(solidsPercent: number, dryFilmMicrons: number): number {
	return (solidsPercent * 10) / dryFilmMicrons;
}

/** Wet film, µm, that dries to a dry film: dry × 100 ÷ volume solids %. */
export function wetFilmOf(dryFilmMicrons: number, solidsPercent: number): number {
	return (dryFilmMicrons * 100) / solidsPercent;
}

/**
 * Volume solids, %, of paint thinned: VS′ = VS ÷ (1 + t).
 *
 * @param thinnerPercent - volume of thinner as a percentage of the paint's volume
 */
export function thinnedSolids(solidsPercent: number, thinnerPercent: number): number {
	return solidsPercent / (1 + thinnerPercent / 100);
}

/** m²/L that land on the boat when a share of the paint does not. */
export function practicalSpread(theoretical: number, lossPercent: number): number {
	return theoretical * (1 - lossPercent / 100);
}
