import { and, desc, eq, gte, inArray, lt, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { forecastRuns, PROVIDERS, providerStates } from '../db/schema';
import { prunable } from './retention';
import type { ForecastStore } from './store';

export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

/** Keeps our advisory locks apart from those of others in the same database. */
const LOCK_SPACE = 0x59474c46;

/** The key of a yard's lock: held by a refresh, and by whoever moves the yard. */
const lockKey = (yard: string) => sql`${LOCK_SPACE}::int, hashtext(${yard})`;

/** A refresh takes seconds; a minute at its worst. Nobody who moves a yard waits for that. */
const MOST_WAIT = '20s';
/** SQLSTATE of a lock that did not come in time. */
const LOCK_NOT_AVAILABLE = '55P03';

/**
 * Waits, within a transaction, until no refresh of a yard is under way and keeps others off to its
 * end.
 *
 * @returns false where one takes too long; the transaction is then spent
 */
export async function holdRefreshes(tx: Transaction, yard: string): Promise<boolean> {
	await tx.execute(sql`select set_config('lock_timeout', ${MOST_WAIT}, true)`);
	try {
		await tx.execute(sql`select pg_advisory_xact_lock(${lockKey(yard)})`);
		return true;
	} catch (error) {
		const code = (error as { cause?: { code?: unknown } }).cause?.code;
		if (code === LOCK_NOT_AVAILABLE) return false;
		throw error;
	}
}

/**
 * The store on PostgreSQL. A yard's lock is an advisory lock of the transaction that also holds
 * the writes: a process that dies leaves neither lock nor half a run.
 */
export function databaseStore(db: Database | Transaction): ForecastStore {
	const { id, yardId, provider, issuedAt, fetchedAt, hourly, members, memberCount } = forecastRuns;
	const head = { id, yardId, provider, issuedAt, fetchedAt, memberCount };
	return {
		withYardLock: (yard, work) =>
			db.transaction(async (tx) => {
				const { rows } = await tx.execute<{ locked: boolean }>(
					sql`select pg_try_advisory_xact_lock(${lockKey(yard)}) as locked`
				);
				return rows[0]?.locked === true ? work(databaseStore(tx)) : null;
			}),

		states: (yard) => db.select().from(providerStates).where(eq(providerStates.yardId, yard)),

		saveState: async (state) => {
			await db
				.insert(providerStates)
				.values(state)
				.onConflictDoUpdate({
					target: [providerStates.yardId, providerStates.provider],
					set: state
				});
		},

		latestRuns: (yard) =>
			db
				.selectDistinctOn([provider], head)
				.from(forecastRuns)
				.where(eq(yardId, yard))
				.orderBy(provider, desc(fetchedAt), desc(issuedAt)),

		run: async (runId) => {
			const [run] = await db
				.select({ ...head, hourly })
				.from(forecastRuns)
				.where(eq(id, runId));
			return run ?? null;
		},

		members: async (runId) => {
			const [run] = await db.select({ members }).from(forecastRuns).where(eq(id, runId));
			return run?.members ?? null;
		},

		earlierRuns: (yard, since, before, limit) =>
			db
				.select({ issuedAt, fetchedAt, hourly })
				.from(forecastRuns)
				.where(and(eq(yardId, yard), gte(issuedAt, since), lt(fetchedAt, before)))
				.orderBy(desc(fetchedAt))
				.limit(limit),

		addRun: async (run) => {
			const [added] = await db.insert(forecastRuns).values(run).returning({ id });
			if (added === undefined) throw new Error('The database returned no id for a new run.');
			return added.id;
		},

		prune: async (yard, now) => {
			const runs = await db
				.select(head)
				.from(forecastRuns)
				.where(eq(yardId, yard))
				.orderBy(desc(fetchedAt));
			const gone = PROVIDERS.flatMap((name) =>
				prunable(
					runs.filter((run) => run.provider === name),
					now
				)
			).map((run) => run.id);
			if (gone.length > 0) await db.delete(forecastRuns).where(inArray(id, gone));
		},

		forget: async (yard) => {
			await db.delete(forecastRuns).where(eq(yardId, yard));
			await db.delete(providerStates).where(eq(providerStates.yardId, yard));
		}
	};
}
