import { createHash } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import { onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import { signInAttempts } from '../db/schema';

/** So many tries of one kind in a window of time, over all web processes. */
export interface TryLimit {
	/** Names what is tried, apart from other kinds. */
	readonly kind: string;
	readonly most: number;
	readonly minutes: number;
}

/** Whoever or whatever tries is kept as a hash only. */
const keyOf = ({ kind }: TryLimit, who: string): string =>
	`${kind}:${createHash('sha256').update(who).digest('hex')}`;

/**
 * Counts a try before it is made, so that many at once cannot pass a limit together.
 *
 * @returns minutes to wait where there were too many; null where it may be made
 */
export async function takeTry(db: Database, limit: TryLimit, who: string): Promise<number | null> {
	const started = signInAttempts.windowStartedAt;
	const isFresh = sql`${started} > now() - make_interval(mins => ${limit.minutes})`;
	const [row] = await onDuty('accounts', () =>
		db
			.insert(signInAttempts)
			.values({ key: keyOf(limit, who), failures: 1 })
			.onConflictDoUpdate({
				target: signInAttempts.key,
				set: {
					failures: sql`case when ${isFresh} then ${signInAttempts.failures} + 1 else 1 end`,
					windowStartedAt: sql`case when ${isFresh} then ${started} else now() end`
				}
			})
			.returning({
				tries: signInAttempts.failures,
				left: sql<number>`ceil(extract(epoch from ${started} + make_interval(mins => ${limit.minutes}) - now()) / 60)::int`
			})
	);
	return row.tries > limit.most ? Math.max(1, row.left) : null;
}

/** Takes a try back that turned out not to count. */
export async function giveTryBack(db: Database, limit: TryLimit, who: string): Promise<void> {
	await onDuty('accounts', () =>
		db
			.update(signInAttempts)
			.set({ failures: sql`greatest(0, ${signInAttempts.failures} - 1)` })
			.where(eq(signInAttempts.key, keyOf(limit, who)))
	);
}

/** Forgets the tries of somebody who has shown who they are. */
export async function forgetTries(db: Database, limit: TryLimit, who: string): Promise<void> {
	await onDuty('accounts', () =>
		db.delete(signInAttempts).where(eq(signInAttempts.key, keyOf(limit, who)))
	);
}
