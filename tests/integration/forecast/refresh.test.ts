import { eq } from 'drizzle-orm';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import { createDatabase } from '../../../src/lib/server/db/client';
import { forecastRuns, providerStates, yards, type Yard } from '../../../src/lib/server/db/schema';
import { forecastConfigSchema, type ForecastConfig } from '../../../src/lib/server/forecast/config';
import { currentForecast } from '../../../src/lib/server/forecast/current';
import { databaseStore } from '../../../src/lib/server/forecast/databaseStore';
import { refreshForecast } from '../../../src/lib/server/forecast/refresh';
import { createTestDatabase } from '../../setup/database';

const HOUR = 3_600;
const NOW = Date.UTC(2026, 11, 1, 6, 20) / 1000;
const at = (minutes: number) => new Date((NOW + minutes * 60) * 1000);

let fake: ForecastFake;
let config: ForecastConfig;
let database: Awaited<ReturnType<typeof createTestDatabase>>;
let yard: Yard;

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
	database = await createTestDatabase();
});
afterAll(async () => {
	await database.drop();
	await fake.close();
});

beforeEach(async () => {
	const [added] = await database.db
		.insert(yards)
		.values({
			slug: 'quay',
			name: 'The Quay',
			latitude: 37.02,
			longitude: -7.86,
			elevation: 3,
			timeZone: 'Europe/Lisbon',
			workHours: []
		})
		.returning();
	yard = added;
});
afterEach(async () => {
	fake.setFaults({});
	fake.setNow(NOW);
	await database.db.delete(yards);
});

function refresh(minutes = 0, db = database.db) {
	const now = at(minutes);
	fake.setNow(now.getTime() / 1000);
	return refreshForecast({ db, config, http: { clock: () => now.getTime() } }, yard, now);
}
const runs = () => database.db.select().from(forecastRuns);
const states = () => database.db.select().from(providerStates);

