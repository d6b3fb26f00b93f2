import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { requireMembership, type Membership } from '../../../src/lib/server/access/roles';
import { addBoat, boatOf, type NewBoat } from '../../../src/lib/server/boats/boats';
import { boatList } from '../../../src/lib/server/lists/boats';
import { queuedSteps } from '../../../src/lib/server/db/queue';
import { SAMPLE_SHEETS } from '../../../src/lib/engine';
import { boats, faces, jobs, sheets, stands } from '../../../src/lib/server/db/schema';
import { jobsOfBoat, queueJob } from '../../../src/lib/server/jobs/queueJob';
import { JOB_TEMPLATES } from '../../../src/lib/server/jobs/templates';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let two: TwoYards;
const as = (role: 'manager' | 'painter' | 'owner'): Promise<Membership> =>
	requireMembership(database.db, { user: two.people[role] }, two.own.slug);

beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
});
afterAll(() => database.drop());

const BOAT: NewBoat = {
	name: 'Dunlin',
	stand: '31',
	heading: 40,
	hull: 'steel',
	colour: 'white',
	ownerId: null
};

describe('adding a boat', () => {
	test('gives it the usual faces of its build, on a stand that is made where it is new', async () => {
		const manager = await as('manager');
		const id = await addBoat(database.db, manager, { ...BOAT, ownerId: two.people.owner.id });
		const boat = await boatOf(database.db, manager, id ?? '');
		expect(boat).toMatchObject({ name: 'Dunlin', heading: 40, stand: '31' });
		expect(boat?.faces).toHaveLength(11);
		const bottom = boat?.faces.find(({ name, side }) => name === 'bottom' && side === 'port');
		expect(bottom).toMatchObject({ material: 'steel', bearing: 270, solarAbsorptance: 0.9 });
		await addBoat(database.db, manager, { ...BOAT, name: 'Knot' });
		const rows = await database.db.select().from(stands).where(eq(stands.name, '31'));
		expect(rows).toHaveLength(1);
	});

	test('an owner’s is their own, and a manager names only owners of the yard', async () => {
		const owner = await as('owner');
		const id = await addBoat(database.db, owner, {
			...BOAT,
			name: 'Whimbrel',
			stand: '',
			ownerId: two.people.painter.id
		});
		const [row] = await database.db
			.select()
			.from(boats)
			.where(eq(boats.id, id ?? ''));
		expect(row).toMatchObject({ ownerId: two.people.owner.id, standId: null });
		const manager = await as('manager');
		for (const stranger of [two.people.painter.id, two.other.manager.id])
			expect(await addBoat(database.db, manager, { ...BOAT, ownerId: stranger })).toBeNull();
	});

	test('an owner’s list has their own, a painter’s those assigned, a manager’s all', async () => {
		const names = async (role: 'manager' | 'painter' | 'owner') =>
			(await boatList.page(database.db, await as(role), { limit: 200 })).items.map(
				({ name }) => name
			);
		const [all, mine, theirs] = [
			await names('manager'),
			await names('owner'),
			await names('painter')
		];
		expect(mine).toContain('Whimbrel');
		expect(theirs).not.toContain('Whimbrel');
		expect(all).toEqual(expect.arrayContaining([...mine, ...theirs, 'Knot']));
		expect(all).not.toContain('Sandpiper');
		expect(mine.length).toBeLessThan(all.length);
	});
});

describe('queueing a usual job', () => {
	test.each(JOB_TEMPLATES.map(({ code, steps: of }) => [code, of.length] as const))(
		'%s lays its steps in order, each with its faces and its sheet or rule',
		async (code, length) => {
			const manager = await as('manager');
			const id = (await addBoat(database.db, manager, { ...BOAT, name: code, stand: '' })) ?? '';
			expect((await queueJob(database.db, manager, id, code)).outcome).toBe('queued');
			const queue = await queuedSteps(database.db, eq(boats.id, id));
			expect(queue).toHaveLength(length);
			for (const { step, sheet, faces: worked } of queue) {
				expect(worked.length).toBeGreaterThan(0);
				if (step.kind === 'coat') expect(sheet?.sheet.sample).toBe(true);
				else expect(sheet).toBeNull();
			}
		}
	);

	test('goes behind what is queued already', async () => {
		const manager = await as('manager');
		const id = (await addBoat(database.db, manager, { ...BOAT, name: 'Godwit', stand: '' })) ?? '';
		await queueJob(database.db, manager, id, 'barrierCoat');
		await queueJob(database.db, manager, id, 'varnish');
		const rows = await database.db
			.select({ name: jobs.name })
			.from(jobs)
			.where(eq(jobs.boatId, id))
			.orderBy(jobs.position);
		expect(rows.map(({ name }) => name)).toEqual(['New barrier coat', 'Varnish']);
	});

	test('is refused on a boat without the faces, an unknown job, and another’s boat', async () => {
		const manager = await as('manager');
		const id = (await addBoat(database.db, manager, { ...BOAT, name: 'Ruff', stand: '' })) ?? '';
		await database.db.delete(faces).where(eq(faces.boatId, id));
		const why = async (membership: Membership, boat: string, code: string) => {
			const result = await queueJob(database.db, membership, boat, code);
			return result.outcome === 'refused' ? result.why : '';
		};
		expect(await why(manager, id, 'varnish')).toContain('none of the faces');
		expect(await why(manager, id, 'gilding')).toContain('no such usual job');
		const foreign = two.boatOf.get(two.own.stepOfAnother) ?? '';
		expect(await why(await as('owner'), foreign, 'varnish')).toContain('not yours to see');
		const strange = two.boatOf.get(two.other.step) ?? '';
		expect(await why(manager, strange, 'antifoulSeason')).toContain('not yours to see');
		expect(await jobsOfBoat(database.db, id)).toEqual([]);
	});
});

test('a coat whose sheet the yard has not is not queued, nor anything of its job', async () => {
	const manager = await as('manager');
	const id = (await addBoat(database.db, manager, { ...BOAT, name: 'Plover', stand: '' })) ?? '';
	const { name } = SAMPLE_SHEETS.etchPrimer;
	const rekey = (from: string, to: string) =>
		database.db.update(sheets).set({ key: to }).where(eq(sheets.key, from));
	await rekey('etchPrimer', 'gone');
	const result = await queueJob(database.db, manager, id, 'runningGear');
	await rekey('gone', 'etchPrimer');
	expect(result).toMatchObject({ outcome: 'refused', why: expect.stringContaining(name) });
	expect(await jobsOfBoat(database.db, id)).toEqual([]);
});
