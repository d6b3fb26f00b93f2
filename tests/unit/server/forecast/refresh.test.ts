import nock from 'nock';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { forecastSourceSchema } from '../../../../src/lib/api/hours';
import { currentFrom } from '../../../../src/lib/server/forecast/current';
import { metNorway } from '../../../../src/lib/server/forecast/metNorway/provider';
import { openMeteo } from '../../../../src/lib/server/forecast/openMeteo/provider';
import {
	refreshWith,
	type ForecastYard,
	type RefreshResult
} from '../../../../src/lib/server/forecast/refresh';
import {
	config,
	ENSEMBLE,
	ensembleBody,
	HOUR,
	MET_NORWAY,
	metNorwayBody,
	NOW,
	OPEN_METEO,
	openMeteoBody,
	stillTools
} from './answers';
import { memoryStore } from './memoryStore';

const MET_PATH = '/weatherapi/locationforecast/2.0/complete';
const yard: ForecastYard = {
	id: 'yard',
	latitude: 37.125,
	longitude: -8.5,
	elevation: 4,
	forecastProvider: 'open-meteo'
};
const at = (minutes: number) => new Date((NOW + minutes * 60) * 1000);

let kept = memoryStore();
beforeEach(() => {
	kept = memoryStore();
});
afterEach(() => {
	const unasked = nock.pendingMocks();
	nock.cleanAll();
	expect(unasked).toEqual([]);
});

function refresh(minutes = 0, of: ForecastYard = yard): Promise<RefreshResult> {
	const tools = stillTools(at(minutes).getTime() / 1000);
	return refreshWith(
		{
			store: kept.store,
			providers: { 'open-meteo': openMeteo(config, tools), 'met-norway': metNorway(config, tools) }
		},
		of,
		at(minutes)
	);
}
const current = (minutes = 0, of: ForecastYard = yard) => currentFrom(kept.store, of, at(minutes));

const dated = (minutes: number, more: Record<string, string> = {}) => ({
	date: at(minutes).toUTCString(),
	...more
});
function openMeteoAnswers(minutes = 0) {
	const now = at(minutes).getTime() / 1000;
	nock(OPEN_METEO).get('/v1/forecast').query(true).reply(200, openMeteoBody(now), dated(minutes));
	nock(ENSEMBLE).get('/v1/ensemble').query(true).reply(200, ensembleBody(now), dated(minutes));
}
const openMeteoFails = (times = 3) =>
	nock(OPEN_METEO).get('/v1/forecast').query(true).times(times).reply(503);
function metNorwayAnswers(minutes = 0, validFor = 30) {
	const lastModified = at(minutes - 20).toUTCString();
	nock(MET_NORWAY)
		.get(MET_PATH)
		.query(true)
		.reply(
			200,
			metNorwayBody(at(minutes).getTime() / 1000),
			dated(minutes, {
				expires: at(minutes + validFor).toUTCString(),
				'last-modified': lastModified
			})
		);
	return lastModified;
}
const metNorwayFails = (times = 3) =>
	nock(MET_NORWAY).get(MET_PATH).query(true).times(times).reply(500);

