import { sql } from 'drizzle-orm';
import { index, integer, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { wallOfAccounts, wallOfPeople, wallOfPerson } from './walls';

/** A person who can sign in. */
export const users = pgTable(
	'users',
	{
		id: uuid().primaryKey().defaultRandom(),
		email: text().notNull(),
		name: text().notNull(),
		passwordHash: text().notNull(),
		/** Units this person reads; the engine and the database keep SI. */
		windUnit: text({ enum: ['m/s', 'kn', 'km/h', 'mph'] })
			.notNull()
			.default('kn'),
		temperatureUnit: text({ enum: ['°C', '°F'] })
			.notNull()
			.default('°C'),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow()
	},
	(table) => [
		uniqueIndex('users_email_lower').on(sql`lower(${table.email})`),
		index('users_trigrams').using('gin', table.name.op('gin_trgm_ops')),
		wallOfPeople(table.id)
	]
);
export type User = typeof users.$inferSelect;

/** Signed-in devices. `id` is the SHA-256 of the token that only the cookie holds. */
export const sessions = pgTable(
	'sessions',
	{
		id: text().primaryKey(),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' }),
		expiresAt: timestamp({ withTimezone: true }).notNull(),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		/** When the device was last heard of, within minutes, and what it called itself. */
		lastSeenAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		userAgent: text()
	},
	(table) => [wallOfPerson(table.userId)]
);

/** Failed sign-ins, for the rate limit; `key` is a hash of address or e-mail. */
export const signInAttempts = pgTable(
	'sign_in_attempts',
	{
		key: text().primaryKey(),
		failures: integer().notNull().default(0),
		windowStartedAt: timestamp({ withTimezone: true }).notNull().defaultNow()
	},
	() => [wallOfAccounts()]
);
