import { generator } from '../../fakes/forecast/generator';
import { memberNudge } from '../../fakes/forecast/nudges';
import { NO_NUDGE, type HourWeather, type Nudge } from '../../fakes/forecast/weather';
import type { Forecast, LooseSand, Member, Site } from '../../src/lib/engine';

/** The weather that benchmarks run in: made up, seeded, the same in every run. */
const HOUR = 3600;
export const START = Date.UTC(2026, 4, 4) / 1000;
export const SITE: Site = {
	latitude: 37.02,
	longitude: -7.86,
	elevation: 3,
	timeZone: 'Europe/Lisbon'
};
export const SAND: LooseSand = {
	sectors: [{ from: 290, to: 350 }],
	grainDiameter: 0.25,
	clayPercent: 1
};

const WEATHER = generator({
	timeZone: SITE.timeZone,
	anchor: '2026-05-04',
	seed: 1,
	climate: 'seasonal'
});
const SEED = 1;

/** What a provider sends, and what it sends of each member of an ensemble. */
const FORECAST_NAMES = {
	temperature: 'temperature',
	dewPoint: 'dewPoint',
	pressure: 'seaLevelPressure',
	windSpeed: 'windSpeed',
	windGust: 'windGust',
	windDirection: 'windDirection',
	precipitation: 'precipitation',
	precipitationProbability: 'precipitationProbability',
	cloudCover: 'cloudCover',
	ghi: 'ghi',
	dni: 'dni',
	dhi: 'dhi'
} as const satisfies Partial<Record<keyof Member, keyof HourWeather>>;
const MEMBER_NAMES = [
	'temperature',
	'dewPoint',
	'windSpeed',
	'windGust',
	'windDirection',
	'precipitation',
	'cloudCover'
] as const;

function hoursOf(
	times: readonly number[],
	names: readonly (keyof typeof FORECAST_NAMES)[],
	nudge: (time: number) => Nudge
): Member {
	const hours = times.map((time) => WEATHER.hour(time, SITE, nudge(time)));
	return Object.fromEntries(
		names.map((name) => [name, hours.map((hour) => hour[FORECAST_NAMES[name]])])
	);
}

/** So many days of weather in so many members (none: the forecast alone). */
export function forecastOf(days: number, members: number): Forecast {
	const time = Array.from({ length: days * 24 + 1 }, (_, i) => START + i * HOUR);
	const all = Object.keys(FORECAST_NAMES) as (keyof typeof FORECAST_NAMES)[];
	return {
		issuedAt: START,
		hourly: { time, ...hoursOf(time, all, () => NO_NUDGE) },
		members: Array.from({ length: members }, (_, member) =>
			hoursOf(time, MEMBER_NAMES, (at) => memberNudge(at, member, 0, SEED))
		)
	};
}
