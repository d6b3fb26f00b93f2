import { and, asc, eq, ne } from 'drizzle-orm';
import type { Move } from '../../api/yard/stands';
import { visibleBoats, type Membership } from '../access/roles';
import { changeRow } from '../db/changeRow';
import type { Database } from '../db/client';
import { boats, stands } from '../db/schema';
import { standOf, type StandResult } from './stands';

/** Boats on the ground, as far as a member may see them. */
export function boatsOnGround(db: Database, membership: Membership) {
	const { id, name, standId, heading, revision } = boats;
	return db
		.select({ id, name, standId, heading, revision })
		.from(boats)
		.leftJoin(stands, eq(stands.id, boats.standId))
		.where(visibleBoats(db, membership))
		.orderBy(asc(stands.position), asc(boats.name));
}

/** Why a boat cannot be put on a stand: it is none of the yard, or another stands there; null where it can. */
export async function standTrouble(
	db: Database,
	membership: Membership,
	boatId: string,
	standId: string
): Promise<string | null> {
	const stand = await standOf(db, membership, standId);
	if (stand === null) return 'That stand is none of this yard any more.';
	const [other] = await db
		.select({ name: boats.name })
		.from(boats)
		.where(and(eq(boats.standId, standId), ne(boats.id, boatId)));
	return other === undefined
		? null
		: `${other.name} stands on ${stand.name}: move that boat first.`;
}

/** Puts a boat on a stand, or on none, and turns it there; its stay before is kept. */
export async function moveBoat(
	db: Database,
	membership: Membership,
	boatId: string,
	{ standId, heading, revision }: Move
): Promise<StandResult> {
	const [boat] = await db
		.select({ standId: boats.standId })
		.from(boats)
		.where(and(eq(boats.id, boatId), visibleBoats(db, membership)));
	if (boat === undefined) return { outcome: 'gone' };
	if (standId !== null && standId !== boat.standId) {
		const why = await standTrouble(db, membership, boatId, standId);
		if (why !== null) return { outcome: 'refused', why };
	}
	return changeRow(db, boats, boatId, revision, { standId, heading: heading % 360 });
}
