import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { composeWeb, parts } from '../../../src/lib/server/composition';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { boats, type Role } from '../../../src/lib/server/db/schema';
import * as boatRoute from '../../../src/routes/api/v1/yards/[slug]/boats/[boat]/+server';
import * as facesRoute from '../../../src/routes/api/v1/yards/[slug]/boats/[boat]/faces/+server';
import * as faceRoute from '../../../src/routes/api/v1/yards/[slug]/boats/[boat]/faces/[face]/+server';
import * as staysRoute from '../../../src/routes/api/v1/yards/[slug]/boats/[boat]/stays/+server';
import * as yardRoute from '../../../src/routes/api/v1/yards/[slug]/+server';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';
import { eventOf, told, type Asked } from '../api/events';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let two: TwoYards;
let boat: string;

beforeAll(async () => {
	database = await createTestDatabase();
	composeWeb(
		{ DATABASE_URL: database.webUrl, ORIGIN: 'http://127.0.0.1', LOG_LEVEL: 'silent' },
		'required'
	);
	two = await layTwoYards(database.db);
	boat = two.boatOf.get(two.own.step) ?? '';
});
afterAll(async () => {
	await parts().close();
	await database.drop();
});

// The handlers differ in their routes' own event types alone.
type Handler = (event: never) => Response | Promise<Response>;
async function ask(role: Role, handler: Handler, asked: Asked & { json?: unknown } = {}) {
	const user = two.people[role];
	const { json, params, ...rest } = asked;
	const event = eventOf({
		...rest,
		user,
		params: { slug: two.own.slug, boat, ...params },
		...(json === undefined
			? {}
			: { body: JSON.stringify(json), headers: { 'content-type': 'application/json' } })
	});
	return onBehalfOf(user.id, async () => {
		const response = await handler(event as never);
		return response.status === 204 ? { status: 204, body: null } : told(response);
	});
}
const patch = (role: Role, json: unknown) => ask(role, boatRoute.PATCH, { method: 'PATCH', json });
const now = async () => (await ask('manager', boatRoute.GET)).body;