describe('a refresh on the database', () => {
	it('stores a run with its members and the provider’s state, and gives it back', async () => {
		const result = await refresh();
		expect(result).toMatchObject({ outcome: 'stored', provider: 'open-meteo', troubles: [] });
		expect(await states()).toMatchObject([
			{ yardId: yard.id, provider: 'open-meteo', failures: 0, lastSuccessAt: at(0), trouble: null }
		]);
		const current = await currentForecast(database.db, yard, at(10), { members: true });
		const [run] = await runs();
		expect(current?.runId).toBe(run.id);
		expect(current?.forecast).toEqual({ issuedAt: NOW, hourly: run.hourly, members: run.members });
		expect(current?.forecast.members).toHaveLength(3);
		expect(current?.source).toMatchObject({ origin: 'provider', ageMinutes: 10, stale: false });
	});

	it('leaves the members where they are until they are asked for, and still knows how many', async () => {
		await refresh();
		const [{ id, hourly }] = await runs();
		const current = await currentForecast(database.db, yard, at(10));
		expect(current?.forecast).toEqual({ issuedAt: NOW, hourly });
		expect(current?.source.members).toBe(3);
		expect(await databaseStore(database.db).run(id)).not.toHaveProperty('members');
	});

	it('counts none in a run without members', async () => {
		fake.setFaults({ 'open-meteo-ensemble': [{ kind: 'serverError' }] });
		await refresh();
		const current = await currentForecast(database.db, yard, at(10), { members: true });
		expect(current?.source.members).toBe(0);
		expect(current?.forecast).not.toHaveProperty('members');
	});

	it('is done once when several processes come at once', async () => {
		// A process of its own has connections of its own.
		const others = [createDatabase(database.url), createDatabase(database.url)];
		fake.setFaults({ 'open-meteo': [{ kind: 'delay', milliseconds: 300 }] });
		try {
			const results = await Promise.all([refresh(), ...others.map(({ db }) => refresh(0, db))]);
			expect(results.map(({ outcome }) => outcome).sort()).toEqual(['busy', 'busy', 'stored']);
			expect(await runs()).toHaveLength(1);
			expect(await refresh(1)).toMatchObject({ outcome: 'notDue' });
		} finally {
			await Promise.all(others.map(({ pool }) => pool.end()));
		}
	});

	it('lets different yards be refreshed at once', async () => {
		const [other] = await database.db
			.insert(yards)
			.values({ ...yard, id: undefined, slug: 'other' })
			.returning();
		const results = await Promise.all(
			[yard, other].map((each) =>
				refreshForecast({ db: database.db, config, http: { clock: () => NOW * 1000 } }, each, at(0))
			)
		);
		expect(results.map(({ outcome }) => outcome)).toEqual(['stored', 'stored']);
	});

	it('leaves nothing behind when it breaks half-way', async () => {
		const store = databaseStore(database.db);
		const broken = store.withYardLock(yard.id, async (locked) => {
			await locked.addRun({
				yardId: yard.id,
				provider: 'open-meteo',
				issuedAt: at(0),
				fetchedAt: at(0),
				hourly: { time: [NOW - (NOW % HOUR), NOW - (NOW % HOUR) + HOUR] },
				members: null
			});
			throw new Error('power cut');
		});
		await expect(broken).rejects.toThrow('power cut');
		expect(await runs()).toEqual([]);
		// The lock is gone with it.
		expect(await refresh()).toMatchObject({ outcome: 'stored' });
	});

	it('keeps failures, the way round and the way back in the shared state', async () => {
		fake.setFaults({ 'open-meteo': [{ kind: 'nan' }] });
		for (const minutes of [0, 70, 140])
			expect(await refresh(minutes)).toMatchObject({
				outcome: 'stored',
				provider: 'met-norway',
				troubles: [{ provider: 'open-meteo', code: 'notJson' }]
			});
		const asked = fake.requests().filter(({ target }) => target === 'open-meteo').length;
		// Another process knows that the circuit is open and asks MET Norway alone.
		const other = createDatabase(database.url);
		expect((await refresh(142, other.db)).troubles).toMatchObject([{ code: 'circuitOpen' }]);
		expect(fake.requests().filter(({ target }) => target === 'open-meteo')).toHaveLength(asked);
		await other.pool.end();

		expect((await currentForecast(database.db, yard, at(145)))?.source).toMatchObject({
			provider: 'MET Norway',
			origin: 'fallback',
			trouble: 'Open-Meteo sent something that is not whole JSON.'
		});
		fake.setFaults({});
		expect(await refresh(171)).toMatchObject({ outcome: 'stored', provider: 'open-meteo' });
		expect((await currentForecast(database.db, yard, at(172)))?.source).toMatchObject({
			origin: 'provider',
			trouble: null
		});
	});

	it('keeps and shows the last good run while neither answers', async () => {
		await refresh();
		fake.setFaults({
			'open-meteo': [{ kind: 'truncated' }],
			'met-norway': [{ kind: 'outOfOrder' }]
		});
		expect(await refresh(60)).toMatchObject({ outcome: 'lastGood', provider: 'open-meteo' });
		expect(await refresh(120)).toMatchObject({ outcome: 'lastGood' });
		expect(await runs()).toHaveLength(1);
		expect((await currentForecast(database.db, yard, at(200)))?.source).toMatchObject({
			origin: 'lastGood',
			ageMinutes: 200,
			stale: true,
			trouble: 'Open-Meteo sent something that is not whole JSON.'
		});
	});

	it('asks MET Norway conditionally and takes its word for the stored run', async () => {
		yard = { ...yard, forecastProvider: 'met-norway' };
		await refresh();
		const [state] = await states();
		expect(state.lastModified).toBe('Tue, 01 Dec 2026 06:17:00 GMT');
		// The fake's forecast is renewed hourly; let it expire early without a new one.
		await database.db.update(providerStates).set({ expiresAt: at(5) });
		expect(await refresh(6)).toMatchObject({ outcome: 'confirmed' });
		expect(fake.requests().at(-1)).toMatchObject({
			status: 304,
			ifModifiedSince: 'Tue, 01 Dec 2026 06:17:00 GMT'
		});
		expect(await runs()).toHaveLength(1);
		expect((await currentForecast(database.db, yard, at(6)))?.source.ageMinutes).toBe(0);
	});

	it('gathers a past from earlier runs where the provider has none', async () => {
		yard = { ...yard, forecastProvider: 'met-norway' };
		for (let hour = 0; hour < 26; hour++)
			expect(await refresh(hour * 62)).toMatchObject({ outcome: 'stored' });
		const current = await currentForecast(database.db, yard, at(25 * 62));
		const { time, temperature, precipitation } = current?.forecast.hourly ?? { time: [] };
		const first = Math.floor(NOW / HOUR) * HOUR;
		expect(time.slice(0, 30)).toEqual(Array.from({ length: 30 }, (_, i) => first + i * HOUR));
		expect(temperature?.slice(0, 30).every((v) => v !== null)).toBe(true);
		expect(precipitation?.slice(1, 30).every((v) => v !== null)).toBe(true);
	});

	it('takes history from the other provider when the own one is new', async () => {
		await refresh();
		yard = { ...yard, forecastProvider: 'met-norway' };
		await refresh(60);
		const { time } = (await currentForecast(database.db, yard, at(61)))?.forecast.hourly ?? {
			time: []
		};
		expect(NOW - time[0]).toBeGreaterThan(45 * HOUR);
	});

	it('prunes what is too old and never the newest', async () => {
		await refresh();
		const [{ hourly }] = await runs();
		await database.db.insert(forecastRuns).values(
			[70, 71, 100, 300, 400].map((hours) => ({
				yardId: yard.id,
				provider: 'open-meteo' as const,
				issuedAt: at(-hours * 60),
				fetchedAt: at(-hours * 60),
				hourly
			}))
		);
		await refresh(60);
		const ages = (await runs()).map(({ fetchedAt }) => (NOW * 1000 - fetchedAt.getTime()) / 3.6e6);
		expect(ages.sort((a, b) => a - b)).toEqual([-1, 0, 70, 100]);
	});

	it('forgets a yard that has moved', async () => {
		await refresh();
		await databaseStore(database.db).forget(yard.id);
		expect([await runs(), await states()]).toEqual([[], []]);
	});

	it('goes with its yard', async () => {
		await refresh();
		await database.db.delete(yards).where(eq(yards.id, yard.id));
		expect([await runs(), await states()]).toEqual([[], []]);
	});
});
