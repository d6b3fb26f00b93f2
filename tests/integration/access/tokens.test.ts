import type { RequestEvent } from '@sveltejs/kit';
import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { SCOPES, type Scope } from '../../../src/lib/api/tokens';
import { ROUTE_SCOPES } from '../../../src/lib/server/access/scopes';
import { makeToken, tokensOf, withdrawToken } from '../../../src/lib/server/access/tokens';
import { composeWeb, parts } from '../../../src/lib/server/composition';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { accessTokens } from '../../../src/lib/server/db/schema';
import { jsonOrigin } from '../../../src/lib/server/hooks/jsonOrigin';
import { session } from '../../../src/lib/server/hooks/session';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let two: TwoYards;

beforeAll(async () => {
	database = await createTestDatabase();
	composeWeb(
		{ DATABASE_URL: database.webUrl, ORIGIN: 'http://127.0.0.1', LOG_LEVEL: 'silent' },
		'required'
	);
	two = await layTwoYards(database.db);
});
afterAll(async () => {
	await parts().close();
	await database.drop();
});

/** A token of the manager. */
async function made(scopes: readonly Scope[], yard: string | null = null): Promise<string> {
	const { id } = two.people.manager;
	const result = await onBehalfOf(id, () =>
		makeToken(parts().db, id, { name: 'script', scopes: [...scopes], yard, days: 30 })
	);
	if (result.outcome !== 'made') throw new Error(result.why);
	return result.token;
}

/** What the hooks say to a request before any handler: 204 where it would reach one. */
async function ask(
	route: string,
	authorization: string,
	{ slug = two.own.slug, address = '127.0.0.1', origin = 'http://elsewhere.example' } = {}
) {
	const [method, id] = route.split(' ');
	const url = new URL(id.replace('[slug]', slug), 'http://127.0.0.1');
	const event = {
		url,
		params: { slug },
		route: { id },
		locals: { requestId: 'token' },
		cookies: { get: () => undefined, set: () => undefined },
		getClientAddress: () => address,
		request: new Request(url, { method, headers: { authorization, origin } })
	} as unknown as RequestEvent;
	const resolve = () => new Response(null, { status: 204 });
	const answered = await session({
		event,
		resolve: async () => jsonOrigin({ event, resolve })
	});
	return { status: answered.status, user: event.locals.user, answered };
}

const HOURS = 'GET /api/v1/yards/[slug]/hours';

describe('what a token opens', () => {
	test.each(SCOPES)('%s opens what asks for it and nothing else', async (scope) => {
		const token = await made([scope]);
		for (const [route, needed] of Object.entries(ROUTE_SCOPES)) {
			const { status } = await ask(route, `Bearer ${token}`);
			expect(status, route).toBe(needed === 'open' || needed === scope ? 204 : 403);
		}
	});

	test('every scope that can be ticked opens something', () => {
		expect(SCOPES.filter((scope) => !Object.values(ROUTE_SCOPES).includes(scope))).toEqual([]);
	});

	test('a method that says no scope takes no token, whatever it holds', async () => {
		const token = await made(SCOPES);
		const { status } = await ask('PUT /api/v1/yards/[slug]/unheard-of', `Bearer ${token}`);
		expect(status).toBe(403);
	});

	test('a token of one yard opens no other', async () => {
		const token = await made(SCOPES, two.own.slug);
		expect((await ask(HOURS, `Bearer ${token}`)).status).toBe(204);
		expect((await ask(HOURS, `Bearer ${token}`, { slug: two.other.slug })).status).toBe(404);
	});

	test('a page of ours takes no token', async () => {
		const token = await made(SCOPES);
		expect((await ask('GET /you', `Bearer ${token}`)).user).toBeNull();
	});
});

describe('keeping tokens', () => {
	test('the table holds no token, only its hash', async () => {
		const token = await made(['boats:read']);
		expect(token).toMatch(/^yg_[\w-]{32}$/);
		const rows = await database.db.select().from(accessTokens);
		expect(JSON.stringify(rows)).not.toContain(token.slice(3));
		expect(rows.every(({ tokenHash }) => /^[0-9a-f]{64}$/.test(tokenHash))).toBe(true);
	});

	test('one that was used says when', async () => {
		const { id } = two.people.manager;
		await database.db.delete(accessTokens);
		await ask(HOURS, `Bearer ${await made(['hours:read'])}`);
		const [token] = await onBehalfOf(id, () => tokensOf(parts().db, id));
		expect(token.lastUsedAt).not.toBeNull();
	});

	test('one withdrawn, one that is over and one never made answer 401 alike', async () => {
		const { id } = two.people.manager;
		await database.db.delete(accessTokens);
		const withdrawn = await made(['hours:read']);
		const [row] = await onBehalfOf(id, () => tokensOf(parts().db, id));
		await onBehalfOf(id, () => withdrawToken(parts().db, id, row.id));
		const over = await made(['hours:read']);
		await database.db
			.update(accessTokens)
			.set({ expiresAt: sql`now() - interval '1 second'` })
			.where(eq(accessTokens.userId, id));
		const answers = await Promise.all(
			[withdrawn, over, `yg_${'x'.repeat(32)}`].map(async (token) => {
				const { status, user, answered } = await ask(HOURS, `Bearer ${token}`);
				expect(user).toBeNull();
				return [status, await answered.text()];
			})
		);
		expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
		expect(answers[0][0]).toBe(401);
	});

	test('who tries many unknown tokens is held up', async () => {
		const from = { address: '127.0.0.9' };
		let last = 0;
		for (let tried = 0; tried < 22; tried++)
			last = (await ask(HOURS, `Bearer yg_${tried}`, from)).status;
		expect(last).toBe(429);
		expect((await ask(HOURS, `Bearer yg_other`)).status).toBe(401);
	});

	test('nobody makes one for a yard they do not belong to', async () => {
		const { id } = two.people.manager;
		const result = await onBehalfOf(id, () =>
			makeToken(parts().db, id, {
				name: 'script',
				scopes: ['hours:read'],
				yard: two.other.slug,
				days: 7
			})
		);
		expect(result).toMatchObject({ outcome: 'refused', field: 'yard' });
	});
});
