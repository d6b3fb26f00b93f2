import { sql } from 'drizzle-orm';
import {
	check,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	timestamp,
	uuid
} from 'drizzle-orm/pg-core';
import { FILE_KINDS, FILE_MEDIA_TYPES } from '../../../api/files';
import { boats } from './boats';
import { sheets } from './sheets';
import { users } from './people';
import { revision } from './revision';
import { wallOfYard } from './walls';
import { yards } from './yard';

/**
 * A photo or PDF that somebody sent, of a boat or of a sheet; neither: the picture of the yard's
 * stands. Its bytes are in the storage, under the yard and their hash; equal ones are kept once.
 */
export const files = pgTable(
	'files',
	{
		/** Made by who sends it, so that sending again makes no second one. */
		id: uuid().primaryKey(),
		/** Of a boat's or a sheet's file written from there by a trigger. */
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		boatId: uuid().references(() => boats.id, { onDelete: 'cascade' }),
		sheetId: uuid().references(() => sheets.id, { onDelete: 'cascade' }),
		kind: text({ enum: FILE_KINDS }).notNull(),
		mediaType: text({ enum: FILE_MEDIA_TYPES }).notNull(),
		/** Size and SHA-256 of what is kept, which for a picture is not what was sent. */
		bytes: integer().notNull(),
		sha256: text().notNull(),
		/** SHA-256 of what was sent, by which the same thing sent again is known. */
		sentSha256: text().notNull(),
		/** Pixels, as the picture is seen; null for a PDF. */
		width: integer(),
		height: integer(),
		name: text().notNull(),
		caption: text().notNull().default(''),
		uploadedBy: uuid().references(() => users.id, { onDelete: 'set null' }),
		uploadedAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		revision: revision()
	},
	(table) => [
		index().on(table.yardId, table.sha256),
		index().on(table.boatId, table.uploadedAt),
		index().on(table.sheetId),
		check('files_of_one', sql`num_nonnulls(${table.boatId}, ${table.sheetId}) <= 1`),
		check(
			'files_plan',
			sql`(${table.kind} = 'plan') = (num_nonnulls(${table.boatId}, ${table.sheetId}) = 0)`
		),
		wallOfYard(table.yardId)
	]
);
export type FileRow = typeof files.$inferSelect;

/**
 * Bytes that are or may be in the storage. Noted before they are put there and forgotten after
 * they are deleted, so that none is left behind; it outlives the yard for the same reason.
 */
export const keptBlobs = pgTable(
	'kept_blobs',
	{
		yardId: uuid().notNull(),
		sha256: text().notNull(),
		/** When somebody last meant to keep it. */
		keptAt: timestamp({ withTimezone: true }).notNull().defaultNow()
	},
	(table) => [primaryKey({ columns: [table.yardId, table.sha256] }), wallOfYard(table.yardId)]
);
