import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { StepEdit } from '../../../src/lib/api/jobs';
import { requireMembership, type Membership } from '../../../src/lib/server/access/roles';
import { addBoat } from '../../../src/lib/server/boats/boats';
import { boatPainters, boats, faces, jobs, sheets, steps } from '../../../src/lib/server/db/schema';
import { stepRows } from '../../../src/lib/server/db/queue';
import { changeJob, orderJobs, orderSteps } from '../../../src/lib/server/jobs/jobEdit';
import { jobView } from '../../../src/lib/server/jobs/jobView';
import { queueJob } from '../../../src/lib/server/jobs/queueJob';
import { addStep, changeStep } from '../../../src/lib/server/jobs/stepEdit';
import { moveStep } from '../../../src/lib/server/jobs/stepState';
import { stepOf } from '../../../src/lib/server/outlook/engineInput';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let two: TwoYards;
let manager: Membership;
let painter: Membership;
let owner: Membership;
/** A boat of the owner's with a fresh barrier coat and varnish queued. */
let boatId: string;
let jobId: string;
let varnishId: string;

beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	const as = (role: 'manager' | 'painter' | 'owner') =>
		requireMembership(database.db, { user: two.people[role] }, two.own.slug);
	[manager, painter, owner] = await Promise.all([as('manager'), as('painter'), as('owner')]);
});
afterAll(() => database.drop());
beforeEach(async () => {
	const boat = { stand: '', heading: 0, hull: 'grp', colour: 'white', ownerId: null } as const;
	boatId = (await addBoat(database.db, owner, { ...boat, name: 'Dunlin' })) ?? '';
	const queue = async (code: string) => {
		const result = await queueJob(database.db, manager, boatId, code);
		if (result.outcome !== 'queued') throw new Error(result.why);
		return result.jobId;
	};
	jobId = await queue('barrierCoat');
	varnishId = await queue('varnish');
});

const stepsOf = (id: string) =>
	database.db.select().from(steps).where(eq(steps.jobId, id)).orderBy(asc(steps.position));
const view = async (id = jobId, who = manager) => {
	const found = await jobView(database.db, who, id);
	if (found === null) throw new Error('no such job');
	return found;
};

async function editOf(change: Partial<StepEdit> = {}): Promise<StepEdit> {
	const [face] = await database.db.select().from(faces).where(eq(faces.boatId, boatId));
	const [sheet] = await database.db
		.select()
		.from(sheets)
		.where(eq(sheets.key, 'epoxyBarrier'))
		.innerJoin(boats, eq(boats.yardId, sheets.yardId))
		.limit(1)
		.then((rows) => rows.map((row) => row.sheets));
	return {
		name: 'barrier coat 5',
		kind: 'coat',
		method: 'roller',
		hours: 2,
		sheetId: sheet.id,
		task: null,
		shelter: 'open',
		faceIds: [face.id],
		painterIds: [],
		pinnedAt: null,
		...change
	};
}

describe('the order of steps', () => {
	test('is changed as a whole, on the state it was made from', async () => {
		const before = await view();
		const order = before.steps.map(({ id }) => id);
		const swapped = [order[1], order[0], ...order.slice(2)];
		const ask = { revision: before.revision, order: swapped };
		expect(await orderSteps(database.db, manager, jobId, ask)).toEqual({ outcome: 'done' });
		expect((await view()).steps.map(({ id }) => id)).toEqual(swapped);
		expect(await orderSteps(database.db, owner, jobId, ask)).toMatchObject({ outcome: 'stale' });
	});

	test('leaves what has begun in its place, and names every step once', async () => {
		const { steps: listed } = await view();
		const [first] = listed;
		const now = new Date();
		await moveStep(database.db, owner, first.id, { revision: 1, to: 'underWay' }, now);
		const order = listed.map(({ id }) => id);
		const { revision } = await view();
		const put = (asked: string[]) =>
			orderSteps(database.db, manager, jobId, { revision, order: asked });
		expect(await put([order[1], order[0], ...order.slice(2)])).toMatchObject({
			outcome: 'refused',
			why: expect.stringContaining(`“${first.name}” has begun`)
		});
		expect(await put(order.slice(1))).toMatchObject({ outcome: 'refused' });
		expect(await put([...order.slice(1), order[1]])).toMatchObject({ outcome: 'refused' });
		expect((await view()).steps.map(({ id }) => id)).toEqual(order);
	});

	test('of jobs is the boat’s', async () => {
		const [{ revision }] = await database.db.select().from(boats).where(eq(boats.id, boatId));
		const order = [varnishId, jobId];
		expect(await orderJobs(database.db, boatId, { revision, order })).toEqual({
			outcome: 'done'
		});
		const rows = await database.db
			.select({ id: jobs.id })
			.from(jobs)
			.where(eq(jobs.boatId, boatId))
			.orderBy(jobs.position);
		expect(rows.map(({ id }) => id)).toEqual(order);
		expect(await orderJobs(database.db, boatId, { revision, order })).toMatchObject({
			outcome: 'stale'
		});
	});
});

