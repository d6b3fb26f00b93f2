import { and, desc, eq, gte, inArray, lt, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { forecastRuns, PROVIDERS, providerStates } from '../db/schema';
import { prunable } from './retention';
import type { ForecastStore } from './store';

type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

/** Keeps our advisory locks apart from those of others in the same database. */
const LOCK_SPACE = 0x59474c46;

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
					sql`select pg_try_advisory_xact_lock(${LOCK_SPACE}::int, hashtext(${yard})) as locked`
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
