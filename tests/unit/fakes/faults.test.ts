import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startForecastFake, type Fault, type ForecastFake } from '../../../fakes/forecast/server';
import { forecastSchema } from '../../../src/lib/engine';
import { forecastConfigSchema, type ForecastConfig } from '../../../src/lib/server/forecast/config';
import { currentFrom } from '../../../src/lib/server/forecast/current';
import { HTTP_TOOLS } from '../../../src/lib/server/forecast/http/tools';
import { metNorway } from '../../../src/lib/server/forecast/metNorway/provider';
import { openMeteo } from '../../../src/lib/server/forecast/openMeteo/provider';
import { refreshWith, type ForecastYard } from '../../../src/lib/server/forecast/refresh';
import type { TroubleCode } from '../../../src/lib/server/forecast/trouble';
import { HOUR, NOW } from '../server/forecast/answers';
import { memoryStore } from '../server/forecast/memoryStore';

let fake: ForecastFake;
let config: ForecastConfig;
let kept = memoryStore();
beforeAll(async () => {
	fake = await startForecastFake({
		now: NOW,
		scenario: { kind: 'story', timeZone: 'Europe/Lisbon', members: 2 }
	});
	config = forecastConfigSchema.parse({
		OPEN_METEO_URL: fake.url,
		OPEN_METEO_ENSEMBLE_URL: fake.url,
		MET_NORWAY_URL: fake.url,
		FORECAST_CONTACT: 'harbour@yard.example'
	});
});
afterAll(() => fake.close());
beforeEach(() => {
	kept = memoryStore();
});
afterEach(() => fake.setFaults({}));

const yard: ForecastYard = {
	id: 'yard',
	latitude: 37.02,
	longitude: -7.86,
	elevation: 3,
	forecastProvider: 'open-meteo'
};
/** The real client on loopback: the fake's clock, real sockets, short patience. */
function refresh(of: ForecastYard = yard) {
	const tools = { ...HTTP_TOOLS, clock: () => NOW * 1000, random: () => 0, attemptTimeout: 700 };
	return refreshWith(
		{
			store: kept.store,
			providers: { 'open-meteo': openMeteo(config, tools), 'met-norway': metNorway(config, tools) }
		},
		of,
		new Date(NOW * 1000)
	);
}
const stored = () => kept.runs().map(({ provider }) => provider);

describe('without faults', () => {
	it('both services give sound forecasts of the same weather', async () => {
		await refresh();
		await refresh({ ...yard, id: 'other', forecastProvider: 'met-norway' });
		expect(stored()).toEqual(['open-meteo', 'met-norway']);
		const [first, second] = kept.runs();
		expect(first?.members).toHaveLength(3);
		for (const run of [first, second])
			expect(forecastSchema.safeParse({ issuedAt: NOW, hourly: run?.hourly }).success).toBe(true);
		const at = (hourly: typeof first, t: number, name: 'temperature' | 'windSpeed') =>
			hourly?.hourly[name]?.[hourly.hourly.time.indexOf(t)] ?? 0;
		for (let t = Math.ceil(NOW / HOUR) * HOUR; t < NOW + 48 * HOUR; t += HOUR) {
			expect(Math.abs(at(first, t, 'temperature') - at(second, t, 'temperature'))).toBeLessThan(
				1.5
			);
			expect(Math.abs(at(first, t, 'windSpeed') - at(second, t, 'windSpeed'))).toBeLessThan(4);
		}
	});

	it('identifies itself and cuts coordinates as MET Norway’s terms ask', async () => {
		await refresh({ ...yard, latitude: 37.0212345, forecastProvider: 'met-norway' });
		const seen = fake.requests().at(-1);
		expect(seen).toMatchObject({
			target: 'met-norway',
			userAgent: 'Yardglass/0.1 harbour@yard.example',
			status: 200
		});
		expect(seen?.url).toContain('lat=37.0212&lon=-7.86&altitude=3');
	});
});

/** What each fault makes of a provider's answer; null: it is taken, with a gap or nulls. */
const EXPECTED: [name: string, fault: Fault, code: TroubleCode | null][] = [
	['a delay beyond patience', { kind: 'delay', milliseconds: 1_500 }, 'timeout'],
	['a short delay', { kind: 'delay', milliseconds: 100 }, null],
	['a limit with a long wait', { kind: 'rateLimited', retryAfter: '600' }, 'rateLimited'],
	[
		'a limit until a date',
		{ kind: 'rateLimited', retryAfter: new Date((NOW + 600) * 1000).toUTCString() },
		'rateLimited'
	],
	['a limit without a time', { kind: 'rateLimited' }, 'rateLimited'],
	['a lasting fault', { kind: 'serverError' }, 'providerFault'],
	['a passing fault', { kind: 'serverError', status: 503, times: 2 }, null],
	['truncated JSON', { kind: 'truncated' }, 'notJson'],
	['a transfer broken off', { kind: 'brokenOff' }, 'unreachable'],
	['a transfer broken off once', { kind: 'brokenOff', times: 1 }, null],
	['a bare NaN', { kind: 'nan' }, 'notJson'],
	['nulls', { kind: 'nulls', lead: 6, hours: 4 }, null],
	['a missing hour', { kind: 'missingHour' }, null],
	['hours out of order', { kind: 'outOfOrder' }, 'badTimes'],
	['local time in spring', { kind: 'daylightSaving', change: 'spring' }, 'badTimes'],
	['local time in autumn', { kind: 'daylightSaving', change: 'autumn' }, 'badTimes'],
	['a stale issue time', { kind: 'staleIssue', hours: 48 }, 'staleIssue'],
	['wind in km/h', { kind: 'wrongUnits' }, 'wrongUnits']
];

