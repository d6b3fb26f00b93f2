import type { MeasuredHour } from './measured';
import { NO_NUDGE, type HourWeather, type Nudge, type Place, type Weather } from './weather';

const HOUR = 3_600;
/** Airports report a gust when it is well above the mean: below this excess there is none. */
const UNREPORTED_EXCESS = 5;
const USUAL_GUSTINESS = 1.4;

const NOTHING: HourWeather = {
	temperature: null,
	dewPoint: null,
	relativeHumidity: null,
	seaLevelPressure: null,
	windSpeed: null,
	windGust: null,
	windDirection: null,
	precipitation: null,
	precipitationProbability: null,
	cloudCover: null,
	ghi: null,
	dni: null,
	dhi: null
};

/**
 * Measured hours as if they were a forecast. What was not measured (cloud, irradiance, chance of
 * rain, a whole missing hour) stays null, with one exception: a gust that was not reported is put
 * at 1.4 times the mean, at most 5 m/s over it, since a provider always gives one.
 *
 * @param shift - seconds added to the measured times
 */
export function replay(hours: readonly MeasuredHour[], shift: number): Weather {
	if (shift % HOUR !== 0) throw new Error('Measured hours can be shifted by whole hours only.');
	const byTime = new Map(hours.map((hour) => [hour.time + shift, hour]));

	function hour(time: number, _place: Place, nudge: Nudge = NO_NUDGE): HourWeather {
		const now = byTime.get(time);
		// Weather that comes early is another hour's; temperature and moisture keep the clock.
		const other = byTime.get(time + Math.round(nudge.early / HOUR) * HOUR) ?? now;
		if (now === undefined || other === undefined) return NOTHING;
		const added = (value: number | null, more: number) => (value === null ? null : value + more);
		const times = (value: number | null, factor: number) =>
			value === null ? null : value * factor;
		const temperature = added(now.temperature, nudge.temperature);
		const dewPoint = added(now.dewPoint, nudge.dewPoint);
		const nudged = nudge.temperature !== 0 || nudge.dewPoint !== 0;
		return {
			...NOTHING,
			temperature,
			dewPoint:
				dewPoint === null || temperature === null ? dewPoint : Math.min(temperature, dewPoint),
			// A member's humidity follows from its dew point, which it always gives.
			relativeHumidity: nudged ? null : now.relativeHumidity,
			seaLevelPressure: other.seaLevelPressure,
			windSpeed: times(other.windSpeed, nudge.wind),
			windGust: times(gust(other), nudge.wind),
			windDirection:
				other.windDirection === null ? null : (other.windDirection + nudge.direction + 720) % 360,
			precipitation: times(other.precipitation, nudge.rain)
		};
	}
	return { hour };
}

function gust({ windSpeed, windGust }: MeasuredHour): number | null {
	if (windGust !== null || windSpeed === null) return windGust;
	return Math.min(windSpeed * USUAL_GUSTINESS, windSpeed + UNREPORTED_EXCESS);
}
