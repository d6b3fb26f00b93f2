import { getTimezoneOffset } from 'date-fns-tz';
import { find, localOffset, NAN_MARK, type ActiveFault } from './faults';
import { memberNudge } from './nudges';
import type { Query } from './openMeteoQuery';
import { inUnit, VARIABLES } from './openMeteoUnits';
import type { Stage } from './scenario';
import { NO_NUDGE, type HourWeather, type Nudge } from './weather';

const HOUR = 3_600;
const DAY = 86_400;
/** Ensemble runs are six hours apart. */
const RUN = 6 * HOUR;

type Value = number | string | null;

export interface OpenMeteoAnswer {
	latitude: number;
	longitude: number;
	generationtime_ms: number;
	utc_offset_seconds: number;
	timezone: string;
	timezone_abbreviation: string;
	elevation: number;
	hourly_units: Record<string, string>;
	hourly: Record<string, Value[]>;
}

/** One run to be listed: the plain name for the main run and the control, `_memberNN` for others. */
interface Run {
	suffix: string;
	nudge(time: number): Nudge;
}

const mainRun: Run[] = [{ suffix: '', nudge: () => NO_NUDGE }];

function ensembleRuns(now: number, { seed, members }: Stage): Run[] {
	const run = Math.floor(now / RUN) * RUN;
	return Array.from({ length: members + 1 }, (_, member) => ({
		suffix: member === 0 ? '' : `_member${String(member).padStart(2, '0')}`,
		nudge: (time) => memberNudge(time, member, run, seed)
	}));
}

/**
 * An answer of `/v1/forecast` or `/v1/ensemble`.
 *
 * @param now - when the answer is made, UTC epoch seconds
 * @param faults - those of the content; those of the transfer are the server's
 */
export function answerOpenMeteo(
	kind: 'forecast' | 'ensemble',
	query: Query,
	stage: Stage,
	now: number,
	faults: readonly ActiveFault[]
): OpenMeteoAnswer {
	const offset = getTimezoneOffset(query.timezone, new Date(now * 1000)) / 1000;
	const midnight = Math.floor((now + offset) / DAY) * DAY - offset;
	const start = midnight - query.past_days * DAY;
	// Whole UTC hours, also in a zone that is half an hour off.
	const times = Array.from(
		{ length: (query.past_days + query.forecast_days) * 24 },
		(_, i) => Math.ceil(start / HOUR) * HOUR + i * HOUR
	);
	const place = { latitude: query.latitude, longitude: query.longitude };
	const elevation = query.elevation ?? 0;
	const runs = kind === 'forecast' ? mainRun : ensembleRuns(now, stage);
	const choice = {
		temperature: query.temperature_unit,
		wind: find(faults, 'wrongUnits') === undefined ? query.wind_speed_unit : 'kmh',
		precipitation: query.precipitation_unit
	} as const;

	const answer: OpenMeteoAnswer = {
		latitude: Math.round(place.latitude * 8) / 8,
		longitude: Math.round(place.longitude * 8) / 8,
		generationtime_ms: 0.75,
		utc_offset_seconds: offset,
		timezone: query.timezone,
		timezone_abbreviation: query.timezone === 'UTC' ? 'UTC' : abbreviation(offset),
		elevation,
		hourly_units: { time: query.timeformat === 'unixtime' ? 'unixtime' : 'iso8601' },
		hourly: {
			time: times.map((t) => (query.timeformat === 'unixtime' ? t : isoLocal(t + offset)))
		}
	};
	for (const { suffix, nudge } of runs) {
		const hours = times.map((t): HourWeather => stage.weather.hour(t, place, nudge(t)));
		for (const name of query.hourly) {
			const variable = VARIABLES[name];
			if (variable === undefined) continue;
			const { unit, convert } = inUnit(variable, choice);
			answer.hourly_units[name + suffix] = unit;
			answer.hourly[name + suffix] = hours.map((hour) => convert(variable.value(hour, elevation)));
		}
	}
	spoil(answer, times, now, faults);
	return answer;
}

const abbreviation = (offset: number): string =>
	offset === 0 ? 'GMT' : `GMT${offset > 0 ? '+' : ''}${offset / HOUR}`;

const isoLocal = (seconds: number): string => new Date(seconds * 1000).toISOString().slice(0, 16);

/** Puts the faults of the content into an answer. */
function spoil(
	answer: OpenMeteoAnswer,
	times: number[],
	now: number,
	faults: readonly ActiveFault[]
): void {
	const { hourly } = answer;
	const at = (lead: number) => times.findIndex((t) => t > now) + lead;
	const temperatures = Object.keys(hourly).filter((name) => name.startsWith('temperature_2m'));
	for (const fault of faults) {
		if (fault.kind === 'nan')
			for (const name of temperatures) hourly[name]?.splice(at(0), 1, NAN_MARK);
		else if (fault.kind === 'nulls')
			for (const name of temperatures)
				hourly[name]?.fill(null, at(fault.lead), at(fault.lead) + fault.hours);
		else if (fault.kind === 'missingHour')
			for (const series of Object.values(hourly)) series.splice(at(fault.lead), 1);
		else if (fault.kind === 'outOfOrder')
			for (const series of Object.values(hourly))
				series.splice(
					at(fault.lead),
					2,
					...series.slice(at(fault.lead), at(fault.lead) + 2).reverse()
				);
		else if (fault.kind === 'shortSeries') hourly['wind_speed_10m']?.pop();
		else if (fault.kind === 'daylightSaving') {
			answer.utc_offset_seconds = localOffset(fault, now, now);
			hourly['time'] = times.map((t) => t + localOffset(fault, t, now));
		}
	}
}
