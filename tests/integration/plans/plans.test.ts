import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startForecastFake, type ForecastFake } from '../../../fakes/forecast/server';
import type { JobPlans } from '../../../src/lib/api/plans';
import { requireMembership, type Membership } from '../../../src/lib/server/access/roles';
import { addBoat } from '../../../src/lib/server/boats/boats';
import { readConfig } from '../../../src/lib/server/config';
import {
	absences,
	boats,
	jobWaits,
	memberships,
	plans,
	stepPainters,
	steps,
	yards
} from '../../../src/lib/server/db/schema';
import { refreshForecast } from '../../../src/lib/server/forecast/refresh';
import { jobView } from '../../../src/lib/server/jobs/jobView';
import { queueJob } from '../../../src/lib/server/jobs/queueJob';
import { jobPlans } from '../../../src/lib/server/plans/jobPlans';
import { answerPlan, letGo, takePlan } from '../../../src/lib/server/plans/takePlan';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

const NOW = new Date();
let database: Awaited<ReturnType<typeof createTestDatabase>>;
let fake: ForecastFake;
let two: TwoYards;
let manager: Membership;
let painter: Membership;

beforeAll(async () => {
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	const as = (role: 'manager' | 'painter') =>
		requireMembership(database.db, { user: two.people[role] }, two.own.slug);
	[manager, painter] = await Promise.all([as('manager'), as('painter')]);
	fake = await startForecastFake({
		scenario: { kind: 'story', timeZone: manager.yard.timeZone, members: 6 }
	});
	const config = readConfig({
		DATABASE_URL: database.url,
		ORIGIN: 'http://127.0.0.1',
		OPEN_METEO_URL: fake.url,
		OPEN_METEO_ENSEMBLE_URL: fake.url,
		MET_NORWAY_URL: fake.url,
		FORECAST_CONTACT: 'harbour@yard.example'
	});
	await refreshForecast({ db: database.db, config }, manager.yard, NOW);
});
afterAll(async () => {
	await database.drop();
	await fake.close();
});

/** A boat with a job queued on it; its antifouling fits the story's weather. */
async function queued(code = 'antifoulSeason') {
	const boat = { stand: '', heading: 0, hull: 'grp', colour: 'white', ownerId: null } as const;
	const boatId = (await addBoat(database.db, manager, { ...boat, name: 'Dunlin' })) ?? '';
	const result = await queueJob(database.db, manager, boatId, code);
	if (result.outcome !== 'queued') throw new Error(result.why);
	return { boatId, jobId: result.jobId };
}
const plansOf = async (jobId: string): Promise<JobPlans> => {
	const found = await jobPlans(database.db, manager, jobId, NOW);
	if (found === null) throw new Error('no such job');
	return found;
};
const startsOf = (plan: JobPlans['offers']['soonest']) =>
	plan?.steps.map(({ start }) => start) ?? [];

