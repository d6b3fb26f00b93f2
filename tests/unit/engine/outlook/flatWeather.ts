import type { Face } from '../../../../src/lib/engine/outlook/face/face';
import type { Forecast, HourlyVariable } from '../../../../src/lib/engine/outlook/weather/forecast';
import type { LooseSand, Site } from '../../../../src/lib/engine/outlook/weather/site';
import type { Step } from '../../../../src/lib/engine/outlook/hours/step';
import { faceConditions } from '../../../../src/lib/engine/outlook/face/conditions';
import type { FaceConditions } from '../../../../src/lib/engine/outlook/weather/slots';
import { slotWeather } from '../../../../src/lib/engine/outlook/weather/weather';

/** A made-up place and a kind day, from which each test changes the one thing it is about. */
export const HOUR = 3600;
/** 4 May 2026, 00:00 UTC: summer time in Lisbon, so local midnight is 23:00 UTC the day before. */
export const START = Date.UTC(2026, 4, 4) / 1000;
export const SITE: Site = {
	latitude: 37,
	longitude: -7.9,
	elevation: 5,
	timeZone: 'Europe/Lisbon'
};

const KIND: Record<HourlyVariable, number | undefined> = {
	temperature: 18,
	dewPoint: 8,
	relativeHumidity: undefined,
	pressure: 1015,
	windSpeed: 2,
	windGust: 3,
	windDirection: 40,
	precipitation: 0,
	precipitationProbability: undefined,
	cloudCover: 50,
	ghi: undefined,
	dni: undefined,
	dhi: undefined
};

/** Values of a variable by hour; a function of the hour's index. `null` is missing, undefined absent. */
export type Changes = Partial<
	Record<HourlyVariable, number | null | undefined | ((hour: number) => number | null)>
>;

export function forecastOf(changes: Changes = {}, hours = 97, issuedHour = 0): Forecast {
	const hourly: Forecast['hourly'] = {
		time: Array.from({ length: hours }, (_, i) => START + i * HOUR)
	};
	const all = { ...KIND, ...changes };
	for (const [name, value] of Object.entries(all)) {
		if (value === undefined) continue;
		const variable = name as HourlyVariable;
		hourly[variable] = Array.from({ length: hours }, (_, i) =>
			typeof value === 'function' ? value(i) : value
		);
	}
	return { issuedAt: START + issuedHour * HOUR, hourly };
}

export const TOPSIDES: Face = {
	tilt: 95,
	azimuth: 90,
	solarAbsorptance: 0.4,
	emissivity: 0.9,
	material: 'grp'
};

/** A coat without any limit or time: each test states the ones it is about. */
export const COAT: Step = {
	name: 'coat',
	kind: 'coat',
	durationMinutes: 60,
	method: 'roller',
	limits: {},
	times: {}
};

export function conditionsOf(
	changes: Changes = {},
	{
		site = SITE,
		face = TOPSIDES,
		looseSand = null,
		forecast = forecastOf(changes),
		shelter = 'open'
	}: {
		site?: Site;
		face?: Face;
		looseSand?: LooseSand | null;
		forecast?: Forecast;
		shelter?: Parameters<typeof faceConditions>[3];
	} = {}
): FaceConditions[] {
	return faceConditions(slotWeather({ site, forecast, looseSand }), site, face, shelter);
}

/** Slot of an hour after START. */
export const slotAt = (hour: number): number => hour * 4;
