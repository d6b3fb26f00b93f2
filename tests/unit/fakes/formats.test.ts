import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import { HOUR, NOW } from '../server/forecast/answers';

let fake: ForecastFake;
beforeAll(async () => {
	fake = await startForecastFake({
		now: NOW,
		scenario: { kind: 'story', timeZone: 'Europe/Lisbon' }
	});
});
afterAll(() => fake.close());

const openMeteoSchema = z.object({
	utc_offset_seconds: z.number(),
	timezone_abbreviation: z.string(),
	elevation: z.number(),
	hourly_units: z.record(z.string(), z.string()),
	hourly: z
		.object({ time: z.array(z.union([z.string(), z.number()])) })
		.catchall(z.array(z.number().nullable()))
});
const get = (path: string, headers: Record<string, string> = {}) =>
	fetch(`${fake.url}${path}`, { headers });
async function openMeteo(query: string, path = '/v1/forecast') {
	const response = await get(`${path}?latitude=37.02&longitude=-7.86&${query}`);
	expect(response.status).toBe(200);
	return openMeteoSchema.parse(await response.json());
}
const MET = '/weatherapi/locationforecast/2.0/complete';
const UA = { 'user-agent': 'SomeYard/1.0 yard.example' };

describe('Open-Meteo’s fake', () => {
	it('answers in the service’s own defaults unless asked otherwise', async () => {
		const body = await openMeteo('hourly=temperature_2m,wind_speed_10m,precipitation');
		expect(body.hourly_units).toEqual({
			time: 'iso8601',
			temperature_2m: '°C',
			wind_speed_10m: 'km/h',
			precipitation: 'mm'
		});
		expect(body.hourly.time).toHaveLength(7 * 24);
		expect(body.hourly.time[0]).toBe('2026-12-01T00:00');
		expect(body.timezone_abbreviation).toBe('GMT');
	});

	it('gives the same weather in the units and times asked for', async () => {
		const names = 'hourly=temperature_2m,wind_speed_10m,precipitation';
		const si = await openMeteo(
			`${names}&wind_speed_unit=ms&timeformat=unixtime&past_days=2&forecast_days=16`
		);
		const other = await openMeteo(
			`${names}&wind_speed_unit=kn&temperature_unit=fahrenheit&precipitation_unit=inch&past_days=2&forecast_days=16`
		);
		expect(other.hourly_units).toMatchObject({
			temperature_2m: '°F',
			wind_speed_10m: 'kn',
			precipitation: 'inch'
		});
		expect(si.hourly.time[0]).toBe(Date.UTC(2026, 10, 29) / 1000);
		expect(si.hourly.time).toHaveLength(18 * 24);
		// Rounded to the service's own digits.
		for (const i of [0, 100, 150, 431]) {
			const [ms = 0, kn = 0] = [si, other].map(({ hourly }) => hourly['wind_speed_10m']?.[i] ?? 0);
			expect(Math.abs(kn - ms / 0.514444)).toBeLessThan(0.02);
			const [c = 0, f = 0] = [si, other].map(({ hourly }) => hourly['temperature_2m']?.[i] ?? 0);
			expect(Math.abs(f - (c * 1.8 + 32))).toBeLessThan(0.2);
		}
	});

	it('counts days from midnight in the zone asked for', async () => {
		const body = await openMeteo('hourly=cloud_cover&timezone=America/New_York&forecast_days=1');
		expect(body.utc_offset_seconds).toBe(-5 * HOUR);
		expect(body.hourly.time.slice(0, 2)).toEqual(['2026-12-01T00:00', '2026-12-01T01:00']);
		const utc = await openMeteo('hourly=cloud_cover&forecast_days=2');
		expect(body.hourly['cloud_cover']?.[0]).toBe(utc.hourly['cloud_cover']?.[5]);
	});

	it('brings pressure down to the elevation', async () => {
		const low = await openMeteo('hourly=surface_pressure,pressure_msl&elevation=0');
		const high = await openMeteo('hourly=surface_pressure,pressure_msl&elevation=800');
		expect(low.hourly['surface_pressure']).toEqual(low.hourly['pressure_msl']);
		const fall =
			(low.hourly['surface_pressure']?.[0] ?? 0) - (high.hourly['surface_pressure']?.[0] ?? 0);
		expect(fall).toBeGreaterThan(88);
		expect(fall).toBeLessThan(100);
	});

	it('lists a control and thirty members of the ensemble', async () => {
		const body = await openMeteo('hourly=temperature_2m', '/v1/ensemble');
		const names = Object.keys(body.hourly).filter((name) => name !== 'time');
		expect(names).toHaveLength(31);
		expect(names.slice(0, 3)).toEqual([
			'temperature_2m',
			'temperature_2m_member01',
			'temperature_2m_member02'
		]);
		expect(Object.keys(body.hourly_units)).toEqual(['time', ...names]);
	});

	it.each([
		['hourly=tempeture_2m&latitude=1&longitude=1', 'tempeture_2m'],
		['hourly=temperature_2m&latitude=91&longitude=1', 'latitude must be in range'],
		['hourly=temperature_2m&latitude=1&longitude=1&forecast_days=17', 'Allowed range 0 to 16'],
		['hourly=temperature_2m&longitude=1', 'latitude'],
		['hourly=temperature_2m&latitude=1&longitude=1&timezone=Mars', 'Invalid timezone']
	])('refuses %s as the service does', async (query, words) => {
		const response = await get(`/v1/forecast?${query}`);
		expect(response.status).toBe(400);
		expect(await response.json()).toEqual({ error: true, reason: expect.stringContaining(words) });
	});
});