describe('one job after another', () => {
	test('is kept within the boat and never in a circle', async () => {
		const edit = async (id: string, waitsFor: string[]) =>
			changeJob(database.db, manager, id, {
				revision: (await view(id)).revision,
				name: 'Renamed',
				waitsFor
			});
		expect(await edit(varnishId, [jobId])).toEqual({ outcome: 'done' });
		expect(await view(varnishId)).toMatchObject({ name: 'Renamed', waitsFor: [{ id: jobId }] });
		expect(await edit(jobId, [varnishId])).toMatchObject({
			outcome: 'refused',
			field: 'waitsFor'
		});
		expect(await edit(jobId, [jobId])).toMatchObject({ outcome: 'refused' });
		const [foreign] = await database.db
			.select({ id: jobs.id })
			.from(jobs)
			.where(eq(jobs.boatId, two.boatOf.get(two.own.step) ?? ''));
		expect(await edit(jobId, [foreign.id])).toMatchObject({ outcome: 'refused' });
		expect((await view()).waitsFor).toEqual([]);
	});
});

describe('a step', () => {
	test('is added behind the others with its faces and people, who then see the boat', async () => {
		const edit = await editOf({ painterIds: [two.people.painter.id] });
		expect(await jobView(database.db, painter, jobId)).toBeNull();
		const added = await addStep(database.db, manager, jobId, edit);
		expect(added.outcome).toBe('done');
		const last = (await view(jobId, painter)).steps.at(-1);
		expect(last).toMatchObject({
			name: 'barrier coat 5',
			hours: 2,
			sheet: { name: expect.stringContaining('barrier') },
			painters: [{ name: two.people.painter.name }],
			caution: expect.stringContaining('Epoxy')
		});
	});

	test('an owner names no painter whom they have not asked to the boat', async () => {
		const edit = await editOf({ painterIds: [two.people.painter.id] });
		expect(await addStep(database.db, owner, jobId, edit)).toMatchObject({
			outcome: 'refused',
			field: 'painterIds'
		});
		await database.db.insert(boatPainters).values({ boatId, userId: two.people.painter.id });
		expect(await addStep(database.db, owner, jobId, edit)).toMatchObject({ outcome: 'done' });
	});

	test('takes faces of its own boat and sheets of its own yard only', async () => {
		const [face] = await database.db
			.select()
			.from(faces)
			.where(eq(faces.boatId, two.boatOf.get(two.own.step) ?? ''));
		const foreignFace = await addStep(
			database.db,
			manager,
			jobId,
			await editOf({ faceIds: [face.id] })
		);
		expect(foreignFace).toMatchObject({ outcome: 'refused', field: 'faceIds' });
		const noSheet = { sheetId: '00000000-0000-4000-8000-000000000000' };
		expect(await addStep(database.db, manager, jobId, await editOf(noSheet))).toMatchObject({
			outcome: 'refused',
			field: 'sheetId'
		});
		expect(await stepsOf(jobId)).toHaveLength(8);
	});

	test('is changed on the state one saw, with all that hangs on it or nothing', async () => {
		const [, , third] = await stepsOf(jobId);
		const edit = await editOf({ name: 'barrier, thinned', hours: 3 });
		const change = (revision: number, who: Membership, what: StepEdit) =>
			changeStep(database.db, who, third.id, revision, what);
		expect(await change(third.revision, manager, edit)).toEqual({ outcome: 'done' });
		const stale = await change(third.revision, owner, { ...edit, faceIds: edit.faceIds });
		expect(stale).toMatchObject({ outcome: 'stale', revision: third.revision + 1 });
		const [row] = await stepRows(database.db, eq(steps.id, third.id));
		expect(row.step).toMatchObject({ name: 'barrier, thinned', durationMinutes: 180 });
		expect(row.faces).toHaveLength(1);
	});

	test('shifting the pads is the yard’s own work', async () => {
		const pads = await editOf({
			name: 'shift the pads',
			kind: 'fit',
			method: 'none',
			sheetId: null,
			task: 'shiftPads'
		});
		expect(await addStep(database.db, owner, jobId, pads)).toMatchObject({
			outcome: 'refused',
			field: 'task'
		});
		const added = await addStep(database.db, manager, jobId, pads);
		if (added.outcome !== 'done') throw new Error('not added');
		const move = { revision: 1, to: 'underWay' } as const;
		expect(await moveStep(database.db, owner, added.id, move, new Date())).toMatchObject({
			outcome: 'refused'
		});
		expect(await moveStep(database.db, manager, added.id, move, new Date())).toEqual({
			outcome: 'done'
		});
	});
});

