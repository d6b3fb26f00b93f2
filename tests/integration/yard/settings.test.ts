import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { YardPatch } from '../../../src/lib/api/yard/settings';
import { localDate, type Step } from '../../../src/lib/engine';
import { requireMembership, type Membership } from '../../../src/lib/server/access/roles';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { createDatabase } from '../../../src/lib/server/db/client';
import { allBoatsOf, queuedSteps, type QueuedStep } from '../../../src/lib/server/db/queue';
import { changes, forecastKeys, forecastRuns, yards } from '../../../src/lib/server/db/schema';
import { giveKey, keyOfYard, takeKey, withOwnKey } from '../../../src/lib/server/forecast/keys';
import { forecastConfigSchema } from '../../../src/lib/server/forecast/config';
import { axisAt } from '../../../src/lib/server/outlook/axis';
import { shelterStockOf, siteOf, stepOf } from '../../../src/lib/server/outlook/engineInput';
import { launchWishOf } from '../../../src/lib/server/outlook/launchWish';
import { changeYard } from '../../../src/lib/server/yard/changeYard';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let web: ReturnType<typeof createDatabase>;
let two: TwoYards;
let queue: QueuedStep[];

beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	web = createDatabase(database.webUrl, 'required');
	queue = await queuedSteps(database.db, allBoatsOf((await managed()).yard.id));
});
afterAll(async () => {
	await web.pool.end();
	await database.drop();
});

const asManager = <T>(work: () => PromiseLike<T>) => onBehalfOf(two.people.manager.id, work);
const managed = (): Promise<Membership> =>
	asManager(() => requireMembership(web.db, { user: two.people.manager }, two.own.slug));

/** Changes the yard as its manager would and reads it again. */
async function settle(patch: Omit<YardPatch, 'revision'>) {
	const membership = await managed();
	const { revision } = membership.yard;
	const result = await asManager(() => changeYard(web.db, membership, { ...patch, revision }));
	expect(result).toEqual({ outcome: 'changed' });
	return (await managed()).yard;
}

/** A Monday in Lisbon. */
const MONDAY = '2026-05-04T09:00:00Z';
const NOW = new Date(MONDAY);
const hour = (text: string): number => Date.parse(text) / 1000;
const first = (kind: Step['kind']): QueuedStep => {
	const found = queue.find(({ step }) => step.kind === kind);
	if (found === undefined) throw new Error(`the demo has no queued step of kind ${kind}`);
	return found;
};
const lifting = (): QueuedStep => {
	const { step, ...rest } = first('coat');
	return {
		...rest,
		sheet: null,
		step: { ...step, kind: 'lift', task: 'haul', limits: {}, times: {} }
	};
};

