import { find, localOffset, NAN_MARK, type ActiveFault } from './faults';
import { entriesFrom, type Entry } from './metNorwayEntries';
import { secondOpinion } from './nudges';
import type { Stage } from './scenario';

const HOUR = 3_600;
const DAY = 86_400;
/** Renewed hourly, some minutes past. */
const ISSUE_MINUTE = 17 * 60;
/** How long after the next renewal an answer may still be kept. */
const EXPIRY_SLACK = 120;

const UNITS = {
	air_pressure_at_sea_level: 'hPa',
	air_temperature: 'celsius',
	air_temperature_max: 'celsius',
	air_temperature_min: 'celsius',
	cloud_area_fraction: '%',
	dew_point_temperature: 'celsius',
	precipitation_amount: 'mm',
	probability_of_precipitation: '%',
	relative_humidity: '%',
	wind_from_direction: 'degrees',
	wind_speed: 'm/s',
	wind_speed_of_gust: 'm/s'
};

export interface MetNorwayAnswer {
	type: 'Feature';
	geometry: { type: 'Point'; coordinates: [number, number, number] };
	properties: {
		meta: { updated_at: string; units: Record<string, string> };
		timeseries: Entry[];
	};
}

/** When the forecast that holds at `now` was issued, UTC epoch seconds. */
export const issuedAt = (now: number): number =>
	Math.floor((now - ISSUE_MINUTE) / HOUR) * HOUR + ISSUE_MINUTE;

/** When the next one may be asked for, UTC epoch seconds. */
export const expiresAt = (now: number): number => issuedAt(now) + HOUR + EXPIRY_SLACK;

const iso = (time: number): string => new Date(time * 1000).toISOString().replace('.000Z', 'Z');

export interface MetNorwayQuery {
	latitude: number;
	longitude: number;
	/** m */
	altitude: number;
}

/** @returns the query, or the reason for refusing it */
export function readMetNorwayQuery(params: URLSearchParams): MetNorwayQuery | string {
	const number = (name: string) => Number(params.get(name) ?? Number.NaN);
	const latitude = number('lat');
	const longitude = number('lon');
	if (!(Math.abs(latitude) <= 90)) return 'lat is missing or out of range';
	if (!(Math.abs(longitude) <= 180)) return 'lon is missing or out of range';
	return { latitude, longitude, altitude: params.has('altitude') ? number('altitude') : 0 };
}

/** Terms of service: more than four decimals are forbidden. */
export function tooPrecise(params: URLSearchParams): boolean {
	return ['lat', 'lon'].some((name) => /\.\d{5,}/.test(params.get(name) ?? ''));
}

/** An answer of `locationforecast/2.0/complete`. */
export function answerMetNorway(
	query: MetNorwayQuery,
	{ weather, seed }: Stage,
	now: number,
	faults: readonly ActiveFault[]
): MetNorwayAnswer {
	const start = Math.floor(now / HOUR) * HOUR;
	// Hourly for some two and a half days, to a stamp that the six-hourly part has too.
	const turn = Math.ceil((start + 54 * HOUR) / (6 * HOUR)) * 6 * HOUR;
	const end = Math.floor((start + 9.5 * DAY) / (6 * HOUR)) * 6 * HOUR;
	const entries = entriesFrom({ start, turn, end }, (time) =>
		weather.hour(time, query, secondOpinion(time, seed))
	);
	const answer: MetNorwayAnswer = {
		type: 'Feature',
		geometry: {
			type: 'Point',
			coordinates: [query.longitude, query.latitude, query.altitude]
		},
		properties: { meta: { updated_at: iso(issuedAt(now)), units: UNITS }, timeseries: entries }
	};
	spoil(answer, now, faults);
	return answer;
}

/** Puts the faults of the content into an answer. */
function spoil(answer: MetNorwayAnswer, now: number, faults: readonly ActiveFault[]): void {
	const { meta, timeseries } = answer.properties;
	for (const fault of faults) {
		if (fault.kind === 'nan') {
			const details = timeseries[1]?.data.instant.details;
			if (details !== undefined) details['air_temperature'] = NAN_MARK;
		} else if (fault.kind === 'nulls')
			for (const { data } of timeseries.slice(fault.lead, fault.lead + fault.hours))
				data.instant.details['air_temperature'] = null;
		else if (fault.kind === 'missingHour') timeseries.splice(fault.lead, 1);
		else if (fault.kind === 'outOfOrder')
			timeseries.splice(fault.lead, 2, ...timeseries.slice(fault.lead, fault.lead + 2).reverse());
		else if (fault.kind === 'wrongUnits') meta.units = { ...meta.units, wind_speed: 'km/h' };
	}
	const change = find(faults, 'daylightSaving');
	if (change !== undefined)
		for (const entry of timeseries) {
			const time = Date.parse(entry.time) / 1000;
			const offset = localOffset(change, time, now);
			entry.time = iso(time + offset).replace('Z', `+0${offset / HOUR}:00`);
		}
}