describe('a refresh', () => {
	it('stores what the yard’s own provider answers', async () => {
		openMeteoAnswers();
		expect(await refresh()).toEqual({
			outcome: 'stored',
			provider: 'open-meteo',
			runId: 'run-1',
			issuedAt: at(0),
			troubles: []
		});
		expect(kept.runs()[0]?.members).toHaveLength(3);
		expect(kept.states()).toMatchObject([
			{
				provider: 'open-meteo',
				failures: 0,
				lastSuccessAt: at(0),
				expiresAt: at(50),
				trouble: null
			}
		]);
	});

	it('keeps a forecast without members and remembers why', async () => {
		nock(OPEN_METEO).get('/v1/forecast').query(true).reply(200, openMeteoBody());
		nock(ENSEMBLE).get('/v1/ensemble').query(true).times(3).reply(500);
		expect(await refresh()).toMatchObject({ outcome: 'stored' });
		expect(kept.runs()[0]?.members).toBeNull();
		expect(kept.states()[0]).toMatchObject({
			failures: 0,
			trouble: expect.stringContaining('There are no members')
		});
	});

	it('turns to the other provider when the first fails, and says why', async () => {
		openMeteoFails();
		metNorwayAnswers();
		expect(await refresh()).toMatchObject({
			outcome: 'stored',
			provider: 'met-norway',
			troubles: [{ provider: 'open-meteo', code: 'providerFault' }]
		});
		expect(kept.states()).toMatchObject([
			{ provider: 'open-meteo', failures: 1, troubleAt: at(0) },
			{ provider: 'met-norway', failures: 0 }
		]);
	});

	it('turns to the other provider when the first answers nonsense, and stores none of it', async () => {
		nock(OPEN_METEO).get('/v1/forecast').query(true).reply(200, '{"hourly": {"time": [1,');
		metNorwayAnswers();
		expect(await refresh()).toMatchObject({
			provider: 'met-norway',
			troubles: [{ provider: 'open-meteo', code: 'notJson' }]
		});
		expect(kept.runs().map(({ provider }) => provider)).toEqual(['met-norway']);
	});

	it('asks the yard’s choice first', async () => {
		metNorwayAnswers();
		expect(await refresh(0, { ...yard, forecastProvider: 'met-norway' })).toMatchObject({
			provider: 'met-norway',
			troubles: []
		});
	});

	it('does not ask again before the answer expires', async () => {
		const own: ForecastYard = { ...yard, forecastProvider: 'met-norway' };
		metNorwayAnswers(0, 30);
		await refresh(0, own);
		expect(await refresh(29, own)).toEqual({
			outcome: 'notDue',
			provider: 'met-norway',
			until: at(30),
			troubles: []
		});
	});

	it('asks conditionally after that, and a 304 confirms the stored run', async () => {
		const own: ForecastYard = { ...yard, forecastProvider: 'met-norway' };
		const lastModified = metNorwayAnswers(0, 30);
		await refresh(0, own);
		nock(MET_NORWAY, { reqheaders: { 'if-modified-since': lastModified } })
			.get(MET_PATH)
			.query(true)
			.reply(304, undefined, dated(31, { expires: at(61).toUTCString() }));
		expect(await refresh(31, own)).toMatchObject({ outcome: 'confirmed', runId: 'run-1' });
		expect(kept.runs()).toHaveLength(1);
		expect((await current(40, own))?.source).toMatchObject({
			fetchedAt: at(31).toISOString(),
			ageMinutes: 9,
			origin: 'provider'
		});
		expect(await refresh(60, own)).toMatchObject({ outcome: 'notDue', until: at(61) });
	});

	it('leaves a provider alone after three failures, then probes it once', async () => {
		for (const minutes of [0, 60, 120]) {
			openMeteoFails();
			metNorwayAnswers(minutes, 10);
			await refresh(minutes);
		}
		// Open for half an hour: MET Norway alone is asked.
		metNorwayAnswers(149, 10);
		expect(await refresh(149)).toMatchObject({
			provider: 'met-norway',
			troubles: [{ provider: 'open-meteo', code: 'circuitOpen' }]
		});
		// Half open: one try, no retries; it fails and the circuit opens for an hour.
		openMeteoFails(1);
		metNorwayAnswers(180);
		expect(await refresh(180)).toMatchObject({
			provider: 'met-norway',
			troubles: [{ provider: 'open-meteo', code: 'providerFault' }]
		});
		expect(kept.states()[0]).toBeDefined();
		expect(kept.states().find(({ provider }) => provider === 'open-meteo')).toMatchObject({
			failures: 4,
			openUntil: at(240)
		});
		// Half open again: it answers, and all is forgotten.
		openMeteoAnswers(240);
		expect(await refresh(240)).toMatchObject({ provider: 'open-meteo', troubles: [] });
		expect(kept.states().find(({ provider }) => provider === 'open-meteo')).toMatchObject({
			failures: 0,
			openUntil: null,
			trouble: null
		});
	});

	it('does not come back to a provider before the time it named', async () => {
		nock(OPEN_METEO)
			.get('/v1/forecast')
			.query(true)
			.reply(429, undefined, { 'retry-after': String(2 * HOUR) });
		metNorwayAnswers();
		expect(await refresh()).toMatchObject({ troubles: [{ code: 'rateLimited' }] });
		metNorwayAnswers(119);
		expect(await refresh(119)).toMatchObject({ troubles: [{ code: 'circuitOpen' }] });
		openMeteoAnswers(121);
		expect(await refresh(121)).toMatchObject({ provider: 'open-meteo' });
	});

	it('keeps the last good run when neither answers', async () => {
		openMeteoAnswers();
		await refresh();
		openMeteoFails();
		metNorwayFails();
		expect(await refresh(60)).toMatchObject({
			outcome: 'lastGood',
			provider: 'open-meteo',
			runId: 'run-1',
			troubles: [{ provider: 'open-meteo' }, { provider: 'met-norway' }]
		});
		expect(kept.runs()).toHaveLength(1);
	});

	it('says so when there is nothing at all', async () => {
		openMeteoFails();
		metNorwayFails();
		expect(await refresh()).toMatchObject({ outcome: 'none' });
		expect(await current()).toBeNull();
	});

	it('is done by one of many', async () => {
		openMeteoAnswers();
		const results = await Promise.all([refresh(), refresh(), refresh()]);
		expect(results.map(({ outcome }) => outcome).sort()).toEqual(['busy', 'busy', 'stored']);
	});

	it('writes nothing when something of ours breaks', async () => {
		openMeteoAnswers();
		kept.store.prune = () => Promise.reject(new Error('disk full'));
		await expect(refresh()).rejects.toThrow('disk full');
		expect([kept.runs(), kept.states()]).toEqual([[], []]);
	});
});

