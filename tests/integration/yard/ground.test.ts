import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { requireMembership, type Membership } from '../../../src/lib/server/access/roles';
import { staysOf } from '../../../src/lib/server/boats/stays';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { createDatabase } from '../../../src/lib/server/db/client';
import { allBoatsOf, queuedSteps } from '../../../src/lib/server/db/queue';
import { boats, stays, type Role } from '../../../src/lib/server/db/schema';
import { boatsOnGround, moveBoat } from '../../../src/lib/server/ground/moveBoat';
import {
	addStand,
	changeStand,
	removeStand,
	standsOf
} from '../../../src/lib/server/ground/stands';
import { faceOf } from '../../../src/lib/server/outlook/engineInput';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let web: ReturnType<typeof createDatabase>;
let two: TwoYards;
let manager: Membership;

beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	web = createDatabase(database.webUrl, 'required');
	manager = await as('manager', () => memberOf('manager'));
});
afterAll(async () => {
	await web.pool.end();
	await database.drop();
});

const memberOf = (role: Role) =>
	requireMembership(web.db, { user: two.people[role] }, two.own.slug);
const as = <T>(role: Role, work: () => PromiseLike<T>) => onBehalfOf(two.people[role].id, work);
const asManager = <T>(work: () => PromiseLike<T>) => as('manager', work);
const boatNamed = async (name: string) =>
	(await database.db.select().from(boats).where(eq(boats.name, name)))[0];
const standNamed = async (name: string) => {
	const found = (await asManager(() => standsOf(web.db, manager))).find((it) => it.name === name);
	if (found === undefined) throw new Error(`no stand ${name}`);
	return found;
};
/** What one person does within ten minutes is one stay: as if the last began before. */
const longAgo = () => database.db.update(stays).set({ since: new Date(Date.now() - 3_600_000) });

describe('moving a boat', () => {
	test('keeps where it stood, from when to when, how it headed and who moved it', async () => {
		const boat = await boatNamed('Corncrake');
		const added = await asManager(() => addStand(web.db, manager, { name: 'N1', x: 5, y: 5 }));
		const standId = 'id' in added ? added.id : '';
		const before = await asManager(() => staysOf(web.db, boat.id));
		expect(before).toHaveLength(1);
		expect(before[0]).toMatchObject({ standName: '7', heading: boat.heading, until: null });
		await longAgo();
		const moved = await asManager(() =>
			moveBoat(web.db, manager, boat.id, { standId, heading: 360, revision: boat.revision })
		);
		expect(moved).toEqual({ outcome: 'changed' });
		const [now, then] = await asManager(() => staysOf(web.db, boat.id));
		expect(now).toMatchObject({
			standName: 'N1',
			heading: 0,
			until: null,
			personName: two.people.manager.name
		});
		expect(then).toMatchObject({ standName: '7', until: now.since });
	});

	test('turning it within minutes is the same stay, later another', async () => {
		const turn = async (heading: number) => {
			const { id, standId, revision } = await boatNamed('Corncrake');
			return asManager(() => moveBoat(web.db, manager, id, { standId, heading, revision }));
		};
		const { id } = await boatNamed('Corncrake');
		await turn(10);
		await turn(15);
		const once = await asManager(() => staysOf(web.db, id));
		expect(once.map(({ heading }) => heading)[0]).toBe(15);
		await longAgo();
		await turn(90);
		expect(await asManager(() => staysOf(web.db, id))).toHaveLength(once.length + 1);
	});

	test('to a stand that is taken, or another yard’s, is refused, and says by whom', async () => {
		const { id, heading, revision } = await boatNamed('Corncrake');
		const other = await boatNamed('Pipistrelle');
		const onto = (standId: string) =>
			asManager(() => moveBoat(web.db, manager, id, { standId, heading, revision }));
		expect(await onto(other.standId ?? '')).toMatchObject({
			outcome: 'refused',
			why: expect.stringContaining('Pipistrelle')
		});
		const strange = await database.db.query.stands.findMany();
		const nowhere = '00000000-0000-4000-8000-000000000000';
		expect(strange.length).toBeGreaterThan(0);
		expect(await onto(nowhere)).toMatchObject({ outcome: 'refused' });
	});

	test('on an old revision says who came first and moves nothing', async () => {
		const { id, standId, heading, revision } = await boatNamed('Corncrake');
		const late = await asManager(() =>
			moveBoat(web.db, manager, id, { standId: null, heading, revision: revision - 1 })
		);
		expect(late).toMatchObject({ outcome: 'stale', revision });
		expect((await boatNamed('Corncrake')).standId).toBe(standId);
	});

	test('the web process cannot write stays', async () => {
		const { id, standId } = await boatNamed('Corncrake');
		await expect(
			asManager(() =>
				web.db.insert(stays).values({ boatId: id, standId, standName: 'x', heading: 1 })
			)
		).rejects.toThrow();
	});
});

describe('a stand', () => {
	test('is renamed, placed and given its lee, which reaches the faces on it', async () => {
		const { id, revision } = await standNamed('N1');
		const lee = [{ from: 200, to: 290, factor: 0.4, height: 5 }];
		const changed = await asManager(() =>
			changeStand(web.db, manager, id, { name: 'North 1', x: 12.5, y: 40, lee, revision })
		);
		expect(changed).toEqual({ outcome: 'changed' });
		const queue = await queuedSteps(database.db, allBoatsOf(manager.yard.id));
		const here = queue.find(({ boat }) => boat.name === 'Corncrake');
		const there = queue.find(({ boat }) => boat.name === 'Pipistrelle');
		if (here === undefined || there === undefined) throw new Error('both have steps');
		expect(faceOf(here.faces[0], here).lee).toEqual(lee);
		expect(faceOf(there.faces[0], there)).not.toHaveProperty('lee');
	});

	test('keeps a name that another has', async () => {
		const { id, revision } = await standNamed('North 1');
		const result = await asManager(() => changeStand(web.db, manager, id, { name: '7', revision }));
		expect(result).toMatchObject({ outcome: 'refused', why: expect.stringContaining('7') });
	});

	test('with a boat on it goes only when that is settled; the boat’s stay then ends', async () => {
		const { id, revision } = await standNamed('North 1');
		const remove = (settled: boolean) =>
			asManager(() => removeStand(web.db, manager, id, revision, settled));
		expect(await remove(false)).toMatchObject({
			outcome: 'asks',
			why: expect.stringContaining('Corncrake')
		});
		expect(await remove(true)).toEqual({ outcome: 'changed' });
		const boat = await boatNamed('Corncrake');
		expect(boat.standId).toBeNull();
		const [last] = await asManager(() => staysOf(web.db, boat.id));
		expect(last.standName).toBe('N1');
		expect(last.until).toBeInstanceOf(Date);
	});
});

test('an owner sees their own boats on the ground and no other', async () => {
	const owner = await as('owner', () => memberOf('owner'));
	const theirs = await as('owner', () => boatsOnGround(web.db, owner));
	expect(theirs.map(({ name }) => name)).not.toContain('Pipistrelle');
	expect(theirs.length).toBeGreaterThan(0);
});