describe('MET Norway’s fake', () => {
	const periodSchema = z.object({ details: z.record(z.string(), z.number()) }).optional();
	const bodySchema = z.object({
		geometry: z.object({ coordinates: z.array(z.number()) }),
		properties: z.object({
			meta: z.object({ updated_at: z.string(), units: z.record(z.string(), z.string()) }),
			timeseries: z.array(
				z.object({
					time: z.iso.datetime(),
					data: z.object({
						instant: z.object({ details: z.record(z.string(), z.number()) }),
						next_1_hours: periodSchema,
						next_6_hours: periodSchema,
						next_12_hours: periodSchema
					})
				})
			)
		})
	});
	const series = async () => {
		const response = await get(`${MET}?lat=37.02&lon=-7.86&altitude=3`, UA);
		return bodySchema.parse(await response.json());
	};

	it('is GeoJSON from the present hour on, hourly and then six-hourly', async () => {
		const { geometry, properties } = await series();
		expect(geometry.coordinates).toEqual([-7.86, 37.02, 3]);
		expect(properties.meta.updated_at).toBe('2026-12-01T06:17:00Z');
		const times = properties.timeseries.map(({ time }) => Date.parse(time) / 1000);
		expect(times[0]).toBe(Math.floor(NOW / HOUR) * HOUR);
		const gaps = times.slice(1).map((t, i) => (t - (times[i] ?? 0)) / HOUR);
		expect([...new Set(gaps)]).toEqual([1, 6]);
		expect(gaps.filter((gap) => gap === 1).length).toBeGreaterThanOrEqual(54);
		expect((times.at(-1) ?? 0) - NOW).toBeGreaterThan(9 * 24 * HOUR);
	});

	it('gives amounts of what follows, and none that reaches past its part', async () => {
		const { timeseries } = (await series()).properties;
		timeseries.forEach(({ time, data }, i) => {
			const next = timeseries[i + 1];
			const gap = next === undefined ? 0 : (Date.parse(next.time) - Date.parse(time)) / 3.6e6;
			expect(data.next_1_hours !== undefined).toBe(gap === 1);
			if (gap === 6) expect(data.next_6_hours?.details).toHaveProperty('precipitation_amount');
		});
		expect(Object.keys(timeseries.at(-1)?.data ?? {})).toEqual(['instant']);
	});

	it('adds six hours up to what the hours give', async () => {
		const { timeseries } = (await series()).properties;
		const amount = (i: number, period: 'next_1_hours' | 'next_6_hours') =>
			timeseries[i]?.data[period]?.details['precipitation_amount'] ?? 0;
		for (const i of [0, 10, 40]) {
			const hourly = [0, 1, 2, 3, 4, 5].reduce((sum, k) => sum + amount(i + k, 'next_1_hours'), 0);
			expect(Math.abs(amount(i, 'next_6_hours') - hourly)).toBeLessThan(0.31);
		}
	});

	it('has gusts in the near term only', async () => {
		const { timeseries } = (await series()).properties;
		expect(timeseries[0]?.data.instant.details).toHaveProperty('wind_speed_of_gust');
		expect(timeseries.at(-1)?.data.instant.details).not.toHaveProperty('wind_speed_of_gust');
	});

	it('says until when it holds, and 304 to who has it', async () => {
		const path = `${MET}?lat=37.02&lon=-7.86`;
		const { headers } = await get(path, UA);
		const lastModified = headers.get('last-modified') ?? '';
		expect(lastModified).toBe('Tue, 01 Dec 2026 06:17:00 GMT');
		expect(headers.get('expires')).toBe('Tue, 01 Dec 2026 07:19:00 GMT');
		expect(headers.get('date')).toBe('Tue, 01 Dec 2026 06:20:00 GMT');
		const again = await get(path, { ...UA, 'if-modified-since': lastModified });
		expect([again.status, await again.text()]).toEqual([304, '']);
		expect(again.headers.get('expires')).toBe(headers.get('expires'));
		const older = { ...UA, 'if-modified-since': 'Tue, 01 Dec 2026 05:17:00 GMT' };
		expect((await get(path, older)).status).toBe(200);
	});

	it.each([
		['nobody in particular', 'lat=37.02&lon=-7.86', { 'user-agent': 'node' }],
		['more than four decimals', 'lat=37.02345&lon=-7.86', UA]
	])('forbids %s', async (_, query, headers) => {
		expect((await get(`${MET}?${query}`, headers)).status).toBe(403);
	});

	it('refuses a request without a place', async () => {
		expect((await get(`${MET}?lat=37.02`, UA)).status).toBe(400);
	});
});

