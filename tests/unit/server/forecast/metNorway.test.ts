import nock from 'nock';
import { afterEach, describe, expect, it } from 'vitest';
import { metNorway } from '../../../../src/lib/server/forecast/metNorway/provider';
import { stationPressure } from '../../../../src/lib/server/forecast/metNorway/pressure';
import { NO_VALIDATORS, type FetchRequest } from '../../../../src/lib/server/forecast/provider';
import {
	config,
	HOUR,
	isoSeconds,
	MET_NORWAY,
	metNorwayBody,
	NOW,
	stillTools,
	type MetBody
} from './answers';

const PATH = '/weatherapi/locationforecast/2.0/complete';
const request: FetchRequest = {
	place: { latitude: 37.12349, longitude: -8.50009, elevation: 100.4 },
	now: NOW,
	validators: NO_VALIDATORS,
	attempts: 1
};

async function fetchWith(body: unknown) {
	nock(MET_NORWAY).get(PATH).query(true).reply(200, JSON.stringify(body));
	const answer = await metNorway(config, stillTools()).fetch(request);
	if (answer.kind !== 'forecast') throw new Error('no forecast');
	return answer.forecast;
}

const spoilt = (change: (body: MetBody) => void): MetBody => {
	const body = metNorwayBody();
	change(body);
	return body;
};

afterEach(() => nock.cleanAll());

describe('the request', () => {
	it('cuts coordinates to four decimals and says who asks', async () => {
		nock(MET_NORWAY, { reqheaders: { 'user-agent': 'Yardglass/0.1 harbour@yard.example' } })
			.get(PATH)
			.query({ lat: '37.1234', lon: '-8.5', altitude: '100' })
			.reply(200, metNorwayBody());
		expect(await metNorway(config, stillTools()).fetch(request)).toMatchObject({
			kind: 'forecast'
		});
	});

	it('is not made without a contact address', async () => {
		const nameless = metNorway({ ...config, FORECAST_CONTACT: '' }, stillTools());
		await expect(nameless.fetch(request)).rejects.toMatchObject({ code: 'noContact' });
	});
});

describe('a sound answer', () => {
	it('moves the rain of the hour that follows to the stamp at its end', async () => {
		const { hourly } = await fetchWith(metNorwayBody());
		expect(hourly.time[0]).toBe(Math.floor(NOW / HOUR) * HOUR);
		expect(hourly.precipitation?.slice(0, 4)).toEqual([null, 0, 0.1, 0.2]);
		expect(hourly.precipitationProbability?.slice(0, 4)).toEqual([null, 30, 31, 32]);
	});

	it('keeps six-hourly stamps, each with the rain since the one before', async () => {
		const { hourly } = await fetchWith(metNorwayBody());
		const gaps = hourly.time.slice(1).map((t, i) => (t - (hourly.time[i] ?? 0)) / HOUR);
		expect(gaps.slice(-4)).toEqual([6, 6, 6, 6]);
		expect(gaps.slice(0, -4).every((gap) => gap === 1)).toBe(true);
		expect(hourly.precipitation?.slice(-4)).toEqual([6, 6, 6, 6]);
	});

	it('has gusts in the near term only', async () => {
		const { hourly } = await fetchWith(metNorwayBody());
		expect(hourly.windGust?.[0]).toBe(7);
		expect(hourly.windGust?.slice(-4)).toEqual([null, null, null, null]);
	});

	it('has neither irradiance nor members', async () => {
		const forecast = await fetchWith(metNorwayBody());
		for (const name of ['ghi', 'dni', 'dhi']) expect(forecast.hourly).not.toHaveProperty(name);
		expect(forecast.members).toBeUndefined();
	});

	it('is issued when MET Norway updated it', async () => {
		expect((await fetchWith(metNorwayBody())).issuedAt).toBe(NOW - 20 * 60);
	});

	it('brings pressure from sea level to the yard', async () => {
		const { hourly } = await fetchWith(metNorwayBody());
		expect(hourly.pressure?.[0]).toBeCloseTo(stationPressure(1013.25, 15, 100.4), 1);
	});

	it('leaves the rain over a missing hour unknown', async () => {
		const { hourly } = await fetchWith(
			spoilt(({ properties }) => properties.timeseries.splice(3, 1))
		);
		expect((hourly.time[3] ?? 0) - (hourly.time[2] ?? 0)).toBe(2 * HOUR);
		expect(hourly.precipitation?.slice(2, 5)).toEqual([0.1, null, 0.4]);
	});

	it('does without what a region does not have', async () => {
		const forecast = await fetchWith(
			spoilt(({ properties }) => {
				delete properties.meta.units['wind_speed_of_gust'];
				for (const { data } of properties.timeseries)
					delete data.instant.details['wind_speed_of_gust'];
			})
		);
		expect(forecast.hourly).not.toHaveProperty('windGust');
	});
});

