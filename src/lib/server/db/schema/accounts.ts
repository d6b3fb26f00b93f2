import { sql } from 'drizzle-orm';
import { index, integer, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { boats } from './boats';
import { users } from './people';
import { wallOfAccounts, wallOfPost, wallOfYard } from './walls';
import { ROLES, yards } from './yard';

/** What a link in a mail may be for. */
export const LINK_KINDS = ['foundYard', 'resetPassphrase'] as const;
export type LinkKind = (typeof LINK_KINDS)[number];

/**
 * Links that were mailed and not yet followed. `tokenHash` is the SHA-256 of what only the mail
 * holds; a link is deleted when it is followed.
 */
export const accountLinks = pgTable(
	'account_links',
	{
		tokenHash: text().primaryKey(),
		kind: text({ enum: LINK_KINDS }).notNull(),
		/** Whose it is; null while that person has no account yet. */
		userId: uuid().references(() => users.id, { onDelete: 'cascade' }),
		/** What following it does, as the schema of its kind says. */
		payload: jsonb().notNull().default({}),
		expiresAt: timestamp({ withTimezone: true }).notNull()
	},
	(table) => [index().on(table.userId), index().on(table.expiresAt), wallOfAccounts()]
);

/** People asked to join a yard, until they do. */
export const invitations = pgTable(
	'invitations',
	{
		id: uuid().primaryKey().defaultRandom(),
		tokenHash: text().notNull().unique(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		email: text().notNull(),
		role: text({ enum: ROLES }).notNull(),
		/** The boat a painter is asked to work on. */
		boatId: uuid().references(() => boats.id, { onDelete: 'cascade' }),
		invitedBy: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' }),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		expiresAt: timestamp({ withTimezone: true }).notNull()
	},
	(table) => [
		index().on(table.yardId),
		index('invitations_email').on(sql`lower(${table.email})`),
		wallOfYard(table.yardId, 'accounts')
	]
);
export type Invitation = typeof invitations.$inferSelect;

/**
 * Mail to be sent, written in the transaction that makes it due. `id` is its Message-ID, so that a
 * second delivery is known for the same mail.
 */
export const mails = pgTable(
	'mails',
	{
		id: uuid().primaryKey().defaultRandom(),
		recipient: text().notNull(),
		subject: text().notNull(),
		text: text().notNull(),
		html: text().notNull(),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		/** Null until a server took it. */
		sentAt: timestamp({ withTimezone: true }),
		attempts: integer().notNull().default(0),
		nextTryAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		lastError: text()
	},
	(table) => [
		index('mails_due')
			.on(table.nextTryAt)
			.where(sql`${table.sentAt} is null`),
		wallOfPost()
	]
);
export type Mail = typeof mails.$inferSelect;
