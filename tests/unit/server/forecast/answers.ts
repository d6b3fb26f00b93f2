import type { HttpTools } from '../../../../src/lib/server/forecast/http/tools';
import { forecastConfigSchema } from '../../../../src/lib/server/forecast/config';

export const HOUR = 3_600;
export const DAY = 86_400;
/** Tuesday 1 December 2026, 06:20 UTC. */
export const NOW = Date.UTC(2026, 11, 1, 6, 20) / 1000;

export const OPEN_METEO = 'http://open-meteo.test';
export const ENSEMBLE = 'http://ensemble.open-meteo.test';
export const MET_NORWAY = 'http://met-norway.test';
export const config = forecastConfigSchema.parse({
	OPEN_METEO_URL: OPEN_METEO,
	OPEN_METEO_ENSEMBLE_URL: ENSEMBLE,
	MET_NORWAY_URL: MET_NORWAY,
	FORECAST_CONTACT: 'harbour@yard.example'
});

/** Tools whose clock moves only by sleeping, and that remember every wait, in ms. */
export function stillTools(start = NOW): HttpTools & { waits: number[] } {
	let ms = start * 1000;
	const waits: number[] = [];
	return {
		waits,
		clock: () => ms,
		sleep: (milliseconds) => {
			waits.push(milliseconds);
			ms += milliseconds;
			return Promise.resolve();
		},
		random: () => 0.5,
		attemptTimeout: 1_000,
		overallTimeout: 20_000
	};
}

type Series = (number | null)[];
export interface OpenMeteoBody {
	utc_offset_seconds: number;
	hourly_units: Record<string, string>;
	hourly: Record<string, Series>;
	[more: string]: unknown;
}

const UNITS: Record<string, string> = {
	temperature_2m: '°C',
	dew_point_2m: '°C',
	relative_humidity_2m: '%',
	surface_pressure: 'hPa',
	wind_speed_10m: 'm/s',
	wind_gusts_10m: 'm/s',
	wind_direction_10m: '°',
	precipitation: 'mm',
	precipitation_probability: '%',
	cloud_cover: '%',
	shortwave_radiation: 'W/m²',
	direct_normal_irradiance: 'W/m²',
	diffuse_radiation: 'W/m²'
};
const VALUES: Record<string, number> = {
	temperature_2m: 12,
	dew_point_2m: 7,
	relative_humidity_2m: 71,
	surface_pressure: 1012,
	wind_speed_10m: 3,
	wind_gusts_10m: 5,
	wind_direction_10m: 200,
	precipitation: 0,
	precipitation_probability: 5,
	cloud_cover: 30,
	shortwave_radiation: 100,
	direct_normal_irradiance: 150,
	diffuse_radiation: 60
};
const NO_MEMBERS = ['relative_humidity_2m', 'surface_pressure', 'precipitation_probability'];

/** The hours that are asked for at `now`: from midnight two days before, 18 days. */
export const hoursAskedFor = (now = NOW): number[] =>
	Array.from({ length: 18 * 24 }, (_, i) => Math.floor(now / DAY) * DAY - 2 * DAY + i * HOUR);

/** A sound answer of `/v1/forecast`; temperature rises by 0.01 K an hour, so that hours differ. */
export function openMeteoBody(now = NOW): OpenMeteoBody {
	const time = hoursAskedFor(now);
	const hourly: Record<string, Series> = { time };
	for (const [name, value] of Object.entries(VALUES)) hourly[name] = time.map(() => value);
	hourly['temperature_2m'] = time.map((_, i) => 12 + i / 100);
	return {
		latitude: 37.125,
		longitude: -8.5,
		elevation: 4,
		generationtime_ms: 0.4,
		utc_offset_seconds: 0,
		timezone: 'GMT',
		timezone_abbreviation: 'GMT',
		hourly_units: { time: 'unixtime', ...UNITS },
		hourly
	};
}

/** A sound answer of `/v1/ensemble`: a control and two members, one and two kelvin warmer. */
export function ensembleBody(now = NOW): OpenMeteoBody {
	const body = openMeteoBody(now);
	for (const name of NO_MEMBERS) {
		delete body.hourly[name];
		delete body.hourly_units[name];
	}
	for (const name of Object.keys(body.hourly))
		for (const member of [1, 2]) {
			if (name === 'time' || name.includes('_member')) continue;
			const key = `${name}_member0${member}`;
			const more = name === 'temperature_2m' ? member : 0;
			body.hourly[key] = (body.hourly[name] ?? []).map((v) => (v === null ? null : v + more));
			body.hourly_units[key] = body.hourly_units[name] ?? '';
		}
	return body;
}

interface MetPeriod {
	summary: { symbol_code: string };
	details: Record<string, number>;
}
export interface MetEntry {
	time: string;
	data: {
		instant: { details: Record<string, number | null> };
		next_1_hours?: MetPeriod;
		next_6_hours?: MetPeriod;
		next_12_hours?: MetPeriod;
	};
}
export interface MetBody {
	type: string;
	geometry: { type: string; coordinates: number[] };
	properties: {
		meta: { updated_at: string; units: Record<string, string> };
		timeseries: MetEntry[];
	};
}

export const isoSeconds = (time: number): string =>
	new Date(time * 1000).toISOString().replace('.000Z', 'Z');

/**
 * A sound answer of Locationforecast: ten hourly stamps from the hour of `now` to a six-hourly one,
 * then four six-hourly ones. The rain of the hour that follows stamp i is i/10 mm.
 */
export function metNorwayBody(now = NOW): MetBody {
	const start = Math.floor(now / HOUR) * HOUR;
	const turn = Math.ceil(start / (6 * HOUR)) * 6 * HOUR + 12 * HOUR;
	const stamps: number[] = [];
	for (let t = start; t <= turn + 24 * HOUR; t += t < turn ? HOUR : 6 * HOUR) stamps.push(t);
	const period = (amount: number, chance: number): MetPeriod => ({
		summary: { symbol_code: 'rain' },
		details: { precipitation_amount: amount, probability_of_precipitation: chance }
	});
	return {
		type: 'Feature',
		geometry: { type: 'Point', coordinates: [-8.5, 37.125, 4] },
		properties: {
			meta: {
				updated_at: isoSeconds(now - 20 * 60),
				units: {
					air_pressure_at_sea_level: 'hPa',
					air_temperature: 'celsius',
					cloud_area_fraction: '%',
					dew_point_temperature: 'celsius',
					precipitation_amount: 'mm',
					probability_of_precipitation: '%',
					relative_humidity: '%',
					wind_from_direction: 'degrees',
					wind_speed: 'm/s',
					wind_speed_of_gust: 'm/s'
				}
			},
			timeseries: stamps.map((t, i) => ({
				time: isoSeconds(t),
				data: {
					instant: {
						details: {
							air_pressure_at_sea_level: 1013.25,
							air_temperature: 15,
							cloud_area_fraction: 40,
							dew_point_temperature: 9,
							relative_humidity: 67,
							wind_from_direction: 210,
							wind_speed: 4,
							...(t <= turn ? { wind_speed_of_gust: 7 } : {})
						}
					},
					...(t < turn ? { next_1_hours: period(i / 10, 30 + i) } : {}),
					...(t >= turn && i < stamps.length - 1 ? { next_6_hours: period(6, 80) } : {})
				}
			}))
		}
	};
}
