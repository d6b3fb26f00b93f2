import { randomUUID } from 'node:crypto';
import { and, eq, getTableName, is, sql } from 'drizzle-orm';
import { PgTable } from 'drizzle-orm/pg-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { SAMPLE_SHEETS } from '../../../src/lib/engine';
import { onBehalfOf, onDuty } from '../../../src/lib/server/db/behalf';
import { createDatabase } from '../../../src/lib/server/db/client';
import { refuseUnwalled } from '../../../src/lib/server/db/health';
import * as schema from '../../../src/lib/server/db/schema';
import { UnwalledError } from '../../../src/lib/server/db/walledPool';
import type { StepRow } from '../../../src/lib/server/db/schema';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

const { boatPainters, boats, faces, forecastRuns, invitations, jobs, memberships, outlooks } =
	schema;
const {
	absences,
	files,
	forecastKeys,
	jobWaits,
	keptBlobs,
	planAnswers,
	plans,
	planSteps,
	stepPainters
} = schema;
const { accessTokens, providerStates, sessions, sheets, stands, stepFaces, steps, users, yards } =
	schema;
/** Tables that no person's query finds anything in. */
const OF_NOBODY = ['account_links', 'mails', 'sign_in_attempts', 'workers'];
const TABLES = Object.values(schema).filter((it) => is(it, PgTable));

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let web: ReturnType<typeof createDatabase>;
let two: TwoYards;

beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	await fillEveryTable();
	web = createDatabase(database.webUrl, 'required');
});
afterAll(async () => {
	await web.pool.end();
	await database.drop();
});

/** At least one row of each yard in every table that holds a yard's own. */
async function fillEveryTable(): Promise<void> {
	const { db } = database;
	for (const { id: yardId } of await db.select({ id: yards.id }).from(yards)) {
		const at = new Date();
		const hourly = { time: [] } as unknown as (typeof forecastRuns.$inferInsert)['hourly'];
		await db
			.insert(forecastRuns)
			.values({ yardId, provider: 'open-meteo', issuedAt: at, fetchedAt: at, hourly });
		await db.insert(providerStates).values({ yardId, provider: 'open-meteo' });
		const [{ id: standId }] = await db
			.insert(stands)
			.values({ yardId, name: 'slip', position: 99 })
			.returning({ id: stands.id });
		// A stay is written by the move.
		await db.update(boats).set({ standId }).where(eq(boats.yardId, yardId));
		await db
			.insert(forecastKeys)
			.values({ yardId, provider: 'open-meteo', sealed: 'x', setBy: 'nobody' });
		await db
			.insert(sheets)
			.values({ yardId, key: 'own', sheet: { ...SAMPLE_SHEETS.varnish, name: 'own' } });
		const [step] = await db.select().from(steps).where(eq(steps.yardId, yardId)).limit(1);
		await db.insert(outlooks).values({ key: yardId, stepId: step.id, hours: {} });
		const [member] = await db
			.select()
			.from(memberships)
			.where(and(eq(memberships.yardId, yardId), eq(memberships.role, 'manager')));
		await db.insert(invitations).values({
			tokenHash: yardId,
			yardId,
			email: 'asked@quay.example',
			role: 'painter',
			invitedBy: member.userId,
			expiresAt: at
		});
		const { userId } = member;
		await db.insert(sessions).values({ id: yardId, userId, expiresAt: at });
		await db
			.insert(accessTokens)
			.values({ tokenHash: yardId, userId, name: 'own', scopes: ['hours:read'], expiresAt: at });
		const [boat] = await db.select().from(boats).where(eq(boats.yardId, yardId)).limit(1);
		await db.insert(boatPainters).values({ boatId: boat.id, userId }).onConflictDoNothing();
		const [face] = await db
			.insert(faces)
			.values({
				boatId: boat.id,
				name: 'keel',
				side: 'both',
				tilt: 90,
				material: 'steel',
				finish: 'matt',
				solarAbsorptance: 0.5,
				emissivity: 0.9
			})
			.returning();
		await db.insert(stepFaces).values({ stepId: step.id, faceId: face.id });
		await fillPlans(step, userId);
		await db.insert(keptBlobs).values({ yardId, sha256: 'x' });
		await db.insert(files).values({
			id: randomUUID(),
			yardId,
			boatId: boat.id,
			kind: 'photo',
			mediaType: 'image/jpeg',
			bytes: 1,
			sha256: 'x',
			sentSha256: 'x',
			name: 'keel.jpg'
		});
		await db
			.insert(absences)
			.values({ yardId, userId, fromDate: '2026-05-04', toDate: '2026-05-05' });
	}
}

