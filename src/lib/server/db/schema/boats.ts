import {
	boolean,
	date,
	doublePrecision,
	index,
	jsonb,
	pgTable,
	primaryKey,
	text,
	timestamp,
	unique,
	uuid
} from 'drizzle-orm/pg-core';
import { FACE_NAMES, FINISHES, MATERIALS } from '../../../engine';
import { users } from './people';
import { revision } from './revision';
import { wallOfRecord, wallOfYard, yardOfParent } from './walls';
import { stands, yards } from './yard';

/** A boat ashore. `heading` is where the bow points, degrees from north clockwise. */
export const boats = pgTable(
	'boats',
	{
		id: uuid().primaryKey().defaultRandom(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		standId: uuid().references(() => stands.id, { onDelete: 'set null' }),
		ownerId: uuid().references(() => users.id, { onDelete: 'set null' }),
		name: text().notNull(),
		heading: doublePrecision().notNull(),
		hauledOn: date({ mode: 'string' }),
		launchBy: date({ mode: 'string' }),
		revision: revision()
	},
	(table) => [
		index().on(table.yardId, table.name, table.id),
		index().on(table.ownerId),
		index().on(table.standId),
		index('boats_trigrams').using('gin', table.yardId, table.name.op('gin_trgm_ops')),
		wallOfYard(table.yardId, 'accounts')
	]
);
export type Boat = typeof boats.$inferSelect;

/**
 * Where a boat stood and how it headed, from when to when; null: it still does. A trigger on
 * `boats` alone writes it, whoever moves one and however, so that none is forgotten.
 */
export const stays = pgTable(
	'stays',
	{
		id: uuid().primaryKey().defaultRandom(),
		boatId: uuid()
			.notNull()
			.references(() => boats.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		standId: uuid().references(() => stands.id, { onDelete: 'set null' }),
		/** As the stand was called then. */
		standName: text().notNull(),
		heading: doublePrecision().notNull(),
		since: timestamp({ withTimezone: true }).notNull().defaultNow(),
		until: timestamp({ withTimezone: true }),
		personId: uuid().references(() => users.id, { onDelete: 'set null' }),
		personName: text()
	},
	(table) => [index().on(table.boatId, table.since.desc()), wallOfRecord(table.yardId)]
);

/** Painters who may see and work on a boat. */
export const boatPainters = pgTable(
	'boat_painters',
	{
		boatId: uuid()
			.notNull()
			.references(() => boats.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' })
	},
	(table) => [
		primaryKey({ columns: [table.boatId, table.userId] }),
		index().on(table.userId),
		wallOfYard(table.yardId, 'accounts')
	]
);

/**
 * A side of a boat that gets coated. `tilt` in degrees (0 up, 90 upright, 180 down); `bearing` is
 * where it looks relative to the bow, clockwise, so that it turns with the boat. Null for faces
 * that look up.
 */
export const faces = pgTable(
	'faces',
	{
		id: uuid().primaryKey().defaultRandom(),
		boatId: uuid()
			.notNull()
			.references(() => boats.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		name: text({ enum: FACE_NAMES }).notNull(),
		side: text({ enum: ['port', 'starboard', 'both'] }).notNull(),
		tilt: doublePrecision().notNull(),
		bearing: doublePrecision(),
		material: text({ enum: MATERIALS }).notNull(),
		finish: text({ enum: FINISHES }).notNull(),
		solarAbsorptance: doublePrecision().notNull(),
		emissivity: doublePrecision().notNull(),
		/** W/m²K and °C; null takes the default of the material. */
		inside: jsonb().$type<{ u: number; temperature?: number }>(),
		bothSides: boolean().notNull().default(false),
		/** m² */
		area: doublePrecision(),
		revision: revision()
	},
	(table) => [unique().on(table.boatId, table.name, table.side), wallOfYard(table.yardId)]
);
export type FaceRow = typeof faces.$inferSelect;
