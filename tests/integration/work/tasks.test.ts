import { makeWorkerUtils, runOnce, type WorkerUtils } from 'graphile-worker';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO_YARD } from '../../../drizzle/seed/demo';
import { seedDemo } from '../../../drizzle/seed/seed';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import { compose, type Composition } from '../../../src/lib/server/composition';
import { noteWorker, queueHealth, workerSeenAt } from '../../../src/lib/server/db/health';
import { forecastRuns, outlooks, providerStates, steps } from '../../../src/lib/server/db/schema';
import { allYards } from '../../../src/lib/server/db/yards';
import { addRefresh, createTasks } from '../../../src/lib/server/work/tasks';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let fake: ForecastFake;
let parts: Composition;
let utils: WorkerUtils;
let yardId = '';

beforeAll(async () => {
	fake = await startForecastFake({
		scenario: { kind: 'story', timeZone: DEMO_YARD.timeZone, members: 2 }
	});
	database = await createTestDatabase();
	parts = compose(
		{
			DATABASE_URL: database.url,
			ORIGIN: 'http://127.0.0.1',
			LOG_LEVEL: 'silent',
			OPEN_METEO_URL: fake.url,
			OPEN_METEO_ENSEMBLE_URL: fake.url,
			MET_NORWAY_URL: fake.url,
			FORECAST_CONTACT: 'harbour@yard.example'
		},
		'worker'
	);
	await seedDemo(parts.db, new Date());
	yardId = (await allYards(parts.db))[0].id;
	utils = await makeWorkerUtils({ connectionString: database.url });
	await utils.migrate();
});
afterAll(async () => {
	await utils.release();
	await parts.close();
	await database.drop();
	await fake.close();
});

const work = () => runOnce({ connectionString: database.url, taskList: createTasks(parts) });
const count = async (table: typeof forecastRuns | typeof outlooks | typeof steps) =>
	(await parts.db.select().from(table)).length;

describe('the worker', () => {
	test('asking twice for a refresh leaves one job, and the hourly spread moves it, not doubles it', async () => {
		await addRefresh(utils.addJob, yardId);
		await addRefresh(utils.addJob, yardId);
		expect((await queueHealth(parts.db))?.waiting).toBe(1);
		const later = new Date(Date.now() + 3_600_000);
		await addRefresh(utils.addJob, yardId, later);
		expect(await queueHealth(parts.db)).toEqual({ waiting: 1, failed: 0 });
		await work();
		expect(await count(forecastRuns)).toBe(0);
	});

	test('a refresh stores a run and judges every queued step', async () => {
		await addRefresh(utils.addJob, yardId);
		await work();
		expect(await count(forecastRuns)).toBe(1);
		expect(await count(outlooks)).toBe(await count(steps));
		expect(await queueHealth(parts.db)).toEqual({ waiting: 0, failed: 0 });
	});

	test('the hourly spread queues every yard within the hour to come', async () => {
		const before = Date.now();
		await utils.addJob('spreadRefreshes', {});
		await work();
		const { rows } = await database.pool.query<{ run_at: Date }>(
			'select run_at from graphile_worker.jobs'
		);
		expect(rows).toHaveLength(1);
		const wait = rows[0].run_at.getTime() - before;
		expect(wait).toBeGreaterThanOrEqual(0);
		expect(wait).toBeLessThan(3_600_000);
	});

	test('a yard deleted since its job was queued is passed over', async () => {
		await addRefresh(utils.addJob, '00000000-0000-4000-8000-000000000000');
		await work();
		expect((await queueHealth(parts.db))?.failed).toBe(0);
	});

	test('when no provider answers the last good run stays', async () => {
		// Long since asked, so that it is due again.
		const past = new Date(Date.now() - 3 * 3_600_000);
		await parts.db.update(providerStates).set({ lastSuccessAt: past, expiresAt: past });
		fake.setFaults({
			'open-meteo': [{ kind: 'serverError' }],
			'met-norway': [{ kind: 'serverError' }]
		});
		await addRefresh(utils.addJob, yardId);
		await work();
		fake.setFaults({});
		expect(await count(forecastRuns)).toBe(1);
		const states = await parts.db.select().from(providerStates);
		expect(states.map(({ trouble }) => trouble !== null)).toEqual([true, true]);
	});

	test('a heartbeat is the last time any worker was seen', async () => {
		expect(await workerSeenAt(parts.db)).toBeNull();
		const now = new Date();
		await noteWorker(parts.db, 'one', now);
		expect(await workerSeenAt(parts.db)).toEqual(now);
	});
});
