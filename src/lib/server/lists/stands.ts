import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import { z } from 'zod';
import { standsQuerySchema, type ListedStand, type StandsQuery } from '../../api/lists/stands';
import { visibleBoats, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boats, stands } from '../db/schema';
import { keyOfCursor, pageOf } from '../http/list';
import type { YardList } from './list';
import { holds } from './search';

const KEY = z.tuple([z.int32(), z.uuid()]);

/** A page of the stands of a yard, in its order, with the boats on them that a member may see. */
async function page(db: Database, membership: Membership, query: StandsQuery) {
	const key = keyOfCursor(query.cursor, KEY);
	const rows = await db
		.select()
		.from(stands)
		.where(
			and(
				eq(stands.yardId, membership.yard.id),
				holds([stands.name], query.q),
				key === null
					? undefined
					: sql`(${stands.position}, ${stands.id}) > (${key[0]}, ${key[1]}::uuid)`
			)
		)
		.orderBy(asc(stands.position), asc(stands.id))
		.limit(query.limit + 1);
	const standing = await db
		.select({ id: boats.id, name: boats.name, standId: boats.standId })
		.from(boats)
		.where(
			and(
				visibleBoats(db, membership),
				inArray(
					boats.standId,
					rows.map(({ id }) => id)
				)
			)
		)
		.orderBy(asc(boats.name));
	return pageOf(
		rows,
		query,
		({ position, id }) => [position, id],
		({ id, name, x, y }): ListedStand => ({
			id,
			name,
			x,
			y,
			boats: standing
				.filter(({ standId }) => standId === id)
				.map((boat) => ({ id: boat.id, name: boat.name }))
		})
	);
}

export const standList: YardList<typeof standsQuerySchema, ListedStand> = {
	name: 'stands',
	permission: 'see',
	schema: standsQuerySchema,
	page,
	columns: {
		stand: ({ name }) => name,
		'x (m)': ({ x }) => x,
		'y (m)': ({ y }) => y,
		boats: ({ boats }) => boats.map(({ name }) => name).join('; '),
		id: ({ id }) => id
	}
};
