import { eq, sql } from 'drizzle-orm';
import { inAccounts } from '../db/accountsWork';
import type { Database } from '../db/client';
import { accessTokens, accountLinks, users } from '../db/schema';
import { resetLetter } from '../mail/letters';
import { post, type Writer } from '../mail/outbox';
import { createLink, followLink } from './links';
import { hashPassword, verifyPassword } from './passwords';
import type { Sessions } from './sessions';
import { forgetTries, takeTry, type TryLimit } from './tries';

const LINK_HOURS = 2;

/**
 * Takes the wish for a new passphrase. A worker looks whether the address has an account: the web
 * process cannot say, not even by how long it takes.
 */
export async function requestReset(db: Database, email: string): Promise<void> {
	const payload = JSON.stringify({ email });
	await db.execute(sql`select app_ask_worker('mailReset', ${payload}::json, ${`reset ${email}`})`);
}

/** Mails a link for a new passphrase, where the address has an account. */
export async function askToReset(db: Database, email: string, origin: string): Promise<void> {
	await inAccounts(db, async (tx) => {
		const [user] = await tx
			.select({ id: users.id, email: users.email })
			.from(users)
			.where(sql`lower(${users.email}) = ${email}`);
		if (user === undefined) return;
		const token = await createLink(tx, {
			kind: 'resetPassphrase',
			userId: user.id,
			hours: LINK_HOURS
		});
		await post(tx, resetLetter(user.email, `${origin}/reset/${token}`));
	});
}

/**
 * Sets a new passphrase by a mailed link and ends what others may have opened: every session, every
 * token, every other link of the person.
 *
 * @returns the person, or null where the link is over
 */
export async function resetPassphrase(
	db: Database,
	sessions: Sessions,
	token: string,
	passphrase: string
): Promise<string | null> {
	const passwordHash = await hashPassword(passphrase);
	const userId = await inAccounts(db, async (tx) => {
		const link = await followLink(tx, token, 'resetPassphrase');
		if (link?.userId == null) return null;
		await tx.update(users).set({ passwordHash }).where(eq(users.id, link.userId));
		await forgetOpeners(tx, link.userId);
		return link.userId;
	});
	if (userId !== null) await sessions.endAllOf(userId);
	return userId;
}

/** Other links that would set a passphrase, and tokens: made while another may have known it. */
async function forgetOpeners(db: Writer, userId: string): Promise<void> {
	await db.delete(accountLinks).where(eq(accountLinks.userId, userId));
	await db.delete(accessTokens).where(eq(accessTokens.userId, userId));
}

/** Guesses at the passphrase of a session that somebody found open. */
const GUESSES: TryLimit = { kind: 'passphrase of', most: 8, minutes: 15 };

export type ShownPassphrase =
	'right' | 'wrong' | { readonly outcome: 'paused'; readonly minutes: number };

/** Whether a signed-in person knows their passphrase, within a limit of guesses. */
export async function showPassphrase(
	db: Database,
	userId: string,
	passphrase: string
): Promise<ShownPassphrase> {
	const minutes = await takeTry(db, GUESSES, userId);
	if (minutes !== null) return { outcome: 'paused', minutes };
	const [user] = await db
		.select({ passwordHash: users.passwordHash })
		.from(users)
		.where(eq(users.id, userId));
	if (!(await verifyPassword(user?.passwordHash ?? null, passphrase))) return 'wrong';
	await forgetTries(db, GUESSES, userId);
	return 'right';
}

/** Changes a passphrase that is known, where it is the one given, and ends every session; tokens stay. */
export async function changePassphrase(
	db: Database,
	sessions: Sessions,
	userId: string,
	given: { readonly current: string; readonly next: string }
): Promise<ShownPassphrase> {
	const shown = await showPassphrase(db, userId, given.current);
	if (shown !== 'right') return shown;
	await db
		.update(users)
		.set({ passwordHash: await hashPassword(given.next) })
		.where(eq(users.id, userId));
	await sessions.endAllOf(userId);
	return 'right';
}