describe('the current forecast', () => {
	it('is the own provider’s, fresh, with members and credit', async () => {
		openMeteoAnswers();
		await refresh();
		const now = await current(20);
		expect(now?.runId).toBe('run-1');
		expect(now?.source).toEqual({
			provider: 'Open-Meteo',
			origin: 'provider',
			issuedAt: at(0).toISOString(),
			fetchedAt: at(0).toISOString(),
			ageMinutes: 20,
			stale: false,
			attribution: {
				text: expect.stringContaining('Weather data by Open-Meteo.com'),
				url: 'https://open-meteo.com/'
			},
			members: 3,
			trouble: null
		});
		expect(forecastSourceSchema.safeParse(now?.source).success).toBe(true);
	});

	it('is marked as fallback, with the trouble of the own provider', async () => {
		openMeteoFails();
		metNorwayAnswers();
		await refresh();
		expect((await current(5))?.source).toMatchObject({
			provider: 'MET Norway',
			origin: 'fallback',
			attribution: { text: expect.stringContaining('Based on data from MET Norway') },
			trouble: 'Open-Meteo has a fault of its own (HTTP 503).'
		});
	});

	it('is the own provider’s again as soon as that answers', async () => {
		openMeteoFails();
		metNorwayAnswers();
		await refresh();
		openMeteoAnswers(60);
		await refresh(60);
		expect((await current(61))?.source).toMatchObject({ origin: 'provider', trouble: null });
	});

	it('is the last good one when neither answers any more, and grows stale', async () => {
		openMeteoAnswers();
		await refresh();
		for (const minutes of [60, 120, 180]) {
			openMeteoFails();
			metNorwayFails();
			await refresh(minutes);
		}
		expect((await current(180))?.source).toMatchObject({
			provider: 'Open-Meteo',
			origin: 'lastGood',
			ageMinutes: 180,
			stale: false,
			trouble: 'Open-Meteo has a fault of its own (HTTP 503).'
		});
		expect((await current(181))?.source.stale).toBe(true);
	});

	it('is the last good one when nobody refreshes', async () => {
		openMeteoAnswers();
		await refresh();
		expect((await current(90))?.source.origin).toBe('provider');
		expect((await current(96))?.source).toMatchObject({
			origin: 'lastGood',
			trouble: 'No new forecast has been fetched from Open-Meteo.'
		});
	});

	it('has a past also where the provider gives none', async () => {
		const own: ForecastYard = { ...yard, forecastProvider: 'met-norway' };
		for (const hour of [0, 1, 2, 3]) {
			metNorwayAnswers(hour * 60);
			await refresh(hour * 60, own);
		}
		const hourly = (await current(180, own))?.forecast.hourly;
		const start = Math.floor(NOW / HOUR) * HOUR;
		expect(hourly?.time.slice(0, 5)).toEqual([0, 1, 2, 3, 4].map((h) => start + h * HOUR));
		// Each run gives 0.0 mm for its first hour: known at the stamp after its first.
		expect(hourly?.precipitation?.slice(0, 5)).toEqual([null, 0, 0, 0, 0]);
		expect(hourly?.windGust?.slice(0, 5)).toEqual([7, 7, 7, 7, 7]);
	});
});
