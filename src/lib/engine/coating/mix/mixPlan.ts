import type { Method } from '../../vocabulary';
import type { Sheet } from '../sheet/sheet';
import { mixAmounts, type Amounts } from './amounts';
import { lossOf } from './loss';
import { mixed, unmixed, type Mixed } from './mixError';
import { paintNeed, type PaintNeed } from './need';
import { potPlan, type PotPlan } from './pots';
import { potTime, type PotTime } from './potTime';
import { tinsFor, type TinPlan } from './tins';

/** What is to be laid, by whom how fast, and how warm the paint will be. */
export interface MixRequest {
	readonly sheet: Sheet;
	readonly method: Method;
	/** m² of one coat. */
	readonly area: number;
	readonly coats: number;
	/** m²/h. */
	readonly rate: number;
	/** °C of the paint in the pot at the hour of the work: the forecast air's unless it is kept warm. */
	readonly celsius: number;
	/** % of thinner by volume of the paint; none by default. */
	readonly thinnerPercent?: number;
	/** µm dry a coat; the sheet's by default. */
	readonly dryFilm?: number;
	/** % lost; the sheet's for the method, else the usual, by default. */
	readonly lossPercent?: number;
	/** Litres of the largest pot that the person wants to carry. */
	readonly largestPot?: number;
}

export interface MixPlan {
	readonly need: PaintNeed;
	/** Litres of all coats: paint without thinner, thinner, and what of both is lost. */
	readonly paint: number;
	readonly thinner: number;
	readonly lost: number;
	/** The parts for everything, unthinned; by volume and mass as far as densities are known. */
	readonly amounts: Mixed<Amounts>;
	readonly potTime: Mixed<PotTime>;
	/** The pots of one coat; not known where the pot's time is not. */
	readonly pots: Mixed<PotPlan & { readonly amounts: Mixed<Amounts>; readonly thinner: number }>;
	/** Null where the sheet states no sizes. */
	readonly tins: TinPlan | null;
}

type NumberField = Exclude<keyof MixRequest, 'sheet' | 'method' | 'celsius'>;
/** What a person may ask for, least and most of each. */
const BOUNDS: readonly (readonly [NumberField, least: number, most: number])[] = [
	['area', 0.001, 100_000],
	['coats', 1, 50],
	['rate', 0.01, 10_000],
	['thinnerPercent', 0, 100],
	['dryFilm', 0.1, 10_000],
	['lossPercent', 0, 90],
	['largestPot', 0.001, 1000]
];

function outOfRange(request: MixRequest): { field: string; found: number } | null {
	for (const [field, least, most] of BOUNDS) {
		const found = request[field];
		if (found !== undefined && !(found >= least && found <= most)) return { field, found };
	}
	return Number.isInteger(request.coats) ? null : { field: 'coats', found: request.coats };
}

/**
 * What to buy, and what to mix when: amounts, pots that are laid within their pot life, waste and
 * tins. Parts that cannot be told carry their reason; the rest stands.
 */
export function mixPlan(request: MixRequest): Mixed<MixPlan> {
	const wrong = outOfRange(request);
	if (wrong !== null) return unmixed({ code: 'outOfRange', ...wrong });
	const { sheet, method, area, coats, rate } = request;
	const thinnerPercent = request.thinnerPercent ?? 0;
	const loss = lossOf(sheet, method, request.lossPercent);
	const reckoned = paintNeed(sheet.film, area, loss, thinnerPercent, request.dryFilm);
	if (!reckoned.ok) return reckoned;
	const need = reckoned.value;
	const amountsOf = (litres: number): Mixed<Amounts> =>
		sheet.mix === undefined ? unmixed({ code: 'ratioSilent' }) : mixAmounts(sheet.mix, { litres });
	const time = potTime(sheet, request.celsius);
	const plan = time.ok
		? potPlan(need.potPerCoat, need.potSpread, rate, time.value.workMinutes, {
				sheet: sheet.mix?.potLitres,
				person: request.largestPot
			})
		: time;
	const paint = need.paintPerCoat * coats;
	const paintShare = need.paintPerCoat / need.potPerCoat;
	return mixed({
		need,
		paint,
		thinner: need.thinnerPerCoat * coats,
		lost: need.lostPerCoat * coats,
		amounts: amountsOf(paint),
		potTime: time,
		pots: plan.ok
			? mixed({
					...plan.value,
					amounts: amountsOf(plan.value.litres * paintShare),
					thinner: plan.value.litres * (1 - paintShare)
				})
			: plan,
		tins: tinsFor(paint, sheet.tinLitres ?? [])
	});
}
