import { and, asc, eq, sql } from 'drizzle-orm';
import { z } from 'zod';
import { peopleQuerySchema, type ListedPerson, type PeopleQuery } from '../../api/lists/people';
import type { Membership } from '../access/roles';
import type { Database } from '../db/client';
import { memberships, users } from '../db/schema';
import { keyOfCursor, pageOf } from '../http/list';
import type { YardList } from './list';
import { holds } from './search';

const KEY = z.tuple([z.string(), z.uuid()]);

/** A page of the people of a yard, by name. */
async function page(db: Database, { yard }: Membership, query: PeopleQuery) {
	const key = keyOfCursor(query.cursor, KEY);
	const rows = await db
		.select({ id: users.id, name: users.name, email: users.email, role: memberships.role })
		.from(memberships)
		.innerJoin(users, eq(users.id, memberships.userId))
		.where(
			and(
				eq(memberships.yardId, yard.id),
				query.role === undefined ? undefined : eq(memberships.role, query.role),
				holds([users.name, users.email], query.q),
				key === null ? undefined : sql`(${users.name}, ${users.id}) > (${key[0]}, ${key[1]}::uuid)`
			)
		)
		.orderBy(asc(users.name), asc(users.id))
		.limit(query.limit + 1);
	return pageOf(
		rows,
		query,
		({ name, id }) => [name, id],
		(person): ListedPerson => person
	);
}

export const peopleList: YardList<typeof peopleQuerySchema, ListedPerson> = {
	name: 'people',
	permission: 'seePeople',
	schema: peopleQuerySchema,
	page,
	columns: {
		name: ({ name }) => name,
		'e-mail': ({ email }) => email,
		role: ({ role }) => role,
		id: ({ id }) => id
	}
};
