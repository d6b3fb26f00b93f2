import { and, asc, count, eq, gte, inArray, sql, type SQL } from 'drizzle-orm';
import type { CoatingType } from '../../engine';
import type { Database } from './client';
import {
	absences,
	boats,
	faces,
	jobs,
	memberships,
	sheets,
	stands,
	stepFaces,
	stepPainters,
	steps,
	users
} from './schema';

/** What has ended before it, in whatever zone, is over. */
const YESTERDAY = sql`current_date - 1`;

/**
 * The kind of coat that follows a step on one of its faces. Built by hand: the query builder has
 * no names for a second look at the same tables.
 */
const NEXT_COATING = sql<CoatingType | null>`(
	select sheet_after.sheet ->> 'type' from steps step_after
	join sheets sheet_after on sheet_after.id = step_after.sheet_id
	where step_after.job_id = ${steps.jobId} and step_after.position > ${steps.position}
		and step_after.state <> 'dropped'
		and exists (
			select 1 from step_faces ours join step_faces theirs on theirs.face_id = ours.face_id
			where ours.step_id = ${steps.id} and theirs.step_id = step_after.id
		)
	order by step_after.position limit 1
)`;

/** A step with all that its hours depend on. */
export type QueuedStep = Awaited<ReturnType<typeof stepRows>>[number];

/** The queued steps of some boats; `which` is a condition on `boats`, `only` the id of one step. */
export function queuedSteps(db: Database, which: SQL | undefined, only?: string) {
	return stepRows(
		db,
		and(which, eq(steps.state, 'queued'), only === undefined ? undefined : eq(steps.id, only))
	);
}

/**
 * Steps, by stand, job and order, each with its boat, sheet, faces, who works on it and when they
 * are away. Four queries whatever their number.
 *
 * @param which - condition on `boats`, `jobs` or `steps`
 */
export async function stepRows(db: Database, which: SQL | undefined) {
	const rows = await db
		.select({
			step: steps,
			job: { id: jobs.id, name: jobs.name },
			boat: { id: boats.id, name: boats.name, heading: boats.heading },
			stand: stands.name,
			lee: stands.lee,
			sheet: sheets,
			nextCoating: NEXT_COATING
		})
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.leftJoin(stands, eq(stands.id, boats.standId))
		.leftJoin(sheets, eq(sheets.id, steps.sheetId))
		.where(which)
		.orderBy(
			asc(stands.position),
			asc(boats.name),
			asc(boats.id),
			asc(jobs.position),
			asc(steps.position)
		);
	if (rows.length === 0) return [];
	const asked = db
		.select({ id: steps.id })
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.where(which);
	const [faceRows, painterRows, absenceRows] = await Promise.all([
		db
			.select({ stepId: stepFaces.stepId, of: faces })
			.from(stepFaces)
			.innerJoin(faces, eq(faces.id, stepFaces.faceId))
			.where(inArray(stepFaces.stepId, asked))
			.orderBy(asc(faces.name), asc(faces.side)),
		db
			.select({
				stepId: stepPainters.stepId,
				of: { id: users.id, name: users.name, workHours: memberships.workHours }
			})
			.from(stepPainters)
			.innerJoin(users, eq(users.id, stepPainters.userId))
			.innerJoin(
				memberships,
				and(
					eq(memberships.userId, stepPainters.userId),
					eq(memberships.yardId, stepPainters.yardId)
				)
			)
			.where(inArray(stepPainters.stepId, asked))
			.orderBy(asc(users.name)),
		db
			.select({
				stepId: stepPainters.stepId,
				of: { from: absences.fromDate, to: absences.toDate }
			})
			.from(stepPainters)
			.innerJoin(
				absences,
				and(eq(absences.userId, stepPainters.userId), eq(absences.yardId, stepPainters.yardId))
			)
			.where(and(inArray(stepPainters.stepId, asked), gte(absences.toDate, YESTERDAY)))
			.orderBy(asc(absences.fromDate))
	]);
	const facesOf = byStep(faceRows);
	const paintersOf = byStep(painterRows);
	const absencesOf = byStep(absenceRows);
	return rows.map((row) => ({
		...row,
		faces: facesOf.get(row.step.id) ?? [],
		painters: paintersOf.get(row.step.id) ?? [],
		absences: absencesOf.get(row.step.id) ?? []
	}));
}

function byStep<Of>(rows: readonly { readonly stepId: string; readonly of: Of }[]) {
	const found = new Map<string, Of[]>();
	for (const { stepId, of } of rows) {
		const before = found.get(stepId);
		if (before === undefined) found.set(stepId, [of]);
		else before.push(of);
	}
	return found;
}

/** How many queued steps some boats have. */
export async function queuedStepCount(db: Database, which: SQL | undefined): Promise<number> {
	const [row] = await db
		.select({ steps: count() })
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.where(and(which, eq(steps.state, 'queued')));
	return row.steps;
}

/** Every boat of a yard, for work that no person asks for. */
export const allBoatsOf = (yardId: string): SQL => eq(boats.yardId, yardId);
