import { sql } from 'drizzle-orm';
import { index, integer, jsonb, pgTable, text, timestamp, unique, uuid } from 'drizzle-orm/pg-core';
import type { Sheet } from '../../../engine';
import { users } from './people';
import { wallOfYard } from './walls';
import { yards } from './yard';

/**
 * A version of a coating's data sheet. Versions are never changed: what is edited is laid beside
 * them as the next one, and a step keeps the one it was queued with. A sample is to be checked
 * against the tin before use.
 */
export const sheets = pgTable(
	'sheets',
	{
		id: uuid().primaryKey().defaultRandom(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		/** Names the sheet through its versions and whatever it is called. */
		key: text().notNull(),
		version: integer().notNull().default(1),
		sheet: jsonb().$type<Sheet>().notNull(),
		name: text()
			.notNull()
			.generatedAlwaysAs(sql`sheet ->> 'name'`),
		writtenBy: uuid().references(() => users.id, { onDelete: 'set null' }),
		writtenAt: timestamp({ withTimezone: true }).notNull().defaultNow()
	},
	(table) => [
		unique().on(table.yardId, table.key, table.version),
		index().on(table.yardId, table.name),
		// A yard is founded with its sample sheets.
		wallOfYard(table.yardId, 'accounts')
	]
);
export type SheetRow = typeof sheets.$inferSelect;
