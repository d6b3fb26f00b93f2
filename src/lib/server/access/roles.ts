import { error } from '@sveltejs/kit';
import { and, eq, exists, sql, type SQL } from 'drizzle-orm';
import { onBehalfOf } from '../db/behalf';
import type { Database } from '../db/client';
import { boatPainters, boats, memberships, yards, type Role, type Yard } from '../db/schema';
import { ROUTE_SCOPES } from './scopes';
import type { SignedInUser } from './sessions';
import type { UsedToken } from './tokens';

/** The one place that decides who may. */

/** A person in a yard, with the role they have there. */
export interface Membership {
	readonly user: SignedInUser;
	readonly yard: Yard;
	readonly role: Role;
}

/** What can be asked for, and which roles may. The contributors' guide shows this table. */
const PERMISSIONS = {
	/** Open the yard: its hours, weather and what is theirs to see. */
	see: ['manager', 'painter', 'owner'],
	/** Ask the forecast provider now instead of at the next hour. */
	askForecast: ['manager', 'painter', 'owner'],
	/** Ask somebody to the yard; whom, says {@link mayInvite}. */
	invite: ['manager', 'owner'],
	/** Add a boat: a manager anybody's, an owner their own. */
	addBoat: ['manager', 'owner'],
	/** Queue and drop work on a boat that one may see. */
	queueWork: ['manager', 'owner', 'painter'],
	/** Queue and log what only the yard's own people do. */
	yardWork: ['manager'],
	/** Take a plan for a job of a boat one may see. */
	takePlan: ['manager', 'owner'],
	/** Say another's hours and absences; everybody says their own. */
	setTimes: ['manager'],
	/** Change the yard's settings, its ground plan, and where boats stand. */
	changeYard: ['manager'],
	/** Change or take away a boat that one may see, and its faces; not where it stands. */
	changeBoat: ['manager', 'owner'],
	/** Add photos and PDFs to a boat that one may see; whose one may delete, says {@link mayDeleteFile}. */
	addFile: ['manager', 'owner', 'painter'],
	/** See who changed what in the yard. */
	seeChanges: ['manager'],
	/** See everybody of the yard and who was asked, and take an invitation back. */
	seePeople: ['manager']
} as const satisfies Record<string, readonly Role[]>;
export type Permission = keyof typeof PERMISSIONS;

/** Whether a role may do something. */
export function mayDo(role: Role, permission: Permission): boolean {
	return PERMISSIONS[permission].some((allowed) => allowed === role);
}

/**
 * Why a role may not ask somebody to the yard as another; null where it may. A manager asks
 * anybody, an owner a painter for a boat of their own.
 */
export function mayInvite(role: Role, as: Role, forOwnBoat: boolean): string | null {
	if (!mayDo(role, 'invite')) return 'Your role in this yard does not allow that.';
	if (role === 'manager') return null;
	if (as !== 'painter') return 'An owner asks painters; the yard’s manager asks everybody else.';
	return forOwnBoat ? null : 'Say for which of your boats the painter is asked.';
}

/** Whether a member may delete a file that they may see: their own, and a manager any. */
export function mayDeleteFile(
	{ role, user }: { role: Role; user: Pick<SignedInUser, 'id'> },
	file: { readonly uploadedBy: string | null }
): boolean {
	return role === 'manager' || file.uploadedBy === user.id;
}

/**
 * Why a token may not do what a request asks, before anybody looks whether its person may; null
 * where it may. A method that says no scope takes no tokens. A yard that is not the token's is as
 * one that does not exist.
 */
export function tokenRefusal(
	{ scopes, yard }: Pick<UsedToken, 'scopes' | 'yard'>,
	asked: {
		readonly request: Pick<Request, 'method'>;
		readonly route: { readonly id: string | null };
		readonly params: Readonly<Record<string, string | undefined>>;
	}
): { readonly status: 403 | 404; readonly why: string } | null {
	const method = asked.request.method === 'HEAD' ? 'GET' : asked.request.method;
	const scope = ROUTE_SCOPES[`${method} ${asked.route.id ?? ''}`];
	if (scope === undefined) return { status: 403, why: 'This address takes no tokens.' };
	if (scope === 'open') return null;
	if (yard !== null && asked.params.slug !== yard)
		return { status: 404, why: 'There is no such yard, or you do not belong to it.' };
	if (scopes.includes(scope)) return null;
	return { status: 403, why: `The token does not hold ${scope}.` };
}

/** The signed-in person; answers 401 without one. */
export function requireUser(locals: { user: SignedInUser | null }): SignedInUser {
	if (locals.user === null) error(401, 'Sign in first.');
	return locals.user;
}

/**
 * The signed-in person's membership of a yard. A yard that does not exist and one they do not
 * belong to answer 404 alike.
 */
export async function requireMembership(
	db: Database,
	locals: { user: SignedInUser | null },
	slug: string,
	permission: Permission = 'see'
): Promise<Membership> {
	const user = requireUser(locals);
	const [found] = await db
		.select({ yard: yards, role: memberships.role })
		.from(yards)
		.innerJoin(memberships, eq(memberships.yardId, yards.id))
		.where(and(eq(yards.slug, slug), eq(memberships.userId, user.id)));
	if (found === undefined) error(404, 'There is no such yard, or you do not belong to it.');
	if (!mayDo(found.role, permission)) error(403, 'Your role in this yard does not allow that.');
	return { user, yard: found.yard, role: found.role };
}

/** The condition on `boats` that leaves only those a member may see. */
export function visibleBoats(
	db: Database,
	{ yard, role, user }: { yard: Pick<Yard, 'id'>; role: Role; user: Pick<SignedInUser, 'id'> }
): SQL | undefined {
	const inYard = eq(boats.yardId, yard.id);
	switch (role) {
		case 'manager':
			return inYard;
		case 'owner':
			return and(inYard, eq(boats.ownerId, user.id));
		case 'painter':
			return and(
				inYard,
				exists(
					db
						.select({ one: sql`1` })
						.from(boatPainters)
						.where(and(eq(boatPainters.boatId, boats.id), eq(boatPainters.userId, user.id)))
				)
			);
	}
}

/** The yards of a person, by name; of one who has just signed in, too. */
export function yardsOf(db: Database, userId: string) {
	return onBehalfOf(userId, () =>
		db
			.select({ id: yards.id, slug: yards.slug, name: yards.name, role: memberships.role })
			.from(memberships)
			.innerJoin(yards, eq(yards.id, memberships.yardId))
			.where(eq(memberships.userId, userId))
			.orderBy(yards.name)
	);
}
