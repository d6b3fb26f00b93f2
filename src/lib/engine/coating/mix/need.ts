import type { Film } from '../sheet/film';
import { coverage, practicalSpread } from './coverage';
import type { Loss } from './loss';
import { mixed, unmixed, type Mixed } from './mixError';

/** How much paint an area takes, thinner and loss included. */
export interface PaintNeed {
	/** m² that a litre of paint, unthinned, covers at the film wanted, before loss. */
	readonly theoreticalSpread: number;
	/** m² that a litre of what is in the pot, thinned, leaves on the boat. */
	readonly potSpread: number;
	/** µm wet, as laid from the pot. */
	readonly wetFilm: number;
	/** Litres of paint and of thinner for one coat, and of both together. */
	readonly paintPerCoat: number;
	readonly thinnerPerCoat: number;
	readonly potPerCoat: number;
	readonly loss: Loss;
	/** Litres of one coat that do not end up on the boat. */
	readonly lostPerCoat: number;
}

/**
 * m²/L of unthinned paint at a dry film: the sheet's stated rate at its own film, else from solids
 * and film, else from the wet film; null where the sheet is silent.
 */
function spreadAt(film: Film | undefined, dryFilm: number | undefined): number | null {
	if (film === undefined) return null;
	const { solids, dryFilm: own, spreadRate, wetFilm } = film;
	if (dryFilm !== undefined && dryFilm !== own) {
		if (solids !== undefined) return coverage(solids, dryFilm);
		return own === undefined || spreadRate === undefined ? null : (spreadRate * own) / dryFilm;
	}
	if (spreadRate !== undefined) return spreadRate;
	if (solids !== undefined && own !== undefined) return coverage(solids, own);
	return wetFilm === undefined ? null : 1000 / wetFilm;
}

/**
 * The paint that one coat of an area takes.
 *
 * @param area - m²
 * @param thinnerPercent - of thinner by volume of the paint
 * @param dryFilm - µm wanted; the sheet's own where undefined
 */
export function paintNeed(
	film: Film | undefined,
	area: number,
	loss: Loss,
	thinnerPercent: number,
	dryFilm?: number
): Mixed<PaintNeed> {
	const theoreticalSpread = spreadAt(film, dryFilm);
	if (theoreticalSpread === null) return unmixed({ code: 'spreadSilent' });
	const paintPerCoat = area / practicalSpread(theoreticalSpread, loss.percent);
	const thinnerPerCoat = (paintPerCoat * thinnerPercent) / 100;
	const potPerCoat = paintPerCoat + thinnerPerCoat;
	return mixed({
		theoreticalSpread,
		potSpread: area / potPerCoat,
		wetFilm: (1000 / theoreticalSpread) * (1 + thinnerPercent / 100),
		paintPerCoat,
		thinnerPerCoat,
		potPerCoat,
		loss,
		lostPerCoat: (potPerCoat * loss.percent) / 100
	});
}