describe('a setting reaches what the engine is asked', () => {
	test('place, zone and surroundings as the site', async () => {
		const yard = await settle({ roughness: 0.25, albedo: 0.4, timeZone: 'Europe/Madrid' });
		expect(siteOf(yard)).toMatchObject({
			roughness: 0.25,
			albedo: 0.4,
			timeZone: 'Europe/Madrid'
		});
		await settle({ roughness: 0.03, albedo: 0.2, timeZone: 'Europe/Lisbon' });
	});

	test('working hours as the hours of each step', async () => {
		const workHours = [{ days: [1, 2], from: '09:00', to: '12:00' }];
		const before = (await managed()).yard.workHours;
		const yard = await settle({ workHours });
		expect(stepOf(first('coat'), yard).workHours).toEqual(workHours);
		await settle({ workHours: before });
	});

	test('holidays close their whole local day to every step', async () => {
		const yard = await settle({ holidays: [{ date: '2026-05-05', name: 'Regatta' }] });
		const span = { from: hour('2026-05-04T23:00:00Z'), to: hour('2026-05-05T23:00:00Z') };
		for (const kind of ['coat', 'abrade'] as const)
			expect(stepOf(first(kind), yard).closed).toEqual([span]);
		await settle({ holidays: [] });
	});

	test('quiet hours take hours from what is heard and nothing else', async () => {
		const [before, abrade, coat] = [(await managed()).yard, first('abrade'), first('coat')];
		const quietHours = [{ days: [3], from: '13:00', to: '15:00' }];
		const yard = await settle({
			workHours: [{ days: [2, 3], from: '08:00', to: '18:00' }],
			quietHours
		});
		expect(stepOf(abrade, yard).workHours).toEqual([
			{ days: [2], from: '08:00', to: '18:00' },
			{ days: [3], from: '08:00', to: '13:00' },
			{ days: [3], from: '15:00', to: '18:00' }
		]);
		const brushed = { ...coat, step: { ...coat.step, method: 'brush' as const } };
		expect(stepOf(brushed, yard).workHours).toEqual(yard.workHours);
		await settle({ quietHours: [], workHours: before.workHours });
	});

	test('the hoist’s wind limit as the limit of lifting, the steadiest hoist’s first', async () => {
		const lift = lifting();
		expect(stepOf(lift, await settle({ liftGust: 10 })).limits).toMatchObject({
			gust: { max: 10 },
			windHeight: 10
		});
		const hoist = { id: '6f1f7f9e-6b5a-4c54-9d34-0f7d3a1c9b11', name: 'Slip', slots: [] };
		const yard = await settle({ hoists: [{ ...hoist, gust: 15 }] });
		expect(stepOf(lift, yard).limits.gust).toEqual({ max: 15 });
		const light = { ...lift, step: { ...lift.step, limits: { gust: { max: 9 } } } };
		expect(stepOf(light, yard).limits.gust).toEqual({ max: 9 });
		await settle({ hoists: [], liftGust: 12 });
	});

	test('launch slots, day rate and slip rule as the launch that is wished for', async () => {
		const yard = await settle({
			hoists: [
				{
					id: '6f1f7f9e-6b5a-4c54-9d34-0f7d3a1c9b11',
					name: 'Slip',
					gust: null,
					slots: [
						{ days: [1], times: ['09:00', '14:00'], tide: false },
						{ date: '2026-05-07', times: ['10:40'], tide: true }
					]
				}
			],
			holidays: [{ date: '2026-05-11', name: 'Fair' }],
			dayRate: 40,
			slipFreeDays: 2,
			slipPer: 'week'
		});
		const wish = launchWishOf(yard, '2026-05-09', NOW);
		expect(wish.launchBy).toBe(hour('2026-05-09T22:59:59Z'));
		expect(localDate('Europe/Lisbon', wish.launchBy ?? 0)).toBe('2026-05-09');
		// 09:00 of the first Monday has gone by, and the second is a holiday.
		expect(wish.launchSlots?.slice(0, 3)).toEqual([
			hour('2026-05-04T13:00:00Z'),
			hour('2026-05-07T09:40:00Z'),
			hour('2026-05-18T08:00:00Z')
		]);
		expect(wish).toMatchObject({ dayRate: 40, slipFreeDays: 2, slipPer: 'week' });
		expect(launchWishOf(yard, null, NOW).launchBy).toBeUndefined();
		await settle({ hoists: [], holidays: [], dayRate: 34, slipFreeDays: 0, slipPer: 'day' });
	});

	test('shelter stock as what could be put up', async () => {
		expect(shelterStockOf((await managed()).yard)).toContain('heatedTent');
		const yard = await settle({ shelters: [{ kind: 'tarp', name: 'blue tarp', count: 2 }] });
		expect(shelterStockOf(yard)).toEqual(['tarp']);
		await settle({ shelters: null });
	});

	test('days ahead as the length of the page', async () => {
		const yard = await settle({ daysAhead: 7 });
		expect(axisAt(yard.timeZone, hour(MONDAY), yard.daysAhead).days).toHaveLength(7);
		await settle({ daysAhead: 4 });
	});
});

test('who changes settings another changed meanwhile is told by name', async () => {
	const membership = await managed();
	const { revision } = membership.yard;
	await settle({ highWindGust: 15 });
	const late = await asManager(() => changeYard(web.db, membership, { highWindGust: 9, revision }));
	expect(late).toMatchObject({ outcome: 'stale', revision: revision + 1 });
	expect(late).toHaveProperty('why', expect.stringContaining(two.people.manager.name));
	expect((await managed()).yard.highWindGust).toBe(15);
});

