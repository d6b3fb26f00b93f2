import type { FaceConditions, SlotWeather } from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';
import { errorSeries, type ErrorSeries } from '../hours/errors';
import type { UsualErrors } from '../hours/step';

/** Members that make a spread worth having. */
const FEWEST = 5;
/** The members may be too sure of themselves: never under this share of the usual error. */
const FLOOR = 0.5;

/**
 * The members' sample standard deviation per slot where at least five have a value, never under
 * half the usual error; else the usual error.
 */
function memberSpread(usual: Float64Array, series: readonly Float64Array[]): Float64Array {
	if (series.length < FEWEST) return usual;
	const out = new Float64Array(usual.length);
	for (let i = 0; i < out.length; i++) {
		let known = 0;
		let mean = 0;
		let squares = 0;
		for (const values of series) {
			const value = values[i];
			if (value !== value) continue;
			// Welford's running variance.
			known++;
			const off = value - mean;
			mean += off / known;
			squares += off * (value - mean);
		}
		out[i] =
			known < FEWEST ? usual[i] : Math.max(Math.sqrt(squares / (known - 1)), FLOOR * usual[i]);
	}
	return out;
}

/**
 * Usual errors in a yard's weather: by lead, replaced by its members' spread. Those of the face
 * (surface temperature, spread) are still by lead; see {@link faceErrors}.
 */
export function yardErrors(
	{ weather, members }: YardWeather,
	usualErrors?: UsualErrors
): ErrorSeries {
	const usual = errorSeries(weather, usualErrors);
	const spreadOf = (
		quantity: keyof ErrorSeries,
		values: (member: SlotWeather) => Float64Array
	): Float64Array => memberSpread(usual[quantity], members.map(values));
	return {
		...usual,
		airTemperature: spreadOf('airTemperature', (member) => member.airTemperature),
		dewPoint: spreadOf('dewPoint', (member) => member.dewPoint),
		relativeHumidity: spreadOf('relativeHumidity', (member) => member.relativeHumidity),
		wind: spreadOf('wind', (member) => member.windSpeed),
		gust: spreadOf('gust', (member) => member.windGust)
	};
}

/** {@link yardErrors} with the surface and the spread of one face as its members have them. */
export function faceErrors(errors: ErrorSeries, members: readonly FaceConditions[]): ErrorSeries {
	return {
		...errors,
		surfaceTemperature: memberSpread(
			errors.surfaceTemperature,
			members.map((member) => member.surfaceShaded)
		),
		spread: memberSpread(
			errors.spread,
			members.map((member) => member.spread)
		)
	};
}
