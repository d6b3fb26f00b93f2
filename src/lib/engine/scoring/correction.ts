import { DEFAULT_USUAL_ERRORS } from '../outlook/hours/errors';
import type { UsualErrors } from '../outlook/hours/step';
import { forecastErrors, LEAD_BANDS, type ForecastPair, type ScoredQuantity } from './errors';

/**
 * What a yard learns from its own record. Few readings change little: a mean is shrunk toward
 * nothing by as many readings as it would take to believe half of it, and bounded.
 */

/** Readings that earn half the mean's weight (default, no source). */
const HALF_WEIGHT = 20;
/** Most that a forecast is corrected by, in its usual errors at a day's lead (default, no source). */
const MOST_ERRORS = 1.5;
/** Readings under which a page says that there are too few (default, no source). */
export const FEW_READINGS = 10;
/** Readings at every lead from which the yard's own errors replace the usual ones (default, no source). */
const LONG_RECORD = 60;

/** The correction of a quantity: to be added to a forecast, in the quantity's unit. */
export interface BiasCorrection {
	readonly quantity: ScoredQuantity;
	readonly count: number;
	/** Measured minus forecast, as counted; null without a reading. */
	readonly rawMean: number | null;
	readonly correction: number;
	/** Cut to the most that is believed. */
	readonly isBounded: boolean;
	readonly tooFew: boolean;
}

/** The yard's correction of a quantity: n/(n + 20) of the mean that forecasts were too low, bounded. */
export function biasCorrection(
	quantity: ScoredQuantity,
	pairs: readonly ForecastPair[]
): BiasCorrection {
	const off = pairs
		.filter((pair) => pair.quantity === quantity)
		.map(({ forecast, measured }) => measured - forecast);
	const count = off.length;
	if (count === 0)
		return { quantity, count, rawMean: null, correction: 0, isBounded: false, tooFew: true };
	const rawMean = off.reduce((sum, value) => sum + value, 0) / count;
	const shrunken = (count / (count + HALF_WEIGHT)) * rawMean;
	const most = MOST_ERRORS * DEFAULT_USUAL_ERRORS[quantity][0];
	const correction = Math.max(-most, Math.min(most, shrunken));
	return {
		quantity,
		count,
		rawMean,
		correction,
		isBounded: correction !== shrunken,
		tooFew: count < FEW_READINGS
	};
}

/**
 * The yard's own usual errors: root mean squares by lead, of the quantities whose record is long
 * enough at every lead. In the shape that stands for the defaults.
 */
export function ownUsualErrors(pairs: readonly ForecastPair[]): UsualErrors {
	const scored = forecastErrors(pairs);
	const own: UsualErrors = {};
	for (const quantity of new Set(scored.map((it) => it.quantity))) {
		const byLead = LEAD_BANDS.map(({ lead }) =>
			scored.find((it) => it.quantity === quantity && it.lead === lead)
		);
		const [day, second, third] = byLead.map((it) =>
			it !== undefined && it.count >= LONG_RECORD && it.rootMeanSquare > 0
				? it.rootMeanSquare
				: null
		);
		if (day !== null && second !== null && third !== null) own[quantity] = [day, second, third];
	}
	return own;
}
