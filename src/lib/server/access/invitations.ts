import { and, asc, eq, gt, sql } from 'drizzle-orm';
import { z } from 'zod';
import { inAccounts } from '../db/accountsWork';
import { onDuty } from '../db/behalf';
import type { Database } from '../db/client';
import {
	boatPainters,
	boats,
	invitations,
	memberships,
	ROLES,
	users,
	yards,
	type Role
} from '../db/schema';
import { invitationLetter } from '../mail/letters';
import { post, type Writer } from '../mail/outbox';
import { hashOfToken, newToken } from './links';
import { mayInvite, visibleBoats, type Membership } from './roles';

/** Asking people to a yard, and their joining it. */

const LINK_DAYS = 14;

export const invitationSchema = z.object({
	email: z.string().trim().toLowerCase().pipe(z.email('That is not an e-mail address.')),
	role: z.enum(ROLES),
	/** The boat a painter is asked to work on; must be one the inviter sees. */
	boatId: z.uuid().nullable()
});

export type InviteResult =
	{ outcome: 'invited' } | { outcome: 'notAllowed'; why: string } | { outcome: 'belongs' };

/**
 * Asks somebody to a yard by mail. An earlier invitation of the same address is taken back: one
 * link works at a time.
 */
export function invite(
	db: Database,
	membership: Membership,
	{ email, role, boatId }: z.infer<typeof invitationSchema>,
	origin: string
): Promise<InviteResult> {
	const { yard, user } = membership;
	return db.transaction(async (tx): Promise<InviteResult> => {
		const [boat] =
			boatId === null
				? []
				: await tx
						.select({ id: boats.id, name: boats.name })
						.from(boats)
						.where(and(eq(boats.id, boatId), visibleBoats(db, membership)));
		if (boatId !== null && boat === undefined)
			return { outcome: 'notAllowed', why: 'There is no such boat, or it is not yours to see.' };
		const refusal = mayInvite(membership.role, role, boat !== undefined);
		if (refusal !== null) return { outcome: 'notAllowed', why: refusal };
		const [member] = await tx
			.select({ role: memberships.role })
			.from(memberships)
			.innerJoin(users, eq(users.id, memberships.userId))
			.where(and(eq(memberships.yardId, yard.id), sql`lower(${users.email}) = ${email}`));
		// A painter who belongs already may be asked to another boat.
		if (member !== undefined && !(member.role === 'painter' && boat !== undefined))
			return { outcome: 'belongs' };
		await tx
			.delete(invitations)
			.where(and(eq(invitations.yardId, yard.id), sql`lower(${invitations.email}) = ${email}`));
		const token = newToken();
		await tx.insert(invitations).values({
			tokenHash: hashOfToken(token),
			yardId: yard.id,
			email,
			role,
			boatId: boat?.id ?? null,
			invitedBy: user.id,
			expiresAt: sql`now() + make_interval(days => ${LINK_DAYS})`
		});
		const asked = { yard: yard.name, role, by: user.name, boat: boat?.name ?? null };
		await post(tx, invitationLetter(email, asked, `${origin}/invitation/${token}`));
		return { outcome: 'invited' };
	});
}

/** What an invitation's page shows; null where it is over. `hasAccount`: sign in instead of signing up. */
export function invitationOf(db: Database, token: string) {
	return onDuty('accounts', () => findInvitation(db, token));
}

async function findInvitation(db: Database, token: string) {
	const [row] = await db
		.select({
			email: invitations.email,
			role: invitations.role,
			yard: yards.name,
			slug: yards.slug,
			by: users.name
		})
		.from(invitations)
		.innerJoin(yards, eq(yards.id, invitations.yardId))
		.innerJoin(users, eq(users.id, invitations.invitedBy))
		.where(
			and(eq(invitations.tokenHash, hashOfToken(token)), gt(invitations.expiresAt, sql`now()`))
		);
	if (row === undefined) return null;
	const known = await db
		.select({ id: users.id })
		.from(users)
		.where(sql`lower(${users.email}) = ${row.email}`);
	return { ...row, hasAccount: known.length > 0 };
}

async function join(
	tx: Writer,
	userId: string,
	{ yardId, role, boatId }: { yardId: string; role: Role; boatId: string | null }
): Promise<void> {
	await tx.insert(memberships).values({ yardId, userId, role }).onConflictDoNothing();
	if (boatId !== null && role === 'painter')
		await tx.insert(boatPainters).values({ boatId, userId }).onConflictDoNothing();
}

/** Follows an invitation: takes it away and gives it back. Null where it is over. */
async function followInvitation(tx: Writer, token: string) {
	const [row] = await tx
		.delete(invitations)
		.where(
			and(eq(invitations.tokenHash, hashOfToken(token)), gt(invitations.expiresAt, sql`now()`))
		)
		.returning();
	return row ?? null;
}

/** Joins a yard with the account one is signed in with; false where the link is over or another's. */
export function acceptInvitation(
	db: Database,
	token: string,
	user: { readonly id: string; readonly email: string }
): Promise<boolean> {
	return inAccounts(db, async (tx) => {
		const invitation = await followInvitation(tx, token);
		if (invitation === null) return false;
		if (invitation.email.toLowerCase() !== user.email.toLowerCase()) {
			// Not theirs: it stays for whom it was meant.
			await tx.insert(invitations).values(invitation);
			return false;
		}
		await join(tx, user.id, invitation);
		return true;
	});
}

/**
 * Joins a yard with a new account: the mailed link has shown that the address is theirs.
 *
 * @returns the new person, or null where the link is over or the address has an account by now
 */
export function joinWithNewAccount(
	db: Database,
	token: string,
	{ name, passwordHash }: { readonly name: string; readonly passwordHash: string }
): Promise<string | null> {
	return inAccounts(db, async (tx) => {
		const invitation = await followInvitation(tx, token);
		if (invitation === null) return null;
		const [user] = await tx
			.insert(users)
			.values({ email: invitation.email, name, passwordHash })
			.onConflictDoNothing()
			.returning({ id: users.id });
		if (user === undefined) {
			await tx.insert(invitations).values(invitation);
			return null;
		}
		await join(tx, user.id, invitation);
		return user.id;
	});
}

/** People of a yard, and who was asked and has not come yet. */
export async function peopleOf(db: Database, { yard }: Membership) {
	const [members, asked] = await Promise.all([
		db
			.select({ id: users.id, name: users.name, email: users.email, role: memberships.role })
			.from(memberships)
			.innerJoin(users, eq(users.id, memberships.userId))
			.where(eq(memberships.yardId, yard.id))
			.orderBy(asc(users.name)),
		db
			.select({
				id: invitations.id,
				email: invitations.email,
				role: invitations.role,
				expiresAt: invitations.expiresAt
			})
			.from(invitations)
			.where(and(eq(invitations.yardId, yard.id), gt(invitations.expiresAt, sql`now()`)))
			.orderBy(asc(invitations.email))
	]);
	return { members, asked };
}

/** Takes an invitation of a yard back; its link is over. */
export async function takeBackInvitation(
	db: Database,
	{ yard }: Membership,
	id: string
): Promise<void> {
	await db.delete(invitations).where(and(eq(invitations.yardId, yard.id), eq(invitations.id, id)));
}
