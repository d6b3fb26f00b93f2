import { date, index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { users } from './people';
import { revision } from './revision';
import { wallOfYard } from './walls';
import { yards } from './yard';

/** Days on which somebody does not work in a yard, both included, by dates of its zone. */
export const absences = pgTable(
	'absences',
	{
		id: uuid().primaryKey().defaultRandom(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' }),
		fromDate: date({ mode: 'string' }).notNull(),
		toDate: date({ mode: 'string' }).notNull(),
		note: text().notNull().default(''),
		revision: revision()
	},
	(table) => [index().on(table.yardId, table.userId, table.toDate), wallOfYard(table.yardId)]
);
export type Absence = typeof absences.$inferSelect;