describe.each(['open-meteo', 'met-norway'] as const)('%s with', (own) => {
	const other = own === 'open-meteo' ? 'met-norway' : 'open-meteo';
	it.each(EXPECTED)('%s', async (_, fault, code) => {
		fake.setFaults({ [own]: [fault] });
		const result = await refresh({ ...yard, forecastProvider: own });
		// Whole or not at all: one run, of the provider that gave a sound answer.
		expect(result.troubles.map((trouble) => [trouble.provider, trouble.code])).toEqual(
			code === null ? [] : [[own, code]]
		);
		expect(stored()).toEqual([code === null ? own : other]);
		expect(kept.states().find(({ provider }) => provider === own)).toMatchObject({
			failures: code === null ? 0 : 1,
			trouble: code === null ? null : expect.stringMatching(/^(Open-Meteo|MET Norway) .+\.$/)
		});
	});
});

it('Open-Meteo with a series that is too short is refused', async () => {
	fake.setFaults({ 'open-meteo': [{ kind: 'shortSeries' }] });
	expect(await refresh()).toMatchObject({
		provider: 'met-norway',
		troubles: [{ code: 'wrongLength' }]
	});
});

describe('what is missing stays missing:', () => {
	const forecastOf = async (own: ForecastYard['forecastProvider'], fault: Fault) => {
		fake.setFaults({ [own]: [fault] });
		await refresh({ ...yard, forecastProvider: own });
		const current = await currentFrom(
			kept.store,
			{ ...yard, forecastProvider: own },
			new Date(NOW * 1000)
		);
		if (current === null) throw new Error('nothing stored');
		return current.forecast.hourly;
	};
	it.each(['open-meteo', 'met-norway'] as const)('an hour of %s is a gap', async (own) => {
		const { time } = await forecastOf(own, { kind: 'missingHour', lead: 6 });
		const gaps = time.slice(1).filter((t, i) => t - (time[i] ?? 0) === 2 * HOUR);
		expect(gaps).toHaveLength(1);
		expect(Math.abs((gaps[0] ?? 0) - NOW)).toBeLessThan(9 * HOUR);
	});
	it.each(['open-meteo', 'met-norway'] as const)('values of %s are null', async (own) => {
		const { temperature, windSpeed } = await forecastOf(own, { kind: 'nulls', lead: 6, hours: 4 });
		expect(temperature?.filter((v) => v === null)).toHaveLength(4);
		expect(windSpeed?.filter((v) => v === null)).toHaveLength(0);
	});
});

describe('an ensemble in trouble', () => {
	it.each<[Fault, string]>([
		[{ kind: 'serverError' }, 'has a fault of its own'],
		[{ kind: 'truncated' }, 'not whole JSON'],
		[{ kind: 'outOfOrder' }, 'is not after the hour before it'],
		[{ kind: 'wrongUnits' }, 'in km/h where m/s was asked for']
	])('leaves the forecast without members: %j', async (fault, words) => {
		fake.setFaults({ 'open-meteo-ensemble': [fault] });
		expect(await refresh()).toMatchObject({ outcome: 'stored', provider: 'open-meteo' });
		expect(kept.runs()[0]?.members).toBeNull();
		expect(kept.states()[0]?.trouble).toContain(words);
	});
});

it('keeps the last good run when both services fail', async () => {
	await refresh();
	const later = new Date((NOW + HOUR) * 1000);
	fake.setFaults({ 'open-meteo': [{ kind: 'nan' }], 'met-norway': [{ kind: 'truncated' }] });
	const tools = { ...HTTP_TOOLS, clock: () => later.getTime() };
	const result = await refreshWith(
		{
			store: kept.store,
			providers: { 'open-meteo': openMeteo(config, tools), 'met-norway': metNorway(config, tools) }
		},
		yard,
		later
	);
	expect(result).toMatchObject({
		outcome: 'lastGood',
		provider: 'open-meteo',
		troubles: [{ code: 'notJson' }, { code: 'notJson' }]
	});
	expect(stored()).toEqual(['open-meteo']);
});