describe('changing a boat', () => {
	test('its owner changes name, dates and painters', async () => {
		const { revision } = await now();
		const changed = await patch('owner', {
			name: 'Corncrake II',
			hauledOn: '2026-04-01',
			launchBy: '2026-06-01',
			painterIds: [],
			revision
		});
		expect(changed).toMatchObject({
			status: 200,
			body: { name: 'Corncrake II', launchBy: '2026-06-01', painterIds: [] }
		});
		const back = await patch('owner', {
			painterIds: [two.people.painter.id],
			revision: changed.body.revision
		});
		expect(back.body.painterIds).toEqual([two.people.painter.id]);
	});

	test('whose it is and where it stands is the managers’ to say', async () => {
		const { revision } = await now();
		expect(await patch('owner', { standId: null, revision })).toMatchObject({
			status: 409,
			body: { errors: [{ pointer: '/standId' }] }
		});
		expect(await patch('owner', { ownerId: null, revision })).toMatchObject({
			status: 409,
			body: { errors: [{ pointer: '/ownerId' }] }
		});
		expect(await patch('manager', { standId: null, heading: 360, revision })).toMatchObject({
			status: 200,
			body: { standId: null, heading: 0 }
		});
		const { body } = await ask('owner', staysRoute.GET);
		expect(body.stays[0].until).not.toBeNull();
	});

	test('an owner who is none, a painter who is none, and a launch before the haul are refused', async () => {
		const { revision } = await now();
		const pointers = [
			['/ownerId', { ownerId: two.people.painter.id }],
			['/painterIds', { painterIds: [two.other.manager.id] }],
			['/launchBy', { launchBy: '2026-03-01' }]
		] as const;
		for (const [pointer, change] of pointers)
			expect(await patch('manager', { ...change, revision })).toMatchObject({
				status: 409,
				body: { errors: [{ pointer }] }
			});
		expect((await now()).revision).toBe(revision);
	});

	test('on an old revision is refused with who came first', async () => {
		const { revision } = await now();
		const late = await patch('owner', { name: 'Late', revision: revision - 1 });
		expect(late).toMatchObject({ status: 409, body: { errors: [{ pointer: '/revision' }] } });
		expect(late.body.detail).toContain(two.people.manager.name);
	});

	test('a wrong field is named, and nothing is written', async () => {
		const { revision, heading } = await now();
		const wrong = await patch('manager', { heading: 400, length: 9, revision });
		expect(wrong.status).toBe(400);
		expect(wrong.body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual(
			expect.arrayContaining(['/heading', '/length'])
		);
		expect((await now()).heading).toBe(heading);
	});
});

describe('faces', () => {
	const FACE = {
		name: 'rudder',
		side: 'both',
		material: 'grp',
		finish: 'matt',
		solarAbsorptance: 0.9,
		emissivity: 0.9
	};

	test('are added with the tilt of their kind, changed and taken away after one question', async () => {
		const { faces } = await now();
		const worked = faces[0];
		const added = await ask('owner', facesRoute.POST, { method: 'POST', json: FACE });
		expect(added).toMatchObject({ status: 201, body: { tilt: 90, bearing: 90, area: null } });
		const again = await ask('owner', facesRoute.POST, { method: 'POST', json: FACE });
		expect(again).toMatchObject({ status: 409 });
		const { id, revision } = added.body;
		const light = await ask('owner', faceRoute.PATCH, {
			method: 'PATCH',
			params: { face: id },
			json: { solarAbsorptance: 0.25, revision }
		});
		expect(light).toMatchObject({ status: 200, body: { solarAbsorptance: 0.25 } });
		const remove = (face: { id: string; revision: number }, more = '') =>
			ask('owner', faceRoute.DELETE, {
				method: 'DELETE',
				params: { face: face.id },
				url: `http://127.0.0.1/api/v1?revision=${face.revision}${more}`
			});
		expect((await remove(light.body)).status).toBe(204);
		expect(await remove(worked)).toMatchObject({
			status: 409,
			body: { detail: expect.stringContaining('settled') }
		});
		expect((await remove(worked, '&settled=true')).status).toBe(204);
	});

	test('of another’s boat are not there', async () => {
		const foreign = two.boatOf.get(two.own.stepOfAnother) ?? '';
		const asked = { method: 'POST', json: FACE, params: { boat: foreign } };
		expect((await ask('owner', facesRoute.POST, asked)).status).toBe(404);
		expect((await ask('painter', facesRoute.POST, { ...asked, params: {} })).status).toBe(403);
	});
});

test('a yard is read by its people and changed by its managers', async () => {
	const { body } = await ask('painter', yardRoute.GET);
	expect(body).toMatchObject({ slug: two.own.slug, quietHours: [], holidays: [] });
	const change = { daysAhead: 6, revision: body.revision };
	expect((await ask('owner', yardRoute.PATCH, { method: 'PATCH', json: change })).status).toBe(403);
	const changed = await ask('manager', yardRoute.PATCH, { method: 'PATCH', json: change });
	expect(changed).toMatchObject({ status: 200, body: { daysAhead: 6 } });
	const late = await ask('manager', yardRoute.PATCH, { method: 'PATCH', json: change });
	expect(late.status).toBe(409);
});

test('a boat goes only when that is settled', async () => {
	const { revision } = await now();
	const remove = (more: string) =>
		ask('owner', boatRoute.DELETE, {
			method: 'DELETE',
			url: `http://127.0.0.1/api/v1?revision=${revision}${more}`
		});
	expect(await remove('')).toMatchObject({
		status: 409,
		body: { detail: expect.stringContaining('cannot be undone') }
	});
	expect((await remove('&settled=true')).status).toBe(204);
	expect(await database.db.select().from(boats).where(eq(boats.id, boat))).toEqual([]);
});
