import { and, eq, inArray, max, sql } from 'drizzle-orm';
import { SAMPLE_SHEETS } from '../../engine';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boats, faces, jobs, sheets, stepFaces, steps } from '../db/schema';
import { lockQueue } from './jobEdit';
import { templateOf } from './templates';

export type QueueResult =
	| { readonly outcome: 'queued'; readonly jobId: string }
	| { readonly outcome: 'refused'; readonly why: string };

/**
 * Queues a usual job on a boat, behind what is queued there: all of its steps with their faces,
 * sheets and rules, or nothing.
 */
export function queueJob(
	db: Database,
	membership: Membership,
	boatId: string,
	code: string
): Promise<QueueResult> {
	const template = templateOf(code);
	if (template === null)
		return Promise.resolve({ outcome: 'refused', why: 'There is no such usual job.' });
	return db.transaction(async (tx): Promise<QueueResult> => {
		const [boat] = await tx
			.select({ id: boats.id })
			.from(boats)
			.where(and(eq(boats.id, boatId), visibleBoats(db, membership)));
		if (boat === undefined)
			return { outcome: 'refused', why: 'There is no such boat, or it is not yours to see.' };
		const faceIds = (
			await tx
				.select({ id: faces.id })
				.from(faces)
				.where(and(eq(faces.boatId, boatId), inArray(faces.name, [...template.faces])))
		).map(({ id }) => id);
		if (faceIds.length === 0)
			return {
				outcome: 'refused',
				why: `This boat has none of the faces that ${template.name.toLowerCase()} works on.`
			};
		// The newest version of each in the yard's library, whatever it is called there.
		const library = await tx
			.select({ id: sheets.id, key: sheets.key })
			.from(sheets)
			.where(eq(sheets.yardId, membership.yard.id))
			.orderBy(sheets.version);
		const sheetIds = new Map(library.map(({ id, key }) => [key, id]));
		// A coat without its sheet would have no limits to shut it: better no job than such a one.
		const missing = template.steps.find(({ sheet }) => sheet !== undefined && !sheetIds.has(sheet));
		if (missing?.sheet !== undefined)
			return {
				outcome: 'refused',
				why: `The yard has no sheet “${SAMPLE_SHEETS[missing.sheet].name}” for ${missing.name}.`
			};
		await lockQueue(tx, boatId);
		const [{ last }] = await tx
			.select({ last: max(jobs.position) })
			.from(jobs)
			.where(eq(jobs.boatId, boatId));
		const [{ id: jobId }] = await tx
			.insert(jobs)
			.values({ boatId, name: template.name, position: (last ?? -1) + 1 })
			.returning({ id: jobs.id });
		for (const [position, step] of template.steps.entries()) {
			const [{ id: stepId }] = await tx
				.insert(steps)
				.values({
					jobId,
					position,
					name: step.name,
					kind: step.kind,
					method: step.method,
					durationMinutes: step.hours * 60,
					sheetId: step.sheet === undefined ? null : (sheetIds.get(step.sheet) ?? null),
					task: step.task ?? null
				})
				.returning({ id: steps.id });
			await tx.insert(stepFaces).values(faceIds.map((faceId) => ({ stepId, faceId })));
		}
		return { outcome: 'queued', jobId };
	});
}

/** Puts an empty job behind what is queued on a boat; its steps are added one by one. */
export function addJob(
	db: Database,
	boatId: string,
	name: string
): Promise<{ readonly outcome: 'queued'; readonly jobId: string }> {
	return db.transaction(async (tx) => {
		await lockQueue(tx, boatId);
		const [{ last }] = await tx
			.select({ last: max(jobs.position) })
			.from(jobs)
			.where(eq(jobs.boatId, boatId));
		const [{ id }] = await tx
			.insert(jobs)
			.values({ boatId, name, position: (last ?? -1) + 1 })
			.returning({ id: jobs.id });
		return { outcome: 'queued', jobId: id };
	});
}

/** The jobs of a boat with their steps, in order. */
export async function jobsOfBoat(db: Database, boatId: string) {
	return db
		.select({
			jobId: jobs.id,
			job: jobs.name,
			stepId: steps.id,
			step: steps.name,
			state: steps.state,
			hours: sql<number>`${steps.durationMinutes} / 60`,
			sheet: sheets.name
		})
		.from(steps)
		.innerJoin(jobs, eq(jobs.id, steps.jobId))
		.leftJoin(sheets, eq(sheets.id, steps.sheetId))
		.where(eq(jobs.boatId, boatId))
		.orderBy(jobs.position, steps.position);
}