describe('the plans of a job', () => {
	test('are offered with the chance of each, and none is in force before one is taken', async () => {
		const { jobId } = await queued();
		const found = await plansOf(jobId);
		expect(found).toMatchObject({ trouble: null, taken: null, forecast: { members: 7 } });
		expect(found.stepIds).toHaveLength(4);
		const { soonest, surest, byDate } = found.offers;
		expect(soonest?.steps.map(({ step }) => step)).toEqual([0, 1, 2, 3]);
		expect(surest?.holdChance).toBeGreaterThanOrEqual(0);
		// The boat has no launch date.
		expect(byDate).toBeNull();
		for (const start of startsOf(soonest))
			expect(Date.parse(start)).toBeGreaterThanOrEqual(NOW.getTime() - 1000);
	});

	test('keep a launch date, a start fixed by hand, and what is done', async () => {
		const { boatId, jobId } = await queued();
		const first = await plansOf(jobId);
		const lastFinish = first.offers.soonest?.steps.at(-1)?.finish ?? '';
		const launchBy = new Date(Date.parse(lastFinish) + 3 * 86_400_000).toISOString().slice(0, 10);
		await database.db.update(boats).set({ launchBy }).where(eq(boats.id, boatId));
		expect((await plansOf(jobId)).offers.byDate).not.toBeNull();
		const pinned = new Date(Date.parse(startsOf(first.offers.soonest)[1]) + 3_600_000);
		await database.db.update(steps).set({ pinnedAt: pinned }).where(eq(steps.id, first.stepIds[1]));
		const again = await plansOf(jobId);
		for (const plan of Object.values(again.offers))
			if (plan !== null) expect(plan.steps[1].start).toBe(pinned.toISOString());
	});

	test('keep away from a painter’s days off and hours', async () => {
		const { jobId } = await queued();
		const before = await plansOf(jobId);
		const { id: userId } = two.people.painter;
		const yardId = manager.yard.id;
		await database.db
			.insert(stepPainters)
			.values(before.stepIds.map((stepId) => ({ stepId, userId })));
		const [first] = startsOf(before.offers.soonest);
		const date = first.slice(0, 10);
		await database.db.insert(absences).values({ yardId, userId, fromDate: date, toDate: date });
		const after = startsOf((await plansOf(jobId)).offers.soonest);
		expect(after.every((start) => !start.startsWith(date))).toBe(true);
		await database.db
			.update(memberships)
			.set({ workHours: [] })
			.where(eq(memberships.userId, userId));
		expect((await plansOf(jobId)).offers.soonest).toBeNull();
		await database.db
			.update(memberships)
			.set({ workHours: null })
			.where(eq(memberships.userId, userId));
		await database.db.delete(absences);
	});

	test('begin when the job it waits for is over', async () => {
		const { boatId, jobId } = await queued();
		const second = await queueJob(database.db, manager, boatId, 'antifoulSeason');
		if (second.outcome !== 'queued') throw new Error(second.why);
		await database.db.insert(jobWaits).values({ jobId: second.jobId, afterId: jobId });
		const end = (await plansOf(jobId)).offers.soonest?.steps.at(-1)?.finish;
		const waiting = await plansOf(second.jobId);
		expect(waiting.from).toBe(end);
		const [start] = startsOf(waiting.offers.soonest);
		if (start !== undefined) expect(start >= (end ?? '')).toBe(true);
	});

	test('a job that cannot be judged says why', async () => {
		const { jobId } = await queued();
		const [{ id }] = (await jobView(database.db, manager, jobId))?.steps ?? [];
		await database.pool.query('delete from step_faces where step_id = $1', [id]);
		expect((await plansOf(jobId)).trouble).toContain('is on no face');
		const strange = await queued();
		await database.db.update(steps).set({ state: 'dropped' }).where(eq(steps.jobId, strange.jobId));
		expect((await plansOf(strange.jobId)).trouble).toContain('no step in this job');
	});
});