/** A plan in force with all that hangs on it, for a step's job that waits for another. */
async function fillPlans({ id: stepId, jobId }: StepRow, userId: string): Promise<void> {
	const { db } = database;
	const at = new Date();
	const [job] = await db.select().from(jobs).where(eq(jobs.id, jobId));
	const [before] = await db
		.insert(jobs)
		.values({ boatId: job.boatId, name: 'Before', position: 98 })
		.returning();
	await db.insert(jobWaits).values({ jobId, afterId: before.id });
	await db.insert(stepPainters).values({ stepId, userId });
	const [plan] = await db
		.insert(plans)
		.values({ jobId, aim: 'soonest', forecastIssuedAt: at, launchReadyAssumed: false })
		.returning();
	await db.insert(planSteps).values({ planId: plan.id, stepId, startAt: at, finishAt: at });
	await db.insert(planAnswers).values({ planId: plan.id, stepId, userId, answer: 'accepted' });
}

const asStranger = <T>(work: () => PromiseLike<T>) => onBehalfOf(two.other.manager.id, work);
const asManager = <T>(work: () => PromiseLike<T>) => onBehalfOf(two.people.manager.id, work);
const boatNames = async () => (await web.db.select().from(boats)).map(({ name }) => name).sort();
/** The cause of a failed query: the database's own words. */
const refused = (work: Promise<unknown>) =>
	work.then(
		() => 'let through',
		(error: Error) => (error.cause instanceof Error ? error.cause.message : error.message)
	);

test('every table has a wall, in the schema and in the database', async () => {
	const { rows } = await database.pool.query<{ name: string; walls: number }>(
		`select c.relname as name, count(p.oid) filter (where c.relrowsecurity)::int as walls
		from pg_class c left join pg_policy p on p.polrelid = c.oid
		where c.relnamespace = 'public'::regnamespace and c.relkind in ('r', 'p')
		group by c.relname order by c.relname`
	);
	expect(rows.map(({ name }) => name)).toEqual(TABLES.map(getTableName).sort());
	expect(rows.filter(({ walls }) => walls === 0)).toEqual([]);
});

describe('a query that forgets its filter', () => {
	test('finds the rows of the person’s own yards only', async () => {
		expect(await asStranger(boatNames)).toEqual(['Sandpiper']);
		expect(await asManager(boatNames)).not.toContain('Sandpiper');
		expect(await asManager(boatNames)).toHaveLength(5);
		const found = await asStranger(() => web.db.select({ slug: yards.slug }).from(yards));
		expect(found).toEqual([{ slug: two.other.slug }]);
	});

	test('finds nothing behind another yard’s boat, job or step, and no other yard’s people', async () => {
		const [job] = await asStranger(() => web.db.select().from(jobs));
		const found = await asStranger(() => web.db.select().from(steps));
		expect(found.map(({ id, jobId }) => ({ id, jobId }))).toEqual([
			{ id: two.other.step, jobId: job.id }
		]);
		const people = await asStranger(() => web.db.select({ email: users.email }).from(users));
		expect(people).toEqual([{ email: two.other.manager.email }]);
	});

	test('shows the two yards nothing in common, in any table', async () => {
		for (const table of TABLES) {
			const name = getTableName(table);
			const all = sql<{ row: string }>`select to_jsonb(it)::text as row from ${table} it`;
			const rows = async () => (await web.db.execute(all)).rows.map(({ row }) => row);
			const theirs = await asStranger(rows);
			const ours = await asManager(rows);
			expect(
				ours.filter((it) => theirs.includes(it)),
				name
			).toEqual([]);
			// Each of them finds their own, so that nothing in common says something.
			if (OF_NOBODY.includes(name)) continue;
			expect(theirs.length, name).toBeGreaterThan(0);
			expect(ours.length, name).toBeGreaterThan(0);
		}
	});

	test('finds nothing at all on behalf of nobody', async () => {
		for (const table of TABLES) expect(await web.db.select().from(table)).toEqual([]);
	});
});

