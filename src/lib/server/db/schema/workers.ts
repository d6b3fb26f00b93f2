import { pgTable, text, timestamp } from 'drizzle-orm/pg-core';
import { noWall } from './walls';

/** Worker processes and when each was last seen, for the health page. */
export const workers = pgTable(
	'workers',
	{
		id: text().primaryKey(),
		seenAt: timestamp({ withTimezone: true }).notNull()
	},
	() => [noWall()]
);