describe('taking a plan', () => {
	test('puts it in force as it was shown, and its painter accepts or declines it', async () => {
		const { jobId } = await queued();
		const { offers, stepIds } = await plansOf(jobId);
		const { id: userId } = two.people.painter;
		await database.db.insert(stepPainters).values({ stepId: stepIds[1], userId });
		const starts = startsOf((await plansOf(jobId)).offers.soonest);
		const take = { aim: 'soonest', starts } as const;
		expect(await takePlan(database.db, manager, jobId, take, NOW)).toMatchObject({
			outcome: 'done'
		});
		const { taken } = await plansOf(jobId);
		expect(taken).toMatchObject({
			aim: 'soonest',
			takenBy: { id: manager.user.id },
			outdated: false,
			members: offers.soonest?.holdChance === null ? null : 7
		});
		expect(taken?.steps.map(({ start }) => Date.parse(start))).toEqual(starts.map(Date.parse));
		expect(taken?.steps.every(({ broken }) => broken === null)).toBe(true);
		expect(taken?.steps[1].painters).toMatchObject([{ id: userId, answer: null }]);

		const say = (who: Membership, answer: 'accepted' | 'declined', reason?: string) =>
			answerPlan(
				database.db,
				who,
				jobId,
				{ stepId: stepIds[1], answer, ...(reason === undefined ? {} : { reason }) },
				NOW
			);
		expect(await say(manager, 'accepted')).toMatchObject({ outcome: 'refused' });
		// Sees no boat that is not theirs, named or not.
		expect(await say(painter, 'declined')).toEqual({ outcome: 'gone' });
		await database.pool.query(
			`insert into boat_painters (boat_id, user_id) select boat_id, $1 from jobs where id = $2`,
			[userId, jobId]
		);
		expect(await say(painter, 'declined', 'The dentist')).toEqual({ outcome: 'done' });
		expect((await plansOf(jobId)).taken?.steps[1].painters).toMatchObject([
			{ answer: 'declined', reason: 'The dentist' }
		]);
		expect(await say(painter, 'accepted')).toEqual({ outcome: 'done' });
	});

	test('lays the abrading that it puts in into the queue, before the coat whose window was missed', async () => {
		const { jobId } = await queued('barrierCoat');
		const view = async () => (await jobView(database.db, manager, jobId))?.steps ?? [];
		const ago = (hours: number) => new Date(NOW.getTime() - hours * 3_600_000);
		for (const [i, { id }] of (await view()).entries()) {
			const done = { state: 'done', startedAt: ago(722 - i), finishedAt: ago(721 - i) } as const;
			await database.db
				.update(steps)
				.set(i < 3 ? done : { state: i === 3 ? 'queued' : 'dropped' })
				.where(eq(steps.id, id));
		}
		const { soonest } = (await plansOf(jobId)).offers;
		expect(soonest?.inserted).toBe(1);
		const take = { aim: 'soonest', starts: startsOf(soonest) } as const;
		expect((await takePlan(database.db, manager, jobId, take, NOW)).outcome).toBe('done');
		const [, , coat, abrade, next] = await view();
		expect(abrade).toMatchObject({ kind: 'abrade', task: 'drySanding', faces: next.faces });
		expect([coat.name, next.name]).toEqual(['barrier coat 1', 'barrier coat 2']);
		const { taken } = await plansOf(jobId);
		expect(taken?.outdated).toBe(false);
		expect(taken?.steps.map(({ stepId }) => stepId)).toContain(abrade.id);
	});

	test('refuses what was not shown so, and one plan at a time is in force', async () => {
		const { jobId } = await queued();
		const starts = startsOf((await plansOf(jobId)).offers.surest);
		const moved = [...starts.slice(0, -1), '2030-01-01T00:00:00Z'];
		const take = (asked: string[]) =>
			takePlan(database.db, manager, jobId, { aim: 'surest', starts: asked }, NOW);
		expect(await take(moved)).toMatchObject({ outcome: 'refused' });
		expect((await take(starts)).outcome).toBe('done');
		expect((await take(starts)).outcome).toBe('done');
		const rows = await database.db.select().from(plans).where(eq(plans.jobId, jobId));
		expect(rows.filter(({ endedAt }) => endedAt === null)).toHaveLength(1);
		expect(rows).toHaveLength(2);
		expect(await letGo(database.db, manager, jobId, NOW)).toBe(true);
		expect(await letGo(database.db, manager, jobId, NOW)).toBe(false);
		expect((await plansOf(jobId)).taken).toBeNull();
	});

	test('a plan of another queue is called outdated, and one the weather broke says why', async () => {
		const { jobId } = await queued();
		const found = await plansOf(jobId);
		const starts = startsOf(found.offers.soonest);
		await takePlan(database.db, manager, jobId, { aim: 'soonest', starts }, NOW);
		// The yard shuts on every day: no hour of the plan is workable.
		const membership = { ...manager, yard: { ...manager.yard, workHours: [] } };
		const shut = await jobPlans(database.db, membership, jobId, NOW);
		expect(shut?.taken?.steps[0].broken).toBe('hours');
		await database.db.update(steps).set({ position: 9 }).where(eq(steps.id, found.stepIds[0]));
		expect((await plansOf(jobId)).taken).toMatchObject({ outdated: true });
	});
});

test('a yard without a forecast is told that nothing can be planned yet', async () => {
	const { other } = two;
	const stranger = await requireMembership(database.db, { user: other.manager }, other.slug);
	const [step] = await database.db.select().from(steps).where(eq(steps.id, other.step));
	const found = await jobPlans(database.db, stranger, step.jobId, NOW);
	expect(found?.trouble).toContain('no forecast');
	expect((await database.db.select().from(yards)).length).toBeGreaterThan(1);
});
