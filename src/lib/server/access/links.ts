import { createHash, randomBytes } from 'node:crypto';
import { and, eq, gt, lt, sql } from 'drizzle-orm';
import { onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import { accountLinks, type LinkKind } from '../db/schema';
import type { Writer } from '../mail/outbox';

/** Links in mails: a token that only the mail holds, its hash in the table, followed once. */

/** What a link's address carries. */
export const newToken = (): string => randomBytes(24).toString('base64url');

export const hashOfToken = (token: string): string =>
	createHash('sha256').update(token).digest('hex');

/** Makes a link of a kind; returns the token for its address. */
export async function createLink(
	db: Writer,
	link: { kind: LinkKind; userId?: string; payload?: unknown; hours: number }
): Promise<string> {
	const token = newToken();
	await db.insert(accountLinks).values({
		tokenHash: hashOfToken(token),
		kind: link.kind,
		userId: link.userId ?? null,
		payload: link.payload ?? {},
		expiresAt: sql`now() + make_interval(hours => ${link.hours})`
	});
	return token;
}

const live = (token: string, kind: LinkKind) =>
	and(
		eq(accountLinks.tokenHash, hashOfToken(token)),
		eq(accountLinks.kind, kind),
		gt(accountLinks.expiresAt, sql`now()`)
	);

/** What a link holds, not followed yet; undefined where it is over. */
export async function linkPayload(db: Database, token: string, kind: LinkKind): Promise<unknown> {
	const [row] = await onDuty('accounts', () =>
		db.select({ payload: accountLinks.payload }).from(accountLinks).where(live(token, kind))
	);
	return row?.payload;
}

/** Whether a link can still be followed. */
export const isLive = async (db: Database, token: string, kind: LinkKind): Promise<boolean> =>
	(await linkPayload(db, token, kind)) !== undefined;

/** Follows a link: gives what it holds and takes it away, so that it works once. Null where it is over. */
export async function followLink(
	db: Writer,
	token: string,
	kind: LinkKind
): Promise<{ userId: string | null; payload: unknown } | null> {
	const [row] = await db
		.delete(accountLinks)
		.where(live(token, kind))
		.returning({ userId: accountLinks.userId, payload: accountLinks.payload });
	return row ?? null;
}

/** Forgets links that nobody followed in time. */
export async function forgetOldLinks(db: Database): Promise<void> {
	await db.delete(accountLinks).where(lt(accountLinks.expiresAt, sql`now()`));
}
