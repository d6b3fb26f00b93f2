import { desc, eq, getTableName, is } from 'drizzle-orm';
import { getTableConfig, PgTable } from 'drizzle-orm/pg-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { changeRow } from '../../../src/lib/server/db/changeRow';
import { createDatabase } from '../../../src/lib/server/db/client';
import * as schema from '../../../src/lib/server/db/schema';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

const { boats, changes, steps, yards } = schema;
/** Kept by the product for itself, or told elsewhere: nothing of the yard's own is changed in them. */
const UNRECORDED = [
	'changes',
	'forecast_keys',
	'forecast_runs',
	'kept_blobs',
	'outlooks',
	'provider_states',
	'stays'
];

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let web: ReturnType<typeof createDatabase>;
let two: TwoYards;
beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	web = createDatabase(database.webUrl, 'required');
});
afterAll(async () => {
	await web.pool.end();
	await database.drop();
});

const asManager = <T>(work: () => PromiseLike<T>) => onBehalfOf(two.people.manager.id, work);
const asOwner = <T>(work: () => PromiseLike<T>) => onBehalfOf(two.people.owner.id, work);
const boatNamed = async (name: string) =>
	(await database.db.select().from(boats).where(eq(boats.name, name)))[0];
const lastOf = async (rowId: string) =>
	(
		await database.db
			.select()
			.from(changes)
			.where(eq(changes.rowId, rowId))
			.orderBy(desc(changes.id))
			.limit(1)
	)[0];

test('every table that holds a yard’s own is recorded, and every revision is counted', async () => {
	const { rows } = await database.pool.query<{ name: string; trigger: string }>(
		`select c.relname as name, t.tgname as trigger from pg_trigger t
		join pg_class c on c.oid = t.tgrelid where not t.tgisinternal`
	);
	const having = (trigger: string) =>
		rows.filter((row) => row.trigger === trigger).map(({ name }) => name);
	const tables = (Object.values(schema) as unknown[]).filter((it): it is PgTable =>
		is(it, PgTable)
	);
	const columns = (table: PgTable) => Object.keys(table);
	const nameOf = (table: PgTable) => getTableName(table);
	const ofYards = tables.filter(
		(table) => nameOf(table) === getTableName(yards) || columns(table).includes('yardId')
	);
	expect(having('note_change').sort()).toEqual(
		ofYards
			.map(nameOf)
			.filter((name) => !UNRECORDED.includes(name))
			.sort()
	);
	const counted = tables.filter((table) => columns(table).includes('revision'));
	expect(having('count_revision').sort()).toEqual(counted.map(nameOf).sort());
	expect(getTableConfig(changes).policies.map(({ for: what }) => what)).toEqual(['select']);
});

test('a change is written down with who made it and only what differs', async () => {
	const { id, heading } = await boatNamed('Corncrake');
	await asManager(() => web.db.update(boats).set({ heading: 77 }).where(eq(boats.id, id)));
	expect(await lastOf(id)).toMatchObject({
		subject: 'boats',
		action: 'UPDATE',
		personName: two.people.manager.name,
		boatId: id,
		before: { heading },
		after: { heading: 77 }
	});
});

test('a step’s change names its boat', async () => {
	const id = two.own.step;
	await asOwner(() => web.db.update(steps).set({ durationMinutes: 95 }).where(eq(steps.id, id)));
	expect(await lastOf(id)).toMatchObject({
		boatId: two.boatOf.get(id),
		after: { duration_minutes: 95 }
	});
});

test('the web process can read the record of its yards, and write or erase nothing in it', async () => {
	const before = await asManager(() => web.db.select().from(changes));
	expect(before.length).toBeGreaterThan(0);
	await asManager(() => web.db.delete(changes));
	await asManager(() => web.db.update(changes).set({ personName: 'nobody' }));
	expect(await asManager(() => web.db.select().from(changes))).toEqual(before);
	await expect(
		asManager(() =>
			web.db
				.insert(changes)
				.values({ yardId: before[0].yardId, subject: 'boats', rowId: 'x', action: 'INSERT' })
		)
	).rejects.toThrow();
	expect(
		await onBehalfOf(two.other.manager.id, () => web.db.select().from(changes))
	).not.toContainEqual(before[0]);
});

test('the web process cannot leave the record', async () => {
	const { id } = await boatNamed('Corncrake');
	await asManager(() =>
		web.db.transaction(async (tx) => {
			await tx.execute(`select set_config('app.unrecorded', 'yes', true)`);
			await tx.update(boats).set({ heading: 78 }).where(eq(boats.id, id));
		})
	);
	expect(await lastOf(id)).toMatchObject({ after: { heading: 78 } });
});

test('who changes what another changed meanwhile is told, and nothing is written over', async () => {
	const { id, revision, name } = await boatNamed('Corncrake');
	const first = await asManager(() =>
		changeRow(web.db, boats, id, revision, { name: 'Corncrake II' })
	);
	expect(first).toEqual({ outcome: 'changed' });
	const second = await asOwner(() => changeRow(web.db, boats, id, revision, { name: 'Crake' }));
	expect(second).toMatchObject({ outcome: 'stale', revision: revision + 1 });
	expect(second).toHaveProperty(
		'why',
		expect.stringContaining(`${two.people.manager.name} changed this`)
	);
	expect((await boatNamed('Corncrake II')).id).toBe(id);
	const again = await asOwner(() => changeRow(web.db, boats, id, revision + 1, { name }));
	expect(again).toEqual({ outcome: 'changed' });
	const gone = '00000000-0000-4000-8000-000000000000';
	expect(await asOwner(() => changeRow(web.db, boats, gone, 1, { name }))).toEqual({
		outcome: 'gone'
	});
});

test('a revision is counted by the database, whatever is given', async () => {
	const { id, revision } = await boatNamed('Corncrake');
	await database.db.update(boats).set({ revision: 1 }).where(eq(boats.id, id));
	expect((await boatNamed('Corncrake')).revision).toBe(revision + 1);
});

test('with a whole yard goes its record', async () => {
	const { db } = database;
	const [yard] = await db.select().from(yards).where(eq(yards.slug, two.other.slug));
	const ofYard = eq(changes.yardId, yard.id);
	expect((await db.select().from(changes).where(ofYard)).length).toBeGreaterThan(0);
	await db.delete(yards).where(eq(yards.id, yard.id));
	expect(await db.select().from(changes).where(ofYard)).toEqual([]);
});
