import { and, eq, gte, isNull, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { answerPlanSchema, PlanAim, takePlanSchema } from '../../api/plans';
import type { Plan } from '../../engine';
import type { Membership } from '../access/roles';
import type { Database } from '../db/client';
import { planAnswers, plans, planSteps, stepFaces, stepPainters, steps } from '../db/schema';
import { lockQueue } from '../jobs/jobEdit';
import { visibleJob } from '../jobs/jobView';
import { refused, type Outcome } from '../jobs/outcome';
import type { Writer } from '../mail/outbox';
import { judgeJob, type JudgedJob } from './jobPlans';
import { planInForce } from './takenPlan';

const dateOf = (seconds: number | null): Date | null =>
	seconds === null ? null : new Date(seconds * 1000);

/** What a plan puts in becomes a step of the queue, on the faces and with the people of the coat after it. */
async function insertAbrading(db: Writer, before: string): Promise<string> {
	const [next] = await db.select().from(steps).where(eq(steps.id, before));
	await db
		.update(steps)
		.set({ position: sql`${steps.position} + 1` })
		.where(and(eq(steps.jobId, next.jobId), gte(steps.position, next.position)));
	const [{ id }] = await db
		.insert(steps)
		.values({
			jobId: next.jobId,
			position: next.position,
			name: 'abrade',
			kind: 'abrade',
			method: 'none',
			task: 'drySanding',
			durationMinutes: next.durationMinutes,
			shelter: next.shelter
		})
		.returning({ id: steps.id });
	await db.execute(
		sql`insert into ${stepFaces} (step_id, face_id) select ${id}, face_id from step_faces where step_id = ${before}`
	);
	await db.execute(
		sql`insert into ${stepPainters} (step_id, user_id) select ${id}, user_id from step_painters where step_id = ${before}`
	);
	return id;
}

/** The id of each step of a plan, in its order; those it puts in are laid into the queue. */
async function layInserted(db: Writer, plan: Plan, { rows }: JudgedJob): Promise<string[]> {
	const ids: string[] = [];
	for (const [i, planned] of plan.steps.entries()) {
		if (planned.step !== null) {
			ids.push(rows[planned.step].step.id);
			continue;
		}
		const next = plan.steps.slice(i + 1).find(({ step }) => step !== null);
		if (next?.step == null) throw new Error('A plan abrades before a coat only.');
		ids.push(await insertAbrading(db, rows[next.step].step.id));
	}
	return ids;
}

const startsOf = ({ steps: planned }: Plan): number[] => planned.map(({ start }) => start);

/**
 * Takes a plan for a job in place of the one in force, as it was shown: where the forecast or the
 * queue has changed since, it says so instead.
 */
export async function takePlan(
	db: Database,
	membership: Membership,
	jobId: string,
	{ aim, starts }: z.infer<typeof takePlanSchema>,
	now: Date
): Promise<Outcome<{ readonly id: string }>> {
	const found = await visibleJob(db, membership, jobId);
	if (found === null) return { outcome: 'gone' };
	const judged = await judgeJob(db, membership, jobId, now);
	if (typeof judged === 'string') return refused(judged);
	const plan = judged.outlook.plans[aim];
	const shown = starts.map((start) => Math.round(Date.parse(start) / 1000));
	const planned = plan === null ? [] : startsOf(plan);
	if (plan === null || shown.length !== planned.length || shown.some((at, i) => at !== planned[i]))
		return refused(
			'The hours have changed since this was shown. Look at the plans as they are now.'
		);
	return db.transaction(async (tx) => {
		await lockQueue(tx, found.boat.id);
		const ids = await layInserted(tx, plan, judged);
		await tx
			.update(plans)
			.set({ endedAt: now, endedBy: membership.user.id })
			.where(and(eq(plans.jobId, jobId), isNull(plans.endedAt)));
		const id = await insertPlan(tx, { jobId, aim, plan, judged, takenBy: membership.user.id, now });
		await tx.insert(planSteps).values(
			plan.steps.map(({ start, finish, room, limiter }, i) => ({
				planId: id,
				stepId: ids[i],
				startAt: new Date(start * 1000),
				finishAt: new Date(finish * 1000),
				room,
				limiter
			}))
		);
		return { outcome: 'done', id };
	});
}

interface Taken {
	readonly jobId: string;
	readonly aim: PlanAim;
	readonly plan: Plan;
	readonly judged: JudgedJob;
	readonly takenBy: string;
	readonly now: Date;
}

async function insertPlan(db: Writer, { jobId, aim, plan, judged, takenBy, now }: Taken) {
	const { holdChance, launchReady, slip } = plan;
	const members = judged.ground.weather.members.length;
	const [{ id }] = await db
		.insert(plans)
		.values({
			jobId,
			aim,
			takenBy,
			takenAt: now,
			forecastIssuedAt: new Date(judged.ground.current.source.issuedAt),
			members: holdChance === null ? null : members,
			heldMembers: holdChance === null ? null : Math.round(holdChance * members),
			launchReadyAt: dateOf(launchReady.latest),
			launchReadyAssumed: launchReady.isAssumed,
			launchAt: dateOf(slip.launch),
			slipDays: slip.days,
			costOfSlip: slip.cost
		})
		.returning({ id: plans.id });
	return id;
}

/** Lets go of the plan in force; false where there is none. */
export async function letGo(
	db: Database,
	membership: Membership,
	jobId: string,
	now: Date
): Promise<boolean> {
	if ((await visibleJob(db, membership, jobId)) === null) return false;
	const ended = await db
		.update(plans)
		.set({ endedAt: now, endedBy: membership.user.id })
		.where(and(eq(plans.jobId, jobId), isNull(plans.endedAt)))
		.returning({ id: plans.id });
	return ended.length > 0;
}

/** A person who is named in a plan accepts or declines their step of it; they may change their mind. */
export function answerPlan(
	db: Database,
	membership: Membership,
	jobId: string,
	{ stepId, answer, reason }: z.infer<typeof answerPlanSchema>,
	now: Date
): Promise<Outcome> {
	return db.transaction(async (tx): Promise<Outcome> => {
		if ((await visibleJob(tx, membership, jobId)) === null) return { outcome: 'gone' };
		const taken = await planInForce(tx, jobId);
		const step = taken?.steps.find((it) => it.stepId === stepId);
		if (taken === null || step === undefined)
			return refused('That step is in no plan in force any more.');
		const userId = membership.user.id;
		if (!step.painters.some(({ id }) => id === userId))
			return refused(`You are not named for “${step.name}”.`);
		const said = { answer, reason: reason === undefined || reason === '' ? null : reason, at: now };
		await tx
			.insert(planAnswers)
			.values({ planId: taken.plan.id, stepId, userId, ...said })
			.onConflictDoUpdate({
				target: [planAnswers.planId, planAnswers.stepId, planAnswers.userId],
				set: said
			});
		return { outcome: 'done' };
	});
}