describe('stationPressure', () => {
	/** ISO 2533 / ICAO standard atmosphere: pressure and temperature at 500, 1000 and 2000 m. */
	it.each([
		[500, 11.75, 954.61],
		[1000, 8.5, 898.76],
		[2000, 2.0, 794.98]
	])('meets the standard atmosphere at %i m', (elevation, temperature, expected) => {
		expect(stationPressure(1013.25, temperature, elevation)).toBeCloseTo(expected, 0);
		expect(Math.abs(stationPressure(1013.25, temperature, elevation) - expected)).toBeLessThan(0.1);
	});
	it('is the pressure at sea level there', () => {
		expect(stationPressure(1009.3, 21, 0)).toBe(1009.3);
	});
});

describe('an unsound answer is refused whole:', () => {
	const details = (body: MetBody, i: number) =>
		body.properties.timeseries[i]?.data.instant.details ?? {};
	const cases: [string, string, (body: MetBody) => void][] = [
		[
			'wind in km/h',
			'wrongUnits',
			({ properties }) => (properties.meta.units['wind_speed'] = 'km/h')
		],
		[
			'rain without a unit',
			'wrongUnits',
			({ properties }) => delete properties.meta.units['precipitation_amount']
		],
		[
			'hours out of order',
			'badTimes',
			({ properties }) =>
				properties.timeseries.splice(2, 2, ...properties.timeseries.slice(2, 4).reverse())
		],
		[
			'local time',
			'badTimes',
			({ properties }) =>
				properties.timeseries.forEach((entry) => (entry.time = entry.time.replace('Z', '+01:00')))
		],
		[
			'half hours',
			'badTimes',
			({ properties }) =>
				properties.timeseries.forEach(
					(entry) => (entry.time = entry.time.replace(':00:00Z', ':30:00Z'))
				)
		],
		[
			'a wind that no weather has',
			'implausible',
			(body) => (details(body, 4)['wind_speed'] = 468.7)
		],
		['no time series', 'wrongFormat', ({ properties }) => (properties.timeseries = [])],
		['another kind of GeoJSON', 'wrongFormat', (body) => (body.type = 'FeatureCollection')],
		[
			'an issue of the day before',
			'staleIssue',
			({ properties }) => (properties.meta.updated_at = isoSeconds(NOW - 25 * HOUR))
		],
		[
			'an issue in the future',
			'staleIssue',
			({ properties }) => (properties.meta.updated_at = isoSeconds(NOW + HOUR))
		]
	];
	it.each(cases)('%s', async (_, code, change) => {
		await expect(fetchWith(spoilt(change))).rejects.toMatchObject({
			code,
			message: expect.stringMatching(/^MET Norway .*\.$/s)
		});
	});

	it('one that ended before now', async () => {
		const old = metNorwayBody(NOW - 60 * HOUR);
		old.properties.meta.updated_at = isoSeconds(NOW - HOUR);
		await expect(fetchWith(old)).rejects.toMatchObject({ code: 'staleIssue' });
	});
});
