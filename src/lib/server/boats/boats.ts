import { and, asc, eq, max } from 'drizzle-orm';
import { z } from 'zod';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boats, faces, memberships, stands, users, type Role } from '../db/schema';
import { COLOURS, HULLS, usualFaces, type Colour } from './hulls';

/** Boats of a yard: those a person may see, and adding one. */

const COLOUR_NAMES = Object.keys(COLOURS) as [Colour, ...Colour[]];

export const newBoatSchema = z.object({
	name: z.string().trim().min(1, 'Give the boat a name.').max(80, 'Use at most 80 characters.'),
	/** The stand's name; one that is not there yet is made. Empty: nowhere yet. */
	stand: z.string().trim().max(20, 'Use at most 20 characters.'),
	/** Where the bow points, degrees from north clockwise. */
	heading: z.number().min(0).max(360),
	hull: z.enum(HULLS),
	colour: z.enum(COLOUR_NAMES),
	/** Whose it is: an owner of the yard; null for nobody's yet. */
	ownerId: z.uuid().nullable()
});
export type NewBoat = z.infer<typeof newBoatSchema>;

/** One boat with its faces, where a member may see it; null otherwise. */
export async function boatOf(db: Database, membership: Membership, id: string) {
	const [boat] = await db
		.select({ id: boats.id, name: boats.name, heading: boats.heading, stand: stands.name })
		.from(boats)
		.leftJoin(stands, eq(stands.id, boats.standId))
		.where(and(eq(boats.id, id), visibleBoats(db, membership)));
	if (boat === undefined) return null;
	const ofBoat = await db
		.select()
		.from(faces)
		.where(eq(faces.boatId, id))
		.orderBy(asc(faces.name), asc(faces.side));
	return { ...boat, faces: ofBoat };
}

/** The people of a yard in a role, for a choice among them. */
export function peopleIn(db: Database, { yard }: Membership, role: Role) {
	return db
		.select({ id: users.id, name: users.name })
		.from(memberships)
		.innerJoin(users, eq(users.id, memberships.userId))
		.where(and(eq(memberships.yardId, yard.id), eq(memberships.role, role)))
		.orderBy(asc(users.name));
}

/** The owners of a yard, for a choice among them. */
export const ownersOf = (db: Database, membership: Membership) => peopleIn(db, membership, 'owner');

/**
 * Adds a boat with the usual faces of its build. An owner's new boat is their own, whoever is
 * named.
 *
 * @returns its id, or null where the owner named is none of the yard
 */
export function addBoat(
	db: Database,
	membership: Membership,
	{ name, stand, heading, hull, colour, ownerId }: NewBoat
): Promise<string | null> {
	const { yard, role, user } = membership;
	return db.transaction(async (tx) => {
		const owner = role === 'owner' ? user.id : ownerId;
		if (owner !== null) {
			const [member] = await tx
				.select({ role: memberships.role })
				.from(memberships)
				.where(and(eq(memberships.yardId, yard.id), eq(memberships.userId, owner)));
			if (member?.role !== 'owner') return null;
		}
		let standId: string | null = null;
		if (stand !== '') {
			const ofYard = eq(stands.yardId, yard.id);
			const [{ last }] = await tx
				.select({ last: max(stands.position) })
				.from(stands)
				.where(ofYard);
			await tx
				.insert(stands)
				.values({ yardId: yard.id, name: stand, position: (last ?? -1) + 1 })
				.onConflictDoNothing();
			const [row] = await tx
				.select({ id: stands.id })
				.from(stands)
				.where(and(ofYard, eq(stands.name, stand)));
			standId = row.id;
		}
		const [{ id }] = await tx
			.insert(boats)
			.values({ yardId: yard.id, standId, ownerId: owner, name, heading })
			.returning({ id: boats.id });
		await tx
			.insert(faces)
			.values(usualFaces(hull, colour).map((face) => ({ ...face, boatId: id })));
		return id;
	});
}
