import { and, asc, count, eq, inArray, type SQL } from 'drizzle-orm';
import type { Database } from './client';
import { boats, faces, jobs, sheets, stands, stepFaces, steps, type FaceRow } from './schema';

/** A queued step with all that its hours depend on. */
export type QueuedStep = Awaited<ReturnType<typeof queuedSteps>>[number];

/**
 * The queued steps of some boats, by stand, job and order, each with its boat, sheet and faces.
 * Two queries whatever the number of boats.
 *
 * @param which - condition on `boats`
 * @param only - id of one step to look for
 */
export async function queuedSteps(db: Database, which: SQL | undefined, only?: string) {
	const mine = and(
		which,
		eq(steps.state, 'queued'),
		only === undefined ? undefined : eq(steps.id, only)
	);
	const rows = await db
		.select({
			step: steps,
			job: { id: jobs.id, name: jobs.name },
			boat: { id: boats.id, name: boats.name, heading: boats.heading },
			stand: stands.name,
			sheet: sheets
		})
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.leftJoin(stands, eq(stands.id, boats.standId))
		.leftJoin(sheets, eq(sheets.id, steps.sheetId))
		.where(mine)
		.orderBy(
			asc(stands.position),
			asc(boats.name),
			asc(boats.id),
			asc(jobs.position),
			asc(steps.position)
		);
	if (rows.length === 0) return [];
	const faceRows = await db
		.select({ stepId: stepFaces.stepId, face: faces })
		.from(stepFaces)
		.innerJoin(faces, eq(faces.id, stepFaces.faceId))
		.where(
			inArray(
				stepFaces.stepId,
				db
					.select({ id: steps.id })
					.from(steps)
					.innerJoin(jobs, eq(jobs.id, steps.jobId))
					.innerJoin(boats, eq(boats.id, jobs.boatId))
					.where(mine)
			)
		)
		.orderBy(asc(faces.name), asc(faces.side));
	const facesOf = new Map<string, FaceRow[]>();
	for (const { stepId, face } of faceRows) {
		const of = facesOf.get(stepId);
		if (of === undefined) facesOf.set(stepId, [face]);
		else of.push(face);
	}
	return rows.map((row) => ({ ...row, faces: facesOf.get(row.step.id) ?? [] }));
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