describe('the fake’s control', () => {
	const post = (change: unknown) =>
		fetch(`${fake.url}/_control`, { method: 'POST', body: JSON.stringify(change) });

	it('switches faults on and off, and lets some wear off', async () => {
		const status = async () =>
			(await get('/v1/forecast?latitude=1&longitude=1&hourly=cloud_cover')).status;
		await post({ faults: { 'open-meteo': [{ kind: 'serverError', status: 502, times: 2 }] } });
		expect([await status(), await status(), await status()]).toEqual([502, 502, 200]);
		await post({ faults: { 'open-meteo': [{ kind: 'rateLimited', retryAfter: '9' }] } });
		const limited = await get('/v1/forecast?latitude=1&longitude=1&hourly=cloud_cover');
		expect([limited.status, limited.headers.get('retry-after')]).toEqual([429, '9']);
		await post({ faults: {} });
		expect(await status()).toBe(200);
	});

	it('changes scenario and clock', async () => {
		const change = {
			now: Date.UTC(2013, 5, 1, 12) / 1000,
			scenario: { kind: 'replay', file: 'tests/fixtures/weather/ewr-2013.csv' }
		};
		expect(await (await post(change)).json()).toMatchObject(change);
		const body = await openMeteo('hourly=temperature_2m,cloud_cover&forecast_days=1');
		expect(body.hourly.time[0]).toBe('2013-06-01T00:00');
		expect(body.hourly['temperature_2m']?.[0]).toBeGreaterThan(15);
		expect(body.hourly['cloud_cover']?.every((v) => v === null)).toBe(true);
		await post({ now: NOW, scenario: { kind: 'story', timeZone: 'Europe/Lisbon' } });
	});

	it.each([
		{ faults: { elsewhere: [] } },
		{ faults: { 'met-norway': [{ kind: 'gremlins' }] } },
		{ scenario: { kind: 'replay', file: '/none' } }
	])('refuses %j', async (change) => {
		expect((await post(change)).status).toBe(400);
	});
});
