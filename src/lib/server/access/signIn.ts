import { createHash } from 'node:crypto';
import { eq, inArray, sql } from 'drizzle-orm';
import { z } from 'zod';
import { onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import { signInAttempts, users } from '../db/schema';
import { verifyPassword } from './passwords';

export const signInSchema = z.object({
	email: z.string().trim().toLowerCase().min(1).max(320),
	password: z.string().min(1).max(1000)
});

/** Failures allowed in a window, by e-mail and by address, before sign-in pauses. */
const MOST_BY_EMAIL = 8;
const MOST_BY_ADDRESS = 40;
const WINDOW_MINUTES = 15;

export type SignInResult =
	| { outcome: 'signedIn'; userId: string }
	/** One answer for a wrong e-mail and a wrong passphrase. */
	| { outcome: 'refused' }
	| { outcome: 'paused'; minutes: number };

const keyOf = (kind: 'email' | 'address', value: string): string =>
	`${kind}:${createHash('sha256').update(value).digest('hex')}`;

async function failuresOf(db: Database, keys: string[]): Promise<Map<string, number>> {
	const rows = await db
		.select({ key: signInAttempts.key, failures: signInAttempts.failures })
		.from(signInAttempts)
		.where(
			sql`${inArray(signInAttempts.key, keys)} and ${signInAttempts.windowStartedAt} > now() - make_interval(mins => ${WINDOW_MINUTES})`
		);
	return new Map(rows.map(({ key, failures }) => [key, failures]));
}

async function countFailure(db: Database, key: string): Promise<void> {
	const fresh = sql`${signInAttempts.windowStartedAt} > now() - make_interval(mins => ${WINDOW_MINUTES})`;
	await db
		.insert(signInAttempts)
		.values({ key, failures: 1 })
		.onConflictDoUpdate({
			target: signInAttempts.key,
			set: {
				failures: sql`case when ${fresh} then ${signInAttempts.failures} + 1 else 1 end`,
				windowStartedAt: sql`case when ${fresh} then ${signInAttempts.windowStartedAt} else now() end`
			}
		});
}

/**
 * Checks an e-mail and passphrase. Too many failures of one e-mail or one address pause it, whether
 * the e-mail exists or not, and a right passphrase within the pause is not looked at.
 *
 * @param address - the network address the attempt comes from
 */
export function signIn(
	db: Database,
	given: z.infer<typeof signInSchema>,
	address: string
): Promise<SignInResult> {
	return onDuty('accounts', () => check(db, given, address));
}

async function check(
	db: Database,
	{ email, password }: z.infer<typeof signInSchema>,
	address: string
): Promise<SignInResult> {
	const byEmail = keyOf('email', email);
	const byAddress = keyOf('address', address);
	const failures = await failuresOf(db, [byEmail, byAddress]);
	if (
		(failures.get(byEmail) ?? 0) >= MOST_BY_EMAIL ||
		(failures.get(byAddress) ?? 0) >= MOST_BY_ADDRESS
	)
		return { outcome: 'paused', minutes: WINDOW_MINUTES };
	const [user] = await db
		.select({ id: users.id, passwordHash: users.passwordHash })
		.from(users)
		.where(sql`lower(${users.email}) = ${email}`);
	const matches = await verifyPassword(user?.passwordHash ?? null, password);
	if (user === undefined || !matches) {
		await Promise.all([countFailure(db, byEmail), countFailure(db, byAddress)]);
		return { outcome: 'refused' };
	}
	await db.delete(signInAttempts).where(eq(signInAttempts.key, byEmail));
	return { outcome: 'signedIn', userId: user.id };
}
