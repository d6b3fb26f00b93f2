import { index, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { SCOPES } from '../../../api/tokens';
import { users } from './people';
import { wallOfPerson } from './walls';
import { yards } from './yard';

/**
 * What programs sign in with in a person's name. `tokenHash` is the SHA-256 of what only the
 * program holds.
 */
export const accessTokens = pgTable(
	'access_tokens',
	{
		id: uuid().primaryKey().defaultRandom(),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' }),
		/** The only yard it opens; null: all of the person's. */
		ofYard: uuid().references(() => yards.id, { onDelete: 'cascade' }),
		name: text().notNull(),
		tokenHash: text().notNull().unique(),
		scopes: text({ enum: SCOPES }).array().notNull(),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		expiresAt: timestamp({ withTimezone: true }).notNull(),
		/** When it was last used, within minutes; null: never. */
		lastUsedAt: timestamp({ withTimezone: true })
	},
	(table) => [index().on(table.userId), wallOfPerson(table.userId)]
);
