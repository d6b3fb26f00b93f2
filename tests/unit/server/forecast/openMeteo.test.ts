import nock from 'nock';
import { afterEach, describe, expect, it } from 'vitest';
import { openMeteo } from '../../../../src/lib/server/forecast/openMeteo/provider';
import { NO_VALIDATORS, type FetchRequest } from '../../../../src/lib/server/forecast/provider';
import {
	config,
	DAY,
	ENSEMBLE,
	ensembleBody,
	HOUR,
	hoursAskedFor,
	NOW,
	OPEN_METEO,
	openMeteoBody,
	stillTools,
	type OpenMeteoBody
} from './answers';

const request: FetchRequest = {
	place: { latitude: 37.12345678, longitude: -8.5, elevation: 4 },
	now: NOW,
	validators: NO_VALIDATORS,
	attempts: 1
};
const HTTP_NOW = { date: new Date(NOW * 1000).toUTCString() };

/** What the provider makes of an answer; the ensemble answers 404 unless given. */
async function fetchWith(body: unknown, ensemble?: unknown, headers = HTTP_NOW) {
	nock(OPEN_METEO).get('/v1/forecast').query(true).reply(200, JSON.stringify(body), headers);
	const members = nock(ENSEMBLE).get('/v1/ensemble').query(true);
	if (ensemble === undefined) members.reply(404).persist();
	else members.reply(200, JSON.stringify(ensemble), headers);
	const answer = await openMeteo(config, stillTools()).fetch(request);
	if (answer.kind !== 'forecast') throw new Error('no forecast');
	return answer;
}

const spoilt = (change: (body: OpenMeteoBody) => void, make = openMeteoBody): OpenMeteoBody => {
	const body = make();
	change(body);
	return body;
};

afterEach(() => nock.cleanAll());

describe('the request', () => {
	it('asks both services for SI units, UTC and eighteen days', async () => {
		const queries: URLSearchParams[] = [];
		const keep = (uri: string) => queries.push(new URL(uri, OPEN_METEO).searchParams);
		nock(OPEN_METEO)
			.get('/v1/forecast')
			.query(true)
			.reply(200, (uri) => (keep(uri), openMeteoBody()));
		nock(ENSEMBLE)
			.get('/v1/ensemble')
			.query(true)
			.reply(200, (uri) => (keep(uri), ensembleBody()));
		await openMeteo(config, stillTools()).fetch(request);
		for (const query of queries)
			expect(Object.fromEntries(query)).toMatchObject({
				latitude: '37.12345678',
				longitude: '-8.5',
				elevation: '4',
				temperature_unit: 'celsius',
				wind_speed_unit: 'ms',
				precipitation_unit: 'mm',
				timeformat: 'unixtime',
				timezone: 'GMT',
				past_days: '2',
				forecast_days: '16'
			});
		expect(queries.map((query) => query.get('apikey'))).toEqual([null, null]);
		expect(queries[0]?.get('hourly')?.split(',').sort()).toEqual(
			Object.keys(openMeteoBody().hourly_units)
				.filter((name) => name !== 'time')
				.sort()
		);
	});

	it('carries the key of a paid plan', async () => {
		nock(OPEN_METEO)
			.get('/v1/forecast')
			.query(({ apikey }) => apikey === 'paid')
			.reply(200, openMeteoBody());
		nock(ENSEMBLE)
			.get('/v1/ensemble')
			.query(({ apikey }) => apikey === 'paid')
			.reply(200, ensembleBody());
		const paid = openMeteo({ ...config, OPEN_METEO_KEY: 'paid' }, stillTools());
		expect(await paid.fetch(request)).toMatchObject({ shortfall: null });
	});
});