describe('a write that forgets its filter', () => {
	test('changes and deletes the own yard’s rows only', async () => {
		const renamed = await asStranger(() =>
			web.db.update(boats).set({ heading: 11 }).returning({ name: boats.name })
		);
		expect(renamed).toEqual([{ name: 'Sandpiper' }]);
		const gone = await asStranger(() => web.db.delete(sheets).returning({ name: sheets.name }));
		expect(gone).toEqual([{ name: 'own' }]);
		const left = await database.db.select({ name: sheets.name }).from(sheets);
		expect(left.map(({ name }) => name)).toContain('own');
	});

	test('cannot put a row into another yard, nor hang one on another’s boat, nor move one there', async () => {
		const [theirs] = await asStranger(() => web.db.select().from(boats));
		const [{ id: yardId }] = await database.db
			.select({ id: yards.id })
			.from(yards)
			.where(eq(yards.slug, two.other.slug));
		const wall = /row-level security/;
		const put = asManager(() => web.db.insert(boats).values({ yardId, name: 'Grebe', heading: 1 }));
		expect(await refused(put)).toMatch(wall);
		const hung = asManager(() =>
			web.db.insert(jobs).values({ boatId: theirs.id, name: 'Bottom', position: 1 })
		);
		expect(await refused(hung)).toMatch(wall);
		const moved = asManager(() => web.db.update(boats).set({ yardId }));
		expect(await refused(moved)).toMatch(wall);
		const rehung = asManager(() => web.db.update(jobs).set({ boatId: theirs.id }));
		expect(await refused(rehung)).toMatch(wall);
		const joined = asManager(() =>
			web.db.insert(memberships).values({ yardId, userId: two.people.manager.id, role: 'manager' })
		);
		expect(await refused(joined)).toMatch(wall);
	});
});

test('the yard of a row is that of what it hangs on, whatever is given', async () => {
	const [boat] = await asManager(() => web.db.select().from(boats).limit(1));
	const yardId = '00000000-0000-4000-8000-000000000000';
	const [job] = await asManager(() =>
		web.db.insert(jobs).values({ boatId: boat.id, yardId, name: 'Keel', position: 9 }).returning()
	);
	expect(job.yardId).toBe(boat.yardId);
});

describe('on whose behalf', () => {
	test('is kept apart on one pool, however queries interleave', async () => {
		const asked = Array.from({ length: 60 }, (_, i) =>
			i % 3 === 0 ? boatNames() : i % 3 === 1 ? asStranger(boatNames) : asManager(boatNames)
		);
		const counts = (await Promise.all(asked)).map((names) => names.length);
		expect(counts).toEqual(asked.map((_, i) => [0, 1, 5][i % 3]));
	});

	test('a transaction keeps the person it was begun for', async () => {
		const found = await asStranger(() =>
			web.db.transaction(async (tx) => {
				await onDuty('accounts', () => tx.execute(sql`select 1`));
				return tx.select({ name: boats.name }).from(boats);
			})
		);
		expect(found).toEqual([{ name: 'Sandpiper' }]);
	});

	test('a duty ends with its work, on the same connection', async () => {
		const one = createDatabase(database.webUrl, 'required');
		one.pool.options.max = 1;
		const people = () => one.db.select({ id: users.id }).from(users);
		expect(await onDuty('accounts', people)).toHaveLength(4);
		expect(await people()).toEqual([]);
		expect(await onDuty('health', people)).toEqual([]);
		await one.pool.end();
	});
});

test('a role that the walls do not hold is refused where they are required', async () => {
	const owner = createDatabase(database.url, 'required');
	await expect(refuseUnwalled(owner.db)).rejects.toThrow(UnwalledError);
	await owner.pool.end();
	await expect(refuseUnwalled(web.db)).resolves.toBeUndefined();
});
