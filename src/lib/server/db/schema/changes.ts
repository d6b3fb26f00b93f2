import { bigserial, index, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { wallOfRecord } from './walls';
import { yards } from './yard';

/**
 * Who changed what, written by triggers of the tables themselves and by nothing else. `before` and
 * `after` hold the fields that differ; of a new row everything, of a deleted one what it was. The
 * name stays when the person has gone; without a person it was the product itself.
 */
export const changes = pgTable(
	'changes',
	{
		id: bigserial({ mode: 'number' }).primaryKey(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		at: timestamp({ withTimezone: true }).notNull().defaultNow(),
		personId: uuid(),
		personName: text(),
		/** Name of the table, as in the database. */
		subject: text().notNull(),
		/** The row's key: its id, or the ids it joins. */
		rowId: text().notNull(),
		/** The boat it belongs to, if any. */
		boatId: uuid(),
		action: text({ enum: ['INSERT', 'UPDATE', 'DELETE'] }).notNull(),
		before: jsonb().$type<Record<string, unknown>>(),
		after: jsonb().$type<Record<string, unknown>>()
	},
	(table) => [
		// The record is read from the newest on: all of it, of a person, of a boat, of a kind of row.
		index().on(table.yardId, table.at, table.id),
		index().on(table.yardId, table.personId, table.at, table.id),
		index().on(table.yardId, table.boatId, table.at, table.id),
		index('changes_of_subject').on(table.yardId, table.subject, table.at, table.id),
		index().on(table.yardId, table.subject, table.rowId, table.id),
		wallOfRecord(table.yardId)
	]
);
export type Change = typeof changes.$inferSelect;
