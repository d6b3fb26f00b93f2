import { error } from '@sveltejs/kit';
import { z } from 'zod';
import { mayDo, requireMembership, type Permission } from '../access/roles';
import type { SignedInUser } from '../access/sessions';
import type { Database } from '../db/client';
import { boatOf } from './boats';

/**
 * The membership and the boat of an address. A boat that one may not see and one that is not there
 * answer 404 alike.
 */
export async function requireBoat(
	db: Database,
	locals: { user: SignedInUser | null },
	slug: string,
	boatId: string,
	permission: Permission
) {
	const membership = await requireMembership(db, locals, slug);
	const id = z.uuid().safeParse(boatId);
	const boat = id.success ? await boatOf(db, membership, id.data) : null;
	if (boat === null) error(404, 'There is no such boat, or it is not yours to see.');
	// After that, so that nobody learns of a boat by what they may not do to it.
	if (!mayDo(membership.role, permission))
		error(403, 'Your role in this yard does not allow that.');
	return { membership, boat };
}
