import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Membership } from '../../../src/lib/server/access/roles';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { createDatabase } from '../../../src/lib/server/db/client';
import { boatList } from '../../../src/lib/server/lists/boats';
import { stepList } from '../../../src/lib/server/lists/steps';
import { FULL, layFullYard } from '../../fixtures/fullYard';
import { listQueries } from '../../fixtures/listQueries';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let web: ReturnType<typeof createDatabase>;
let manager: Membership;

beforeAll(async () => {
	database = await createTestDatabase();
	manager = await layFullYard(database);
	web = createDatabase(database.webUrl, 'required');
}, 120_000);
afterAll(async () => {
	await web.pool.end();
	await database.drop();
});

/** Tables that hold a row for each boat or more. */
const GREAT = ['boats', 'jobs', 'steps', 'step_painters', 'changes'];

/** How often each great table was read as a whole, by anybody, functions of the database too. */
async function wholeReads(): Promise<Record<string, number>> {
	const { rows } = await database.pool.query<{ relname: string; seq_scan: string }>(
		`select relname, seq_scan from pg_stat_user_tables where relname = any($1)`,
		[GREAT]
	);
	return Object.fromEntries(rows.map(({ relname, seq_scan }) => [relname, Number(seq_scan)]));
}

interface Plan {
	readonly 'Node Type': string;
	readonly 'Relation Name'?: string;
	readonly Plans?: readonly Plan[];
}
const nodes = (plan: Plan): Plan[] => [plan, ...(plan.Plans ?? []).flatMap(nodes)];

/** Every query sent while some work ran, with its plan as the web role gets it. */
async function plansOf(work: () => Promise<unknown>): Promise<Plan[]> {
	const sent: { text: string; values: unknown[] }[] = [];
	const { Client } = await import('pg').then(({ default: pg }) => pg);
	const query = Client.prototype.query as (...given: unknown[]) => unknown;
	Client.prototype.query = function (this: unknown, ...given: unknown[]) {
		const [asked, values] = given as [string | { text: string; values?: unknown[] }, unknown[]];
		const text = typeof asked === 'string' ? asked : asked.text;
		if (/^select "/.test(text)) sent.push({ text, values });
		return query.apply(this, given);
	} as never;
	try {
		await onBehalfOf(manager.user.id, work);
	} finally {
		Client.prototype.query = query as never;
	}
	return onBehalfOf(manager.user.id, async () => {
		const plans: Plan[] = [];
		for (const { text, values } of sent) {
			const { rows } = await web.pool.query(`explain (format json) ${text}`, values);
			plans.push((rows[0] as { 'QUERY PLAN': { Plan: Plan }[] })['QUERY PLAN'][0].Plan);
		}
		return plans;
	});
}

describe('a full yard, behind row-level security', () => {
	test('no list reads a great table as a whole, neither by its plan nor in fact', async () => {
		const queries = await onBehalfOf(manager.user.id, () => listQueries(web.db, manager));
		expect(queries.length).toBeGreaterThan(15);
		for (const { name, read, query } of queries) {
			const before = await wholeReads();
			const plans = await plansOf(() => read(query));
			expect(plans.length, name).toBeGreaterThan(0);
			const whole = plans
				.flatMap(nodes)
				.filter((node) => node['Node Type'] === 'Seq Scan')
				.map((node) => node['Relation Name'] ?? '')
				.filter((table) => GREAT.includes(table));
			expect(whole, `${name}: by its plan`).toEqual([]);
			await web.pool.query('select pg_stat_force_next_flush()');
			expect(await wholeReads(), `${name}: in fact`).toEqual(before);
		}
	}, 60_000);

	test('pages go through every boat once, in order', async () => {
		const seen: string[] = [];
		let cursor: string | null | undefined;
		do {
			const page = await onBehalfOf(manager.user.id, () =>
				boatList.page(web.db, manager, { limit: 200, cursor: cursor ?? undefined })
			);
			seen.push(...page.items.map(({ id }) => id));
			cursor = page.next;
		} while (cursor !== null);
		expect(seen.length).toBe(FULL.boats);
		expect(new Set(seen).size).toBe(FULL.boats);
	}, 60_000);

	test('filters find what they say and nothing else', async () => {
		const [boats, steps] = await onBehalfOf(manager.user.id, () =>
			Promise.all([
				boatList.page(web.db, manager, { limit: 200, q: 'owner 77' }),
				stepList.page(web.db, manager, { limit: 200, state: 'underWay', kind: 'coat' })
			])
		);
		expect(boats.items.length).toBeGreaterThan(5);
		for (const { owner } of boats.items) expect(owner?.name).toMatch(/^Owner 77/);
		expect(steps.items.length).toBe(200);
		for (const { state, kind } of steps.items) expect([state, kind]).toEqual(['underWay', 'coat']);
	});

	test('a percent sign looks for a percent sign', async () => {
		const page = await onBehalfOf(manager.user.id, () =>
			boatList.page(web.db, manager, { limit: 50, q: '%' })
		);
		expect(page.items).toEqual([]);
	});

	test('words find nothing of a yard that one does not belong to', async () => {
		const page = await onBehalfOf(null, () =>
			boatList.page(web.db, manager, { limit: 50, q: 'ren' })
		);
		expect(page.items).toEqual([]);
		const { rows } = await onBehalfOf(null, () =>
			web.pool.query('select app_boats_like($1, $2, 10)', [manager.yard.id, 'ren'])
		);
		expect(rows).toEqual([]);
	});
});