describe('the state of a step', () => {
	const NOW = new Date('2026-05-04T12:00:00Z');
	const move = async (id: string, to: 'underWay' | 'curing' | 'done' | 'queued', at?: string) => {
		const [{ revision }] = await database.db.select().from(steps).where(eq(steps.id, id));
		return moveStep(
			database.db,
			manager,
			id,
			{ revision, to, ...(at === undefined ? {} : { at }) },
			NOW
		);
	};

	test('a coat goes through curing, with the times that were said', async () => {
		const [, , coat] = await stepsOf(jobId);
		expect(await move(coat.id, 'underWay', '2026-05-04T08:00:00Z')).toEqual({ outcome: 'done' });
		expect(await move(coat.id, 'done')).toMatchObject({ outcome: 'refused' });
		expect(await move(coat.id, 'curing', '2026-05-04T07:00:00Z')).toMatchObject({
			outcome: 'refused',
			field: 'at'
		});
		expect(await move(coat.id, 'curing', '2026-05-04T10:15:00Z')).toEqual({ outcome: 'done' });
		const [row] = await database.db.select().from(steps).where(eq(steps.id, coat.id));
		expect(row).toMatchObject({
			state: 'curing',
			startedAt: new Date('2026-05-04T08:00:00Z'),
			finishedAt: new Date('2026-05-04T10:15:00Z')
		});
		expect(await move(coat.id, 'done')).toEqual({ outcome: 'done' });
	});

	test('nothing ends before it begins or is yet to come, and a mistake is taken back', async () => {
		const [wash] = await stepsOf(jobId);
		expect(await move(wash.id, 'underWay', '2026-05-04T13:00:00Z')).toMatchObject({
			outcome: 'refused',
			why: 'That time is still to come.'
		});
		expect(await move(wash.id, 'curing')).toMatchObject({ outcome: 'refused' });
		expect(await move(wash.id, 'done')).toEqual({ outcome: 'done' });
		const [done] = await database.db.select().from(steps).where(eq(steps.id, wash.id));
		expect(done.finishedAt).toEqual(NOW);
		expect(done.startedAt).toEqual(new Date(NOW.getTime() - done.durationMinutes * 60_000));
		expect(await move(wash.id, 'queued')).toEqual({ outcome: 'done' });
		const [back] = await database.db.select().from(steps).where(eq(steps.id, wash.id));
		expect(back).toMatchObject({ state: 'queued', startedAt: null, finishedAt: null });
	});

	test('of another’s boat is nobody’s to change', async () => {
		const [wash] = await stepsOf(jobId);
		const asked = moveStep(database.db, painter, wash.id, { revision: 1, to: 'done' }, NOW);
		expect(await asked).toEqual({ outcome: 'gone' });
	});
});

test('the engine is given the sheet’s times toward the coat that really follows', async () => {
	const rows = await stepRows(database.db, eq(jobs.id, jobId));
	const coats = rows.filter(({ step }) => step.kind === 'coat');
	expect(coats.map(({ nextCoating }) => nextCoating)).toEqual([
		'epoxyBarrier',
		'epoxyBarrier',
		'epoxyBarrier',
		'erodingAntifouling',
		'erodingAntifouling',
		null
	]);
	const pair = coats[3].sheet?.sheet.following?.erodingAntifouling;
	expect(stepOf(coats[3], manager.yard).times.overcoatMin).toEqual(pair?.overcoatMin);
	const dropped = coats[4].step.id;
	await database.db.update(steps).set({ state: 'dropped' }).where(eq(steps.id, dropped));
	const [again] = await stepRows(database.db, eq(steps.id, coats[3].step.id));
	expect(again.nextCoating).toBe('erodingAntifouling');
});
