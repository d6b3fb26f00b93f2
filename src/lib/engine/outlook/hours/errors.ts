import type { SlotWeather } from '../weather/slots';
import { SLOT_SECONDS } from '../weather/slots';
import type { UsualErrors } from './step';
import { flagBit } from '../weather/flags';

/**
 * Usual errors of a forecast at leads of 24, 48 and 72 h: K, K, K, K, %, m/s, m/s (defaults, no
 * source). The errors of the two parts of the spread go together.
 */
export const DEFAULT_USUAL_ERRORS: Required<UsualErrors> = {
	airTemperature: [1.5, 2, 2.5],
	dewPoint: [1.5, 2, 2.5],
	surfaceTemperature: [2, 2.5, 3],
	spread: [2, 2.5, 3],
	relativeHumidity: [8, 10, 12],
	wind: [1.5, 2, 2.5],
	gust: [2.5, 3, 4]
};
export type ErrorQuantity = keyof UsualErrors;

const HOUR = 3600;
const COARSE_FACTOR = 1.5;
const DERIVED_GUST_FACTOR = 2;

/** Linear between the leads, level outside. `lead` in seconds. */
export function errorAtLead(errors: readonly [number, number, number], lead: number): number {
	const days = lead / (24 * HOUR);
	if (days <= 1) return errors[0];
	if (days >= 3) return errors[2];
	return days <= 2
		? errors[0] + (days - 1) * (errors[1] - errors[0])
		: errors[1] + (days - 2) * (errors[2] - errors[1]);
}

/** One array of usual errors per quantity over the slots of a weather. */
export type ErrorSeries = Readonly<Record<ErrorQuantity, Float64Array>>;

const defaultSeries = new WeakMap<SlotWeather, ErrorSeries>();

/** Usual errors per slot: by lead, wider on coarse stretches and for a derived gust. */
export function errorSeries(weather: SlotWeather, usualErrors?: UsualErrors): ErrorSeries {
	const remembered = usualErrors === undefined ? defaultSeries.get(weather) : undefined;
	if (remembered !== undefined) return remembered;
	const all: Required<UsualErrors> = { ...DEFAULT_USUAL_ERRORS, ...usualErrors };
	const coarse = flagBit('coarse');
	const series = (quantity: ErrorQuantity): Float64Array => {
		const out = new Float64Array(weather.grid.count);
		for (let i = 0; i < out.length; i++) {
			const lead = weather.grid.start + i * SLOT_SECONDS - weather.issuedAt;
			let error = errorAtLead(all[quantity], lead);
			if (weather.flags[i] & coarse) error *= COARSE_FACTOR;
			if (quantity === 'gust' && weather.gustDerived[i]) error *= DERIVED_GUST_FACTOR;
			out[i] = error;
		}
		return out;
	};
	const result: ErrorSeries = {
		airTemperature: series('airTemperature'),
		dewPoint: series('dewPoint'),
		surfaceTemperature: series('surfaceTemperature'),
		spread: series('spread'),
		relativeHumidity: series('relativeHumidity'),
		wind: series('wind'),
		gust: series('gust')
	};
	if (usualErrors === undefined) defaultSeries.set(weather, result);
	return result;
}
