import { sql } from 'drizzle-orm';
import { z } from 'zod';
import { onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import { users } from '../db/schema';
import { verifyPassword } from './passwords';
import { forgetTries, giveTryBack, takeTry, type TryLimit } from './tries';

export const signInSchema = z.object({
	email: z.string().trim().toLowerCase().min(1).max(320),
	password: z.string().min(1).max(1000)
});

/** Failures allowed in a window, by e-mail and by address, before sign-in pauses. */
const BY_EMAIL: TryLimit = { kind: 'email', most: 8, minutes: 15 };
const BY_ADDRESS: TryLimit = { kind: 'address', most: 40, minutes: 15 };

export type SignInResult =
	| { outcome: 'signedIn'; userId: string }
	/** One answer for a wrong e-mail and a wrong passphrase. */
	| { outcome: 'refused' }
	| { outcome: 'paused'; minutes: number };

/**
 * Checks an e-mail and passphrase. Too many failures of one e-mail or one address pause it, whether
 * the e-mail exists or not, and a right passphrase within the pause is not looked at.
 *
 * @param address - the network address the attempt comes from
 */
export async function signIn(
	db: Database,
	{ email, password }: z.infer<typeof signInSchema>,
	address: string
): Promise<SignInResult> {
	const waits = await Promise.all([takeTry(db, BY_EMAIL, email), takeTry(db, BY_ADDRESS, address)]);
	const minutes = Math.max(...waits.map((wait) => wait ?? 0));
	if (minutes > 0) return { outcome: 'paused', minutes };
	const [user] = await onDuty('accounts', () =>
		db
			.select({ id: users.id, passwordHash: users.passwordHash })
			.from(users)
			.where(sql`lower(${users.email}) = ${email}`)
	);
	const matches = await verifyPassword(user?.passwordHash ?? null, password);
	if (user === undefined || !matches) return { outcome: 'refused' };
	await Promise.all([forgetTries(db, BY_EMAIL, email), giveTryBack(db, BY_ADDRESS, address)]);
	return { outcome: 'signedIn', userId: user.id };
}
