import { z } from 'zod';

/** What a yard measures and a forecast tells alike. */
export const SCORED_QUANTITIES = [
	'airTemperature',
	'dewPoint',
	'surfaceTemperature',
	'spread',
	'relativeHumidity',
	'wind',
	'gust'
] as const;
export type ScoredQuantity = (typeof SCORED_QUANTITIES)[number];

/** A value that was forecast so long ahead (seconds), and the one measured, in the quantity's unit. */
export const forecastPairSchema = z.strictObject({
	quantity: z.enum(SCORED_QUANTITIES),
	lead: z.number().min(0),
	forecast: z.number(),
	measured: z.number()
});
export type ForecastPair = z.infer<typeof forecastPairSchema>;

const HOUR = 3600;

/** Bands of lead, hours: up to a day, two days, three. What was forecast longer ahead is not scored. */
export const LEAD_BANDS = [
	{ lead: 24, from: 0, to: 24 },
	{ lead: 48, from: 24, to: 48 },
	{ lead: 72, from: 48, to: 72 }
] as const;
export type ScoredLead = (typeof LEAD_BANDS)[number]['lead'];

/** How far forecasts were off: forecast minus measured, in the quantity's unit. */
export interface ForecastErrors {
	readonly quantity: ScoredQuantity;
	/** Hours. */
	readonly lead: ScoredLead;
	readonly count: number;
	/** Mean error: positive where the forecast was too high. */
	readonly bias: number;
	readonly meanAbsolute: number;
	readonly rootMeanSquare: number;
}

/** The band of a lead (seconds); null beyond three days. A lead on a border belongs to the shorter. */
export function leadBand(lead: number): ScoredLead | null {
	const hours = lead / HOUR;
	return LEAD_BANDS.find(({ to }) => hours <= to)?.lead ?? null;
}

/** Errors of one quantity at one lead; null without a pair. */
function errorsOf(
	quantity: ScoredQuantity,
	lead: ScoredLead,
	pairs: readonly ForecastPair[]
): ForecastErrors | null {
	const off = pairs
		.filter((pair) => pair.quantity === quantity && leadBand(pair.lead) === lead)
		.map(({ forecast, measured }) => forecast - measured);
	if (off.length === 0) return null;
	const mean = (values: readonly number[]): number =>
		values.reduce((sum, value) => sum + value, 0) / values.length;
	return {
		quantity,
		lead,
		count: off.length,
		bias: mean(off),
		meanAbsolute: mean(off.map(Math.abs)),
		rootMeanSquare: Math.sqrt(mean(off.map((value) => value * value)))
	};
}

/** How good the forecast has been, by quantity and lead; what was never measured is left out. */
export function forecastErrors(pairs: readonly ForecastPair[]): ForecastErrors[] {
	return SCORED_QUANTITIES.flatMap((quantity) =>
		LEAD_BANDS.flatMap(({ lead }) => errorsOf(quantity, lead, pairs) ?? [])
	);
}
