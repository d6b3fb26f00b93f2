import { and, eq, inArray, max } from 'drizzle-orm';
import type { StepEdit } from '../../api/jobs';
import { mayDo, type Membership } from '../access/roles';
import { changeRow } from '../db/changeRow';
import type { Database } from '../db/client';
import {
	boatPainters,
	boats,
	faces,
	memberships,
	sheets,
	stepFaces,
	stepPainters,
	steps,
	users,
	type StepRow
} from '../db/schema';
import type { Writer } from '../mail/outbox';
import { lockQueue } from './jobEdit';
import { visibleJob } from './jobView';
import { refused, type Outcome } from './outcome';
import { isYardOnly } from './stepState';

/** Why what is said of a step cannot be, by field; null where it can. */
async function trouble(
	db: Writer,
	membership: Membership,
	boatId: string,
	edit: StepEdit,
	before: StepRow | null
) {
	const { yard, role } = membership;
	const isYardWork = isYardOnly(edit.task) || (before !== null && isYardOnly(before.task));
	if (isYardWork && !mayDo(role, 'yardWork'))
		return refused('Shifting the pads is work of the yard: its manager queues it.', 'task');
	if (before !== null && before.state !== 'queued' && edit.sheetId !== before.sheetId)
		return refused('What has begun keeps the sheet it was begun with.', 'sheetId');
	const ofBoat = await db
		.select({ id: faces.id })
		.from(faces)
		.where(and(eq(faces.boatId, boatId), inArray(faces.id, edit.faceIds)));
	if (ofBoat.length !== new Set(edit.faceIds).size)
		return refused('Choose faces of this boat.', 'faceIds');
	if (edit.sheetId !== null) {
		const [sheet] = await db
			.select({ id: sheets.id })
			.from(sheets)
			.where(and(eq(sheets.id, edit.sheetId), eq(sheets.yardId, yard.id)));
		if (sheet === undefined) return refused('Choose a sheet of this yard.', 'sheetId');
	}
	const known = new Set((await workersOf(db, membership, boatId)).map(({ id }) => id));
	if (edit.painterIds.some((id) => !known.has(id)))
		return refused('Choose people who may work on this boat.', 'painterIds');
	return null;
}

/**
 * Who may be put to work on a boat: its owner, its painters, the managers; a manager puts any
 * painter of the yard to it.
 */
export async function workersOf(db: Writer, { yard, role }: Membership, boatId: string) {
	const [boat] = await db
		.select({ ownerId: boats.ownerId })
		.from(boats)
		.where(eq(boats.id, boatId));
	const painters = await db
		.select({ id: boatPainters.userId })
		.from(boatPainters)
		.where(eq(boatPainters.boatId, boatId));
	const members = await db
		.select({ id: users.id, name: users.name, role: memberships.role })
		.from(memberships)
		.innerJoin(users, eq(users.id, memberships.userId))
		.where(eq(memberships.yardId, yard.id))
		.orderBy(users.name);
	return members.filter(
		(member) =>
			member.role === 'manager' ||
			member.id === boat?.ownerId ||
			(member.role === 'painter' &&
				(role === 'manager' || painters.some(({ id }) => id === member.id)))
	);
}

/** What hangs on a step: its faces, and who works on it, who then sees the boat. */
async function hang(
	db: Writer,
	{ stepId, boatId, yardId }: { stepId: string; boatId: string; yardId: string },
	edit: StepEdit
): Promise<void> {
	await db.delete(stepFaces).where(eq(stepFaces.stepId, stepId));
	await db
		.insert(stepFaces)
		.values([...new Set(edit.faceIds)].map((faceId) => ({ stepId, faceId })));
	await db.delete(stepPainters).where(eq(stepPainters.stepId, stepId));
	const people = [...new Set(edit.painterIds)];
	if (people.length === 0) return;
	await db.insert(stepPainters).values(people.map((userId) => ({ stepId, userId })));
	const painters = await db
		.select({ userId: memberships.userId })
		.from(memberships)
		.where(
			and(
				eq(memberships.yardId, yardId),
				eq(memberships.role, 'painter'),
				inArray(memberships.userId, people)
			)
		);
	if (painters.length === 0) return;
	await db
		.insert(boatPainters)
		.values(painters.map(({ userId }) => ({ boatId, userId })))
		.onConflictDoNothing();
}

const columnsOf = (edit: StepEdit) => ({
	name: edit.name,
	kind: edit.kind,
	method: edit.method,
	durationMinutes: edit.hours * 60,
	sheetId: edit.sheetId,
	task: edit.sheetId === null ? edit.task : null,
	shelter: edit.shelter,
	pinnedAt: edit.pinnedAt === null ? null : new Date(edit.pinnedAt)
});

/** Puts a step at the end of a job. */
export function addStep(
	db: Database,
	membership: Membership,
	jobId: string,
	edit: StepEdit
): Promise<Outcome<{ readonly id: string }>> {
	return db.transaction(async (tx): Promise<Outcome<{ readonly id: string }>> => {
		const found = await visibleJob(tx, membership, jobId);
		if (found === null) return { outcome: 'gone' };
		await lockQueue(tx, found.boat.id);
		const refusal = await trouble(tx, membership, found.boat.id, edit, null);
		if (refusal !== null) return refusal;
		const [{ last }] = await tx
			.select({ last: max(steps.position) })
			.from(steps)
			.where(eq(steps.jobId, jobId));
		const [{ id }] = await tx
			.insert(steps)
			.values({ jobId, position: (last ?? -1) + 1, ...columnsOf(edit) })
			.returning({ id: steps.id });
		await hang(tx, { stepId: id, boatId: found.boat.id, yardId: found.job.yardId }, edit);
		return { outcome: 'done', id };
	});
}

/** Changes what is said of a step. Its own limits, where it has any, stay. */
export function changeStep(
	db: Database,
	membership: Membership,
	stepId: string,
	revision: number,
	edit: StepEdit
): Promise<Outcome> {
	return db.transaction(async (tx): Promise<Outcome> => {
		const [before] = await tx.select().from(steps).where(eq(steps.id, stepId));
		const found = before === undefined ? null : await visibleJob(tx, membership, before.jobId);
		if (found === null) return { outcome: 'gone' };
		const refusal = await trouble(tx, membership, found.boat.id, edit, before);
		if (refusal !== null) return refusal;
		const changed = await changeRow(tx, steps, stepId, revision, {
			...columnsOf(edit),
			updatedAt: new Date()
		});
		if (changed.outcome !== 'changed') return changed;
		await hang(tx, { stepId, boatId: found.boat.id, yardId: found.job.yardId }, edit);
		return { outcome: 'done' };
	});
}