describe('a sound answer', () => {
	it('becomes the canonical forecast, stamp by stamp', async () => {
		const { forecast, expiresAt } = await fetchWith(openMeteoBody(), ensembleBody());
		expect(forecast.issuedAt).toBe(NOW);
		expect(expiresAt).toBeNull();
		expect(forecast.hourly.time).toEqual(hoursAskedFor());
		const first = Object.fromEntries(
			Object.entries(forecast.hourly).map(([name, values]) => [name, values[0]])
		);
		expect(first).toEqual({
			time: hoursAskedFor()[0],
			temperature: 12,
			dewPoint: 7,
			relativeHumidity: 71,
			pressure: 1012,
			windSpeed: 3,
			windGust: 5,
			windDirection: 200,
			precipitation: 0,
			precipitationProbability: 5,
			cloudCover: 30,
			ghi: 100,
			dni: 150,
			dhi: 60
		});
		expect(forecast.hourly.temperature?.[100]).toBe(13);
	});

	it('brings the control and each member, by its number', async () => {
		const { forecast, shortfall } = await fetchWith(openMeteoBody(), ensembleBody());
		expect(shortfall).toBeNull();
		expect(forecast.members?.map((member) => member.temperature?.[0])).toEqual([12, 13, 14]);
		expect(forecast.members?.[1]?.pressure).toBeUndefined();
	});

	it('lays members on the hours of the forecast, null where they end', async () => {
		const ensemble = spoilt((body) => {
			for (const name of Object.keys(body.hourly))
				body.hourly[name] = (body.hourly[name] ?? []).slice(DAY / HOUR, -DAY / HOUR);
		}, ensembleBody);
		const { forecast } = await fetchWith(openMeteoBody(), ensemble);
		const values = forecast.members?.[2]?.temperature ?? [];
		expect(values).toHaveLength(forecast.hourly.time.length);
		expect([values[23], values[24], values.at(-25), values.at(-24)]).toEqual([
			null,
			14.24,
			expect.closeTo(18.07, 6),
			null
		]);
	});

	it('keeps a null as a missing value', async () => {
		const body = spoilt(({ hourly }) => hourly['temperature_2m']?.fill(null, 60, 63));
		const { forecast } = await fetchWith(body);
		expect(forecast.hourly.temperature?.slice(59, 64)).toEqual([12.59, null, null, null, 12.63]);
	});

	it('leaves out a variable that the model does not have', async () => {
		const body = spoilt(({ hourly, hourly_units }) => {
			hourly['direct_normal_irradiance']?.fill(null);
			hourly_units['direct_normal_irradiance'] = 'undefined';
		});
		const { forecast } = await fetchWith(body);
		expect(forecast.hourly).not.toHaveProperty('dni');
		expect(forecast.hourly).toHaveProperty('dhi');
	});

	it('keeps a missing hour as a gap', async () => {
		const body = spoilt(({ hourly }) => {
			for (const series of Object.values(hourly)) series.splice(70, 1);
		});
		const { forecast } = await fetchWith(body);
		const { time } = forecast.hourly;
		expect((time[70] ?? 0) - (time[69] ?? 0)).toBe(2 * HOUR);
	});

	it('stands without its ensemble, and says what is lacking', async () => {
		const { forecast, shortfall } = await fetchWith(openMeteoBody());
		expect(forecast.members).toBeUndefined();
		expect(shortfall).toBe(
			"Open-Meteo's ensemble refuses the request (HTTP 404). There are no members."
		);
	});

	it('refuses an unsound ensemble whole, and stands without it', async () => {
		const ensemble = spoilt(({ hourly }) => {
			hourly['temperature_2m_member02']?.splice(10, 1, 99);
		}, ensembleBody);
		const { forecast, shortfall } = await fetchWith(openMeteoBody(), ensemble);
		expect(forecast.members).toBeUndefined();
		expect(shortfall).toContain('members.2.temperature.10 99 is outside -80 to 60');
	});
});

