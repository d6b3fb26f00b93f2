import { and, asc, eq, isNull } from 'drizzle-orm';
import type { TakenPlan } from '../../api/plans';
import { brokenSteps, SLOT_SECONDS, type Limiter } from '../../engine';
import type { Database } from '../db/client';
import { planAnswers, plans, planSteps, stepPainters, steps, users } from '../db/schema';
import type { Writer } from '../mail/outbox';
import type { JudgedJob } from './jobPlans';

/** The plan in force for a job, its steps in the order of the queue; null without one. */
export async function planInForce(db: Database | Writer, jobId: string) {
	const [found] = await db
		.select({ plan: plans, takenBy: { id: users.id, name: users.name } })
		.from(plans)
		.leftJoin(users, eq(users.id, plans.takenBy))
		.where(and(eq(plans.jobId, jobId), isNull(plans.endedAt)));
	if (found === undefined) return null;
	const ofPlan = await db
		.select({
			stepId: steps.id,
			name: steps.name,
			position: steps.position,
			startAt: planSteps.startAt,
			finishAt: planSteps.finishAt,
			room: planSteps.room,
			limiter: planSteps.limiter
		})
		.from(planSteps)
		.innerJoin(steps, eq(steps.id, planSteps.stepId))
		.where(eq(planSteps.planId, found.plan.id))
		.orderBy(asc(planSteps.startAt), asc(steps.position));
	const people = await db
		.select({
			stepId: stepPainters.stepId,
			id: users.id,
			name: users.name,
			answer: planAnswers.answer,
			reason: planAnswers.reason
		})
		.from(planSteps)
		.innerJoin(stepPainters, eq(stepPainters.stepId, planSteps.stepId))
		.innerJoin(users, eq(users.id, stepPainters.userId))
		.leftJoin(
			planAnswers,
			and(
				eq(planAnswers.planId, planSteps.planId),
				eq(planAnswers.stepId, planSteps.stepId),
				eq(planAnswers.userId, stepPainters.userId)
			)
		)
		.where(eq(planSteps.planId, found.plan.id))
		.orderBy(asc(users.name));
	return {
		...found,
		steps: ofPlan.map((step) => ({
			...step,
			painters: people
				.filter(({ stepId }) => stepId === step.stepId)
				.map(({ id, name, answer, reason }) => ({ id, name, answer, reason }))
		}))
	};
}
type InForce = NonNullable<Awaited<ReturnType<typeof planInForce>>>;

/** Whether a plan still says a start for each step of the queue that has none yet, in its order. */
function isOutdated({ steps: planned }: InForce, { rows }: Pick<JudgedJob, 'rows'>): boolean {
	const places = rows
		.filter(({ step }) => step.startedAt === null)
		.map(({ step }) => planned.findIndex(({ stepId }) => stepId === step.id));
	return places.some((place, i) => place < 0 || (i > 0 && place < places[i - 1]));
}

/** Why each step of a plan no longer holds, by step. */
function brokenOf(plan: InForce, { rows, ground, outlook }: JudgedJob): Map<string, Limiter> {
	const { grid } = ground.weather.weather;
	const position = (at: Date): number => (at.getTime() / 1000 - grid.start) / SLOT_SECONDS;
	const places = rows.map(({ step }) => {
		const planned = plan.steps.find(({ stepId }) => stepId === step.id);
		const start = step.startedAt ?? planned?.startAt ?? new Date(0);
		const finish = step.finishedAt ?? planned?.finishAt ?? new Date(0);
		return { start: position(start), finish: position(finish) };
	});
	return new Map(
		brokenSteps(outlook.steps, places).map(({ step, why }) => [rows[step].step.id, why])
	);
}

/** A plan as it is told, beside the job judged now; null where it cannot be judged. */
export function takenView(found: InForce, judged: JudgedJob | null): TakenPlan {
	const { plan, takenBy } = found;
	const outdated = judged !== null && isOutdated(found, judged);
	const broken = judged === null || outdated ? new Map<string, Limiter>() : brokenOf(found, judged);
	return {
		id: plan.id,
		aim: plan.aim,
		takenBy,
		takenAt: plan.takenAt.toISOString(),
		forecastIssuedAt: plan.forecastIssuedAt.toISOString(),
		heldMembers: plan.heldMembers,
		members: plan.members,
		launchAt: plan.launchAt?.toISOString() ?? null,
		slipDays: plan.slipDays,
		costOfSlip: plan.costOfSlip,
		outdated,
		steps: found.steps.map(({ stepId, name, startAt, finishAt, limiter, room, painters }) => ({
			stepId,
			name,
			start: startAt.toISOString(),
			finish: finishAt.toISOString(),
			limiter,
			room,
			painters,
			broken: broken.get(stepId) ?? null
		}))
	};
}
