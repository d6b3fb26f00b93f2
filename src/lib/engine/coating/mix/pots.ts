import { mixed, unmixed, type Mixed } from './mixError';

/** What keeps a pot from being larger: its pot life, the sheet's or the person's largest, nothing. */
export type PotBound = 'potLife' | 'sheet' | 'person' | 'none';

export interface PotPlan {
	/** Pots for one coat, all alike. */
	readonly count: number;
	readonly litres: number;
	/** Minutes to lay one pot at the rate given. */
	readonly minutes: number;
	readonly bound: PotBound;
}

/** More pots than anybody mixes for a coat; the question was put wrongly. */
const MOST_POTS = 500;
const ROUNDING = 1e-9;

/**
 * How many pots a coat takes so that none outlives its pot life before it is laid.
 *
 * @param litres - of the coat, thinned
 * @param spread - m² on the boat a litre from the pot
 * @param rate - m²/h laid
 * @param workMinutes - that a pot can be worked; null without limit
 */
export function potPlan(
	litres: number,
	spread: number,
	rate: number,
	workMinutes: number | null,
	largest: { readonly sheet?: number; readonly person?: number }
): Mixed<PotPlan> {
	const bounds: readonly (readonly [PotBound, number])[] = [
		['none', litres],
		['person', largest.person ?? Infinity],
		['sheet', largest.sheet ?? Infinity],
		['potLife', workMinutes === null ? Infinity : (rate * workMinutes) / 60 / spread]
	];
	const [bound, most] = bounds.reduce((least, it) => (it[1] < least[1] ? it : least));
	const count = Math.max(1, Math.ceil(litres / most - ROUNDING));
	if (!(count <= MOST_POTS)) return unmixed({ code: 'tooManyPots', pots: count, potLitres: most });
	const each = litres / count;
	return mixed({ count, litres: each, minutes: ((each * spread) / rate) * 60, bound });
}
