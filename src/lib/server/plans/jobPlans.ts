import { eq } from 'drizzle-orm';
import type { JobPlans } from '../../api/plans';
import { instantText, jobOutlook, type JobOutlook } from '../../engine';
import type { Membership } from '../access/roles';
import type { Database } from '../db/client';
import type { QueuedStep } from '../db/queue';
import { jobs, jobWaits } from '../db/schema';
import { visibleJob } from '../jobs/jobView';
import { tellPlan, tellWarning } from '../outlook/statelessPlans';
import { engineJob, launchDateOf, planGround, plannedRows, type PlanGround } from './engineJob';
import { planInForce, takenView } from './takenPlan';

/** A job judged in the forecast at hand, and what its offers rest on. */
export interface JudgedJob {
	readonly rows: readonly QueuedStep[];
	readonly ground: PlanGround;
	/** UTC epoch seconds; no start before it. */
	readonly from: number;
	readonly outlook: JobOutlook;
}

const seconds = (date: Date): number => Math.floor(date.getTime() / 1000);

/** When a job is over that another waits for, UTC epoch seconds; null where nobody can say. */
async function endOf(
	db: Database,
	ground: PlanGround,
	jobId: string,
	now: Date
): Promise<number | null> {
	const rows = await plannedRows(db, jobId);
	const ends = rows.map(({ step }) => step.finishedAt);
	if (ends.every((end) => end !== null)) return Math.max(0, ...ends.map(seconds));
	const taken = await planInForce(db, jobId);
	const planned = taken?.steps.at(-1)?.finishAt;
	if (planned !== undefined) return seconds(planned);
	const judged = await judgeRows(db, ground, jobId, rows, now);
	if (typeof judged === 'string') return null;
	return judged.outlook.plans.soonest?.steps.at(-1)?.finish ?? null;
}

/** A job judged; a sentence where it cannot be. */
async function judgeRows(
	db: Database,
	ground: PlanGround,
	jobId: string,
	rows: readonly QueuedStep[],
	now: Date
): Promise<JudgedJob | string> {
	const bare = rows.find(({ faces }) => faces.length === 0);
	if (bare !== undefined) return `“${bare.step.name}” is on no face: nothing says what it meets.`;
	if (rows.length === 0) return 'There is no step in this job yet.';
	const before = await db
		.select({ id: jobs.id, name: jobs.name })
		.from(jobWaits)
		.innerJoin(jobs, eq(jobs.id, jobWaits.afterId))
		.where(eq(jobWaits.jobId, jobId));
	let from = seconds(now);
	for (const { id, name } of before) {
		const end = await endOf(db, ground, id, now);
		if (end === null) return `It waits for “${name}”, for which no plan fits the forecast.`;
		from = Math.max(from, end);
	}
	const job = engineJob(rows, ground.yard, await launchDateOf(db, jobId), now);
	return { rows, ground, from, outlook: jobOutlook(ground.weather, job, { from }) };
}

/** A job of a yard judged as of `now`; a sentence where it cannot be. */
export async function judgeJob(
	db: Database,
	{ yard }: Membership,
	jobId: string,
	now: Date
): Promise<JudgedJob | string> {
	const ground = await planGround(db, yard, now);
	if (ground === null) return 'There is no forecast yet to plan in.';
	return judgeRows(db, ground, jobId, await plannedRows(db, jobId), now);
}

const NO_OFFERS = { soonest: null, surest: null, byDate: null };

/** The plans of a job; null where it is not theirs to see. */
export async function jobPlans(
	db: Database,
	membership: Membership,
	jobId: string,
	now: Date
): Promise<JobPlans | null> {
	if ((await visibleJob(db, membership, jobId)) === null) return null;
	const [judged, taken] = await Promise.all([
		judgeJob(db, membership, jobId, now),
		planInForce(db, jobId)
	]);
	if (typeof judged === 'string')
		return {
			taken: taken === null ? null : takenView(taken, null),
			forecast: null,
			from: null,
			stepIds: [],
			offers: NO_OFFERS,
			warnings: [],
			trouble: judged
		};
	const { rows, ground, from, outlook } = judged;
	const { soonest, surest, byDate } = outlook.plans;
	const { issuedAt } = ground.current.source;
	return {
		taken: taken === null ? null : takenView(taken, judged),
		forecast: {
			runId: ground.current.runId,
			issuedAt,
			members: ground.weather.members.length
		},
		from: instantText(from),
		stepIds: rows.map(({ step }) => step.id),
		offers: { soonest: tellPlan(soonest), surest: tellPlan(surest), byDate: tellPlan(byDate) },
		warnings: outlook.warnings.map(tellWarning),
		trouble: null
	};
}
