import type { HourlyVariable } from '../../../engine';

/**
 * Open-Meteo's names for the canonical variables, with the units asked for. By its documentation
 * (open-meteo.com/en/docs, "Hourly Parameter Definition") temperature, dew point, humidity, surface
 * pressure, wind and cloud are instants; the gust is the maximum, precipitation the sum and its
 * probability that of the preceding hour, and the irradiances are means of the preceding hour: just
 * what the canonical forecast says, so no stamp is moved.
 */
export const FORECAST_VARIABLES = {
	temperature: ['temperature_2m', '°C'],
	dewPoint: ['dew_point_2m', '°C'],
	relativeHumidity: ['relative_humidity_2m', '%'],
	pressure: ['surface_pressure', 'hPa'],
	windSpeed: ['wind_speed_10m', 'm/s'],
	windGust: ['wind_gusts_10m', 'm/s'],
	windDirection: ['wind_direction_10m', '°'],
	precipitation: ['precipitation', 'mm'],
	precipitationProbability: ['precipitation_probability', '%'],
	cloudCover: ['cloud_cover', '%'],
	ghi: ['shortwave_radiation', 'W/m²'],
	dni: ['direct_normal_irradiance', 'W/m²'],
	dhi: ['diffuse_radiation', 'W/m²']
} as const satisfies Record<HourlyVariable, readonly [name: string, unit: string]>;

/**
 * What is asked of the ensemble: what differs between members and moves a limit. Pressure and
 * humidity (the dew point carries it) come from the main forecast; a member has no probability.
 */
export const MEMBER_VARIABLES = [
	'temperature',
	'dewPoint',
	'windSpeed',
	'windGust',
	'windDirection',
	'precipitation',
	'cloudCover',
	'ghi',
	'dni',
	'dhi'
] as const satisfies readonly HourlyVariable[];
