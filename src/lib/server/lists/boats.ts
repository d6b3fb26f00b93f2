import { and, asc, eq, exists, sql } from 'drizzle-orm';
import { z } from 'zod';
import { boatsQuerySchema, type BoatsQuery, type ListedBoat } from '../../api/lists/boats';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boatPainters, boats, stands, users } from '../db/schema';
import { keyOfCursor, pageOf } from '../http/list';
import type { YardList } from './list';
import { boatsLike } from './search';

const KEY = z.tuple([z.string(), z.uuid()]);

/** Steps queued on a boat, asked for the boats of a page alone. */
const QUEUED = sql<number>`(
	select count(*)::int from jobs join steps on steps.job_id = jobs.id
	where jobs.boat_id = ${boats.id} and steps.state = 'queued'
)`;

/** A page of the boats a member may see, by name. */
async function page(db: Database, membership: Membership, query: BoatsQuery) {
	const key = keyOfCursor(query.cursor, KEY);
	const rows = await db
		.select({
			id: boats.id,
			name: boats.name,
			standId: boats.standId,
			stand: stands.name,
			ownerId: boats.ownerId,
			owner: users.name,
			heading: boats.heading,
			hauledOn: boats.hauledOn,
			launchBy: boats.launchBy,
			queuedSteps: QUEUED
		})
		.from(boats)
		.leftJoin(stands, eq(stands.id, boats.standId))
		.leftJoin(users, eq(users.id, boats.ownerId))
		.where(
			and(
				visibleBoats(db, membership),
				query.owner === undefined ? undefined : eq(boats.ownerId, query.owner),
				query.stand === undefined ? undefined : eq(boats.standId, query.stand),
				query.painter === undefined
					? undefined
					: exists(
							db
								.select({ one: sql`1` })
								.from(boatPainters)
								.where(
									and(eq(boatPainters.boatId, boats.id), eq(boatPainters.userId, query.painter))
								)
						),
				await boatsLike(db, membership.yard.id, query.q),
				key === null ? undefined : sql`(${boats.name}, ${boats.id}) > (${key[0]}, ${key[1]}::uuid)`
			)
		)
		.orderBy(asc(boats.name), asc(boats.id))
		.limit(query.limit + 1);
	return pageOf(
		rows,
		query,
		({ name, id }) => [name, id],
		({ standId, stand, ownerId, owner, ...boat }): ListedBoat => ({
			...boat,
			stand: standId === null ? null : { id: standId, name: stand ?? '' },
			owner: ownerId === null || owner === null ? null : { id: ownerId, name: owner }
		})
	);
}

export const boatList: YardList<typeof boatsQuerySchema, ListedBoat> = {
	name: 'boats',
	permission: 'see',
	schema: boatsQuerySchema,
	page,
	columns: {
		boat: ({ name }) => name,
		stand: ({ stand }) => stand?.name ?? null,
		owner: ({ owner }) => owner?.name ?? null,
		'heading (degrees)': ({ heading }) => heading,
		hauled: ({ hauledOn }) => hauledOn,
		'launch by': ({ launchBy }) => launchBy,
		'steps queued': ({ queuedSteps }) => queuedSteps,
		id: ({ id }) => id
	}
};
