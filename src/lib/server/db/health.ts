import { max, sql } from 'drizzle-orm';
import { z } from 'zod';
import { onDuty } from './behalf';
import type { Database } from './client';
import { providerStates, workers } from './schema';
import { UnwalledError } from './walledPool';

/** Whether the database answers. */
export async function databaseAnswers(db: Database): Promise<boolean> {
	try {
		await db.execute(sql`select 1`);
		return true;
	} catch {
		return false;
	}
}

/**
 * Stops a process at its start where its role passes the walls. A database that does not answer
 * yet is no reason to stop: each connection is asked again.
 *
 * @throws {UnwalledError}
 */
export async function refuseUnwalled(db: Database): Promise<void> {
	try {
		await db.execute(sql`select 1`);
	} catch (error) {
		const cause = error instanceof Error ? error.cause : null;
		if (cause instanceof UnwalledError) throw cause;
	}
}

/** How the forecast providers have answered over all yards, newest success first. */
export function providerHealth(db: Database) {
	return onDuty('health', () =>
		db
			.select({
				provider: providerStates.provider,
				lastSuccessAt: max(providerStates.lastSuccessAt),
				openUntil: max(providerStates.openUntil)
			})
			.from(providerStates)
			.groupBy(providerStates.provider)
			.orderBy(providerStates.provider)
	);
}

const queueRow = z.object({ waiting: z.coerce.number(), failed: z.coerce.number() });

/** Jobs waiting and jobs given up. */
export async function queueHealth(db: Database) {
	const { rows } = await db.execute(
		sql`select count(*) filter (where attempts < max_attempts) as waiting,
			count(*) filter (where attempts >= max_attempts) as failed from graphile_worker.jobs`
	);
	return queueRow.parse(rows[0]);
}

/** When any worker was last seen. */
export async function workerSeenAt(db: Database): Promise<Date | null> {
	const [row] = await db.select({ at: max(workers.seenAt) }).from(workers);
	return row?.at ?? null;
}

/** Notes that a worker lives, and forgets those that have not been seen for a day. */
export async function noteWorker(db: Database, id: string, now: Date): Promise<void> {
	await db
		.insert(workers)
		.values({ id, seenAt: now })
		.onConflictDoUpdate({ target: workers.id, set: { seenAt: now } });
	await db.delete(workers).where(sql`${workers.seenAt} < now() - interval '1 day'`);
}