describe('an unsound answer is refused whole:', () => {
	const cases: [string, string, string, (body: OpenMeteoBody) => void][] = [
		[
			'wind in km/h',
			'wrongUnits',
			'wind_speed_10m in km/h where m/s',
			({ hourly_units: u }) => (u['wind_speed_10m'] = 'km/h')
		],
		[
			'temperature in °F',
			'wrongUnits',
			'temperature_2m in °F',
			({ hourly_units: u }) => (u['temperature_2m'] = '°F')
		],
		[
			'no unit at all',
			'wrongUnits',
			'in which unit precipitation',
			({ hourly_units: u }) => delete u['precipitation']
		],
		[
			'times in another format',
			'wrongUnits',
			'time in iso8601',
			({ hourly_units: u }) => (u['time'] = 'iso8601')
		],
		[
			'a series too short',
			'wrongLength',
			'windSpeed has 431 values for 432 hours',
			({ hourly }) => hourly['wind_speed_10m']?.pop()
		],
		[
			'a series too long',
			'wrongLength',
			'cloudCover',
			({ hourly }) => hourly['cloud_cover']?.push(1)
		],
		[
			'hours out of order',
			'badTimes',
			'is not after the hour before it',
			({ hourly }) =>
				hourly['time']?.splice(60, 2, ...(hourly['time'] ?? []).slice(60, 62).reverse())
		],
		[
			'a doubled hour',
			'badTimes',
			'is not after the hour before it',
			({ hourly }) => hourly['time']?.splice(60, 1, hourly['time'][59] ?? 0)
		],
		[
			'half hours',
			'badTimes',
			'is not on a whole hour',
			({ hourly }) => (hourly['time'] = hourly['time']?.map((t) => (t ?? 0) + 1_800) ?? [])
		],
		['local time', 'badTimes', '3600 s off UTC', (body) => (body.utc_offset_seconds = 3_600)],
		[
			'a missing series',
			'wrongFormat',
			'left out dew_point_2m',
			({ hourly }) => delete hourly['dew_point_2m']
		],
		['no hours', 'wrongFormat', 'hourly', (body) => delete (body as Partial<OpenMeteoBody>).hourly],
		[
			'a value that no weather has',
			'implausible',
			'windSpeed.40 468.7 is outside 0 to 90',
			({ hourly }) => hourly['wind_speed_10m']?.splice(40, 1, 468.7)
		],
		[
			'other days than asked for',
			'staleIssue',
			'other days',
			({ hourly }) => (hourly['time'] = hourly['time']?.map((t) => (t ?? 0) - 5 * DAY) ?? [])
		]
	];
	it.each(cases)('%s', async (_, code, words, change) => {
		await expect(fetchWith(spoilt(change))).rejects.toMatchObject({
			code,
			message: expect.stringMatching(/^Open-Meteo .*\.$/s)
		});
		await expect(fetchWith(spoilt(change))).rejects.toThrow(words);
	});

	it('a text where a number belongs', async () => {
		const body: unknown = JSON.parse(
			JSON.stringify(openMeteoBody()).replace('"wind_gusts_10m":[5', '"wind_gusts_10m":["NaN"')
		);
		await expect(fetchWith(body)).rejects.toMatchObject({ code: 'wrongFormat' });
	});

	it('one that a cache on the way has kept for a day', async () => {
		const old = { date: new Date((NOW - DAY) * 1000).toUTCString() };
		await expect(fetchWith(openMeteoBody(), undefined, old)).rejects.toMatchObject({
			code: 'staleIssue',
			message: 'Open-Meteo sent an answer made 24 h ago.'
		});
	});

	it('one from the future', async () => {
		const ahead = { date: new Date((NOW + HOUR) * 1000).toUTCString() };
		await expect(fetchWith(openMeteoBody(), undefined, ahead)).rejects.toMatchObject({
			code: 'staleIssue'
		});
	});
});

it('passes on that nothing has changed, without asking the ensemble', async () => {
	nock(OPEN_METEO, { reqheaders: { 'if-none-match': '"e"' } })
		.get('/v1/forecast')
		.query(true)
		.reply(304);
	const answer = await openMeteo(config, stillTools()).fetch({
		...request,
		validators: { etag: '"e"', lastModified: null }
	});
	expect(answer).toMatchObject({ kind: 'unchanged', validators: { etag: '"e"' } });
});
