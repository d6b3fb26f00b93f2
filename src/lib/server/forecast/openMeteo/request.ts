import type { ForecastPlace } from '../provider';

/** Days before today that are asked for, so that a face has a history; at least 24 h at any hour. */
export const PAST_DAYS = 2;
/** Today and the days after it; the most the service gives. */
export const FORECAST_DAYS = 16;

/** GEFS, global, 30 members and a control, gusts included, beyond 16 days. */
const ENSEMBLE_MODEL = 'gfs_seamless';

interface Service {
	/** Address without the path. */
	base: string;
	/** Empty for the free service. */
	key: string;
}

function address(path: string, service: Service, place: ForecastPlace, names: string[]): URL {
	const url = new URL(path, service.base);
	const query = {
		latitude: String(place.latitude),
		longitude: String(place.longitude),
		elevation: String(place.elevation),
		hourly: names.join(','),
		temperature_unit: 'celsius',
		wind_speed_unit: 'ms',
		precipitation_unit: 'mm',
		timeformat: 'unixtime',
		timezone: 'GMT',
		past_days: String(PAST_DAYS),
		forecast_days: String(FORECAST_DAYS)
	};
	for (const [name, value] of Object.entries(query)) url.searchParams.set(name, value);
	if (service.key !== '') url.searchParams.set('apikey', service.key);
	return url;
}

/** @param names - Open-Meteo's own names of hourly variables */
export function forecastUrl(service: Service, place: ForecastPlace, names: string[]): URL {
	return address('/v1/forecast', service, place, names);
}

/** @param names - Open-Meteo's own names of hourly variables */
export function ensembleUrl(service: Service, place: ForecastPlace, names: string[]): URL {
	const url = address('/v1/ensemble', service, place, names);
	url.searchParams.set('models', ENSEMBLE_MODEL);
	return url;
}