test('what was changed is in the record', async () => {
	const { id } = await settle({ daysAhead: 5 });
	const rows = await database.db.select().from(changes).where(eq(changes.rowId, id));
	expect(rows.at(-1)).toMatchObject({
		personName: two.people.manager.name,
		after: { days_ahead: 5 }
	});
});

describe('a yard that moves', () => {
	const runs = async (yardId: string) =>
		database.db.select().from(forecastRuns).where(eq(forecastRuns.yardId, yardId));
	const lay = (yardId: string) =>
		database.db.insert(forecastRuns).values({
			yardId,
			provider: 'open-meteo',
			issuedAt: new Date(),
			fetchedAt: new Date(),
			hourly: { time: [] } as unknown as (typeof forecastRuns.$inferInsert)['hourly']
		});

	test('forgets its forecasts and asks for new ones; another keeps its own', async () => {
		const [other] = await database.db.select().from(yards).where(eq(yards.slug, two.other.slug));
		const { id } = (await managed()).yard;
		await lay(id);
		await lay(other.id);
		await settle({ name: 'Samphire Hard Stand' });
		expect(await runs(id)).toHaveLength(1);
		await settle({ latitude: 40.64, longitude: -8.74 });
		expect(await runs(id)).toEqual([]);
		expect(await runs(other.id)).toHaveLength(1);
		const { rows } = await database.pool.query(
			`select 1 from graphile_worker.jobs where key = $1`,
			[`refresh ${id}`]
		);
		expect(rows).toHaveLength(1);
	});

	test('stays where it is, and keeps its forecast, on an old revision', async () => {
		const membership = await managed();
		await lay(membership.yard.id);
		const { revision } = membership.yard;
		const late = await asManager(() =>
			changeYard(web.db, membership, { latitude: 1, revision: revision - 1 })
		);
		expect(late.outcome).toBe('stale');
		expect(await runs(membership.yard.id)).toHaveLength(1);
	});
});

describe('a yard’s own key', () => {
	const SECRET = 'a secret of thirty-two characters, or more';
	const config = { ...forecastConfigSchema.parse({}), KEYS_SECRET: SECRET };

	test('is sealed at rest, told to nobody, and asked with at the address where it is good', async () => {
		const membership = await managed();
		const { id } = membership.yard;
		await asManager(() => giveKey(web.db, membership, SECRET, 'open-sesame-1'));
		const [row] = await database.db.select().from(forecastKeys);
		expect(JSON.stringify(row)).not.toContain('sesame');
		expect(await asManager(() => keyOfYard(web.db, membership))).toEqual({
			setAt: expect.any(Date),
			setBy: two.people.manager.name
		});
		expect(await withOwnKey(database.db, config, id)).toMatchObject({
			OPEN_METEO_KEY: 'open-sesame-1',
			OPEN_METEO_URL: config.OPEN_METEO_CUSTOMER_URL
		});
		// Under another secret, or carried to another yard, it opens nothing.
		expect(
			await withOwnKey(database.db, { ...config, KEYS_SECRET: SECRET + '!' }, id)
		).toMatchObject({ OPEN_METEO_KEY: '' });
		const [other] = await database.db.select().from(yards).where(eq(yards.slug, two.other.slug));
		await database.db.update(forecastKeys).set({ yardId: other.id });
		expect((await withOwnKey(database.db, config, other.id)).OPEN_METEO_KEY).toBe('');
	});

	test('is gone when it is taken away', async () => {
		const membership = await managed();
		await asManager(() => giveKey(web.db, membership, SECRET, 'open-sesame-2'));
		await asManager(() => takeKey(web.db, membership));
		expect(await asManager(() => keyOfYard(web.db, membership))).toBeNull();
		expect((await withOwnKey(database.db, config, membership.yard.id)).OPEN_METEO_KEY).toBe('');
	});
});
