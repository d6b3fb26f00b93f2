import { asc, eq, inArray, ne, and } from 'drizzle-orm';
import type { z } from 'zod';
import type { JobEdit, orderSchema } from '../../api/jobs';
import type { Membership } from '../access/roles';
import { changeRow } from '../db/changeRow';
import type { Database } from '../db/client';
import { boats, jobs, jobWaits, steps } from '../db/schema';
import type { Writer } from '../mail/outbox';
import { visibleJob } from './jobView';
import { refused, type Outcome } from './outcome';

export type Order = z.infer<typeof orderSchema>;

/** Holds a boat's queue still until the transaction ends, for what must be true of all of it. */
export async function lockQueue(db: Writer, boatId: string): Promise<void> {
	await db.select({ id: boats.id }).from(boats).where(eq(boats.id, boatId)).for('update');
}

/** Whether one of these jobs waits for a job, by whatever way. */
async function reach(db: Writer, from: readonly string[], jobId: string): Promise<boolean> {
	const seen = new Set<string>();
	let next = [...from];
	while (next.length > 0) {
		if (next.includes(jobId)) return true;
		for (const id of next) seen.add(id);
		const rows = await db
			.select({ id: jobWaits.afterId })
			.from(jobWaits)
			.where(inArray(jobWaits.jobId, next));
		next = rows.map(({ id }) => id).filter((id) => !seen.has(id));
	}
	return false;
}

/** Renames a job and says which jobs of its boat come before it. */
export function changeJob(
	db: Database,
	membership: Membership,
	id: string,
	{ revision, name, waitsFor }: JobEdit
): Promise<Outcome> {
	return db.transaction(async (tx): Promise<Outcome> => {
		const found = await visibleJob(tx, membership, id);
		if (found === null) return { outcome: 'gone' };
		await lockQueue(tx, found.boat.id);
		const after = [...new Set(waitsFor)];
		const beside = await tx
			.select({ id: jobs.id })
			.from(jobs)
			.where(and(eq(jobs.boatId, found.boat.id), ne(jobs.id, id)));
		if (after.some((other) => !beside.some((job) => job.id === other)))
			return refused('A job waits for other jobs of its own boat only.', 'waitsFor');
		if (await reach(tx, after, id))
			return refused('Two jobs would wait for each other: one of them has to begin.', 'waitsFor');
		const changed = await changeRow(tx, jobs, id, revision, { name });
		if (changed.outcome !== 'changed') return changed;
		await tx.delete(jobWaits).where(eq(jobWaits.jobId, id));
		if (after.length > 0)
			await tx.insert(jobWaits).values(after.map((afterId) => ({ jobId: id, afterId })));
		return { outcome: 'done' };
	});
}

const sameSet = (a: readonly string[], b: readonly string[]): boolean =>
	a.length === b.length && new Set([...a, ...b]).size === a.length;

/** Puts a job's steps in another order. What has begun, or was dropped, stays where it is. */
export function orderSteps(
	db: Database,
	membership: Membership,
	jobId: string,
	{ revision, order }: Order
): Promise<Outcome> {
	return db.transaction(async (tx): Promise<Outcome> => {
		const found = await visibleJob(tx, membership, jobId);
		if (found === null) return { outcome: 'gone' };
		await lockQueue(tx, found.boat.id);
		const rows = await tx
			.select({ id: steps.id, name: steps.name, state: steps.state })
			.from(steps)
			.where(eq(steps.jobId, jobId))
			.orderBy(asc(steps.position));
		if (
			!sameSet(
				rows.map(({ id }) => id),
				order
			)
		)
			return refused('The order has to name every step of the job once.');
		const moved = rows.find(({ id, state }, i) => state !== 'queued' && order[i] !== id);
		if (moved !== undefined)
			return refused(`“${moved.name}” has begun or was dropped: it stays in its place.`);
		// The order belongs to the job: its revision guards it, and no step's own changes.
		const changed = await changeRow(tx, jobs, jobId, revision, { name: found.job.name });
		if (changed.outcome !== 'changed') return changed;
		for (const [position, id] of order.entries())
			if (rows[position].id !== id)
				await tx.update(steps).set({ position }).where(eq(steps.id, id));
		return { outcome: 'done' };
	});
}

/** Puts a boat's jobs in another order; `revision` is the boat's. The boat is one they may see. */
export function orderJobs(
	db: Database,
	boatId: string,
	{ revision, order }: Order
): Promise<Outcome> {
	return db.transaction(async (tx): Promise<Outcome> => {
		await lockQueue(tx, boatId);
		const rows = await tx
			.select({ id: jobs.id })
			.from(jobs)
			.where(eq(jobs.boatId, boatId))
			.orderBy(asc(jobs.position));
		if (
			!sameSet(
				rows.map(({ id }) => id),
				order
			)
		)
			return refused('The order has to name every job of the boat once.');
		const [{ name }] = await tx
			.select({ name: boats.name })
			.from(boats)
			.where(eq(boats.id, boatId));
		const changed = await changeRow(tx, boats, boatId, revision, { name });
		if (changed.outcome !== 'changed') return changed;
		for (const [position, id] of order.entries())
			if (rows[position].id !== id) await tx.update(jobs).set({ position }).where(eq(jobs.id, id));
		return { outcome: 'done' };
	});
}
