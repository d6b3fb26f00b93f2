import { and, desc, eq, sql } from 'drizzle-orm';
import { z } from 'zod';
import { changesQuerySchema, type ChangesQuery, type ListedChange } from '../../api/lists/changes';
import { changeSentence } from '../../sentences/change';
import type { Membership } from '../access/roles';
import type { Database } from '../db/client';
import { boats, changes } from '../db/schema';
import { keyOfCursor, pageOf } from '../http/list';
import { instantOfKey, instantText } from './instantKey';
import type { YardList } from './list';
import { holds } from './search';

const KEY = z.tuple([instantOfKey, z.int()]);

/** A page of what was changed in a yard, the newest first. */
async function page(db: Database, { yard }: Membership, query: ChangesQuery) {
	const key = keyOfCursor(query.cursor, KEY);
	/** When a day of the yard's zone begins, so many days on. */
	const begins = (day: string, on: number) =>
		sql`((${day}::date + ${on}::int)::timestamp at time zone ${yard.timeZone})`;
	const rows = await db
		.select({ change: changes, instant: instantText(changes.at), boat: boats.name })
		.from(changes)
		.leftJoin(boats, eq(boats.id, changes.boatId))
		.where(
			and(
				eq(changes.yardId, yard.id),
				query.person === undefined ? undefined : eq(changes.personId, query.person),
				query.boat === undefined ? undefined : eq(changes.boatId, query.boat),
				query.subject === undefined ? undefined : eq(changes.subject, query.subject),
				query.from === undefined ? undefined : sql`${changes.at} >= ${begins(query.from, 0)}`,
				query.to === undefined ? undefined : sql`${changes.at} < ${begins(query.to, 1)}`,
				holds([changes.personName], query.q),
				key === null
					? undefined
					: sql`(${changes.at}, ${changes.id}) < (${key[0]}::timestamptz, ${key[1]}::bigint)`
			)
		)
		.orderBy(desc(changes.at), desc(changes.id))
		.limit(query.limit + 1);
	return pageOf(
		rows,
		query,
		({ instant, change }) => [instant, change.id],
		({ change, boat }): ListedChange => ({
			id: change.id,
			at: change.at.toISOString(),
			person: change.personName,
			boat: change.boatId === null || boat === null ? null : { id: change.boatId, name: boat },
			subject: change.subject,
			action: change.action,
			sentence: changeSentence(change, change.subject === 'boats' ? boat : null),
			before: change.before,
			after: change.after
		})
	);
}

export const changeList: YardList<typeof changesQuerySchema, ListedChange> = {
	name: 'changes',
	permission: 'seeChanges',
	schema: changesQuerySchema,
	page,
	columns: {
		when: ({ at }) => at,
		who: ({ person }) => person,
		what: ({ sentence }) => sentence,
		boat: ({ boat }) => boat?.name ?? null,
		before: ({ before }) => (before === null ? null : JSON.stringify(before)),
		after: ({ after }) => (after === null ? null : JSON.stringify(after))
	}
};
