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
	const count = usual.length;
	const known = new Uint16Array(count);
	const sums = new Float64Array(count);
	const squares = new Float64Array(count);
	// Off the first member, so that the squares do not drown the differences.
	const [first] = series;
	for (const values of series) {
		for (let i = 0; i < count; i++) {
			const off = values[i] - (first[i] === first[i] ? first[i] : 0);
			if (off !== off) continue;
			known[i]++;
			sums[i] += off;
			squares[i] += off * off;
		}
	}
	const out = new Float64Array(count);
	for (let i = 0; i < count; i++) {
		const n = known[i];
		const variance = n < FEWEST ? NaN : (squares[i] - (sums[i] * sums[i]) / n) / (n - 1);
		out[i] = n < FEWEST ? usual[i] : Math.max(Math.sqrt(Math.max(0, variance)), FLOOR * usual[i]);
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
