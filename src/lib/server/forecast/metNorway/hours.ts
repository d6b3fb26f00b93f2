import type { Hourly } from '../../../engine';
import type { Entry } from './answer';
import { stationPressure } from './pressure';

const HOUR_SECONDS = 3_600;

const seconds = (iso: string): number => Date.parse(iso) / 1000;
const rounded = (value: number, digits: number): number => Number(value.toFixed(digits));

/**
 * What fell between two entries: MET Norway gives the amount of the period that *follows* a stamp,
 * the canonical forecast that of the period that ends at it. Only a period that is exactly the gap
 * will do; anything else leaves the hour unknown.
 */
function between(entry: Entry, gap: number) {
	if (gap === HOUR_SECONDS) return entry.data.next_1_hours?.details;
	if (gap === 6 * HOUR_SECONDS) return entry.data.next_6_hours?.details;
	if (gap === 12 * HOUR_SECONDS) return entry.data.next_12_hours?.details;
	return undefined;
}

/**
 * A time series in the canonical form, on its own stamps: hourly first, then six-hourly.
 *
 * The gust is "the maximum for the period", and the data model does not say which; it is kept at
 * its stamp, as the maximum of the hour before it. There is no irradiance.
 *
 * @param elevation - of the yard, m: pressure comes at sea level
 */
export function toHours(entries: readonly Entry[], elevation: number): Hourly {
	const time = entries.map((entry) => seconds(entry.time));
	const details = entries.map((entry) => entry.data.instant.details);
	const before = entries.map((_, i) => {
		const earlier = entries[i - 1];
		return earlier === undefined
			? undefined
			: between(earlier, (time[i] ?? 0) - (time[i - 1] ?? 0));
	});
	return {
		time,
		temperature: details.map((d) => d.air_temperature ?? null),
		dewPoint: details.map((d) => d.dew_point_temperature ?? null),
		relativeHumidity: details.map((d) => d.relative_humidity ?? null),
		pressure: details.map((d) =>
			d.air_pressure_at_sea_level == null || d.air_temperature == null
				? null
				: rounded(stationPressure(d.air_pressure_at_sea_level, d.air_temperature, elevation), 1)
		),
		windSpeed: details.map((d) => d.wind_speed ?? null),
		windGust: details.map((d) => d.wind_speed_of_gust ?? null),
		windDirection: details.map((d) => d.wind_from_direction ?? null),
		precipitation: before.map((d) => d?.precipitation_amount ?? null),
		precipitationProbability: before.map((d) => d?.probability_of_precipitation ?? null),
		cloudCover: details.map((d) => d.cloud_area_fraction ?? null)
	};
}
