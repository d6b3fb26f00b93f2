import {
	boolean,
	doublePrecision,
	index,
	integer,
	jsonb,
	pgTable,
	primaryKey,
	text,
	timestamp,
	unique,
	uuid
} from 'drizzle-orm/pg-core';
import { ROLES, type Role } from '../../../api/roles';
import type { Hoist } from '../../../api/yard/hoists';
import type { Holiday } from '../../../api/yard/holidays';
import { PROVIDER_NAMES, SLIP_UNITS } from '../../../api/yard/settings';
import type { ShelterStock } from '../../../api/yard/shelters';
import type { LeeSector, LooseSand, WorkHours } from '../../../engine';
import { users } from './people';
import { revision } from './revision';
import { wallOfYard } from './walls';

/** The place. Degrees, metres; speeds in m/s at 10 m; hours in the yard's own zone. */
export const yards = pgTable(
	'yards',
	{
		id: uuid().primaryKey().defaultRandom(),
		slug: text().notNull().unique(),
		name: text().notNull(),
		latitude: doublePrecision().notNull(),
		longitude: doublePrecision().notNull(),
		elevation: doublePrecision().notNull().default(0),
		timeZone: text().notNull(),
		roughness: doublePrecision().notNull().default(0.03),
		albedo: doublePrecision().notNull().default(0.2),
		workHours: jsonb().$type<WorkHours>().notNull(),
		quietHours: jsonb().$type<WorkHours>().notNull().default([]),
		holidays: jsonb().$type<Holiday[]>().notNull().default([]),
		/** Null: nobody has said whether there is loose sand. */
		looseSand: jsonb().$type<LooseSand>(),
		liftGust: doublePrecision().notNull().default(12),
		highWindGust: doublePrecision().notNull().default(14.4),
		hoists: jsonb().$type<Hoist[]>().notNull().default([]),
		/** Null: nobody has said what there is, and every kind is thought of. */
		shelters: jsonb().$type<ShelterStock[]>(),
		dayRate: doublePrecision(),
		currency: text().notNull().default('EUR'),
		/** Days a launch may slip for nothing, and by what the others are billed. */
		slipFreeDays: integer().notNull().default(0),
		slipPer: text({ enum: SLIP_UNITS }).notNull().default('day'),
		/** Local days on the Hours page. */
		daysAhead: integer().notNull().default(4),
		/** The ground plan: metres, and where its upper edge looks, degrees from north clockwise. */
		groundWidth: doublePrecision().notNull().default(120),
		groundDepth: doublePrecision().notNull().default(80),
		groundBearing: doublePrecision().notNull().default(0),
		/** First choice of forecast; the other stands in when it fails. */
		forecastProvider: text({ enum: PROVIDER_NAMES }).notNull().default('open-meteo'),
		/** True for the seeded yard, laid anew relative to today while nobody has touched it. */
		demo: boolean().notNull().default(false),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		revision: revision()
	},
	(table) => [wallOfYard(table.id, 'accounts')]
);
export type Yard = typeof yards.$inferSelect;

export { ROLES, type Role };

export const memberships = pgTable(
	'memberships',
	{
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' }),
		role: text({ enum: ROLES }).notNull(),
		/** A person's own hours of work in this yard; null: the yard's. */
		workHours: jsonb().$type<WorkHours>()
	},
	(table) => [
		primaryKey({ columns: [table.yardId, table.userId] }),
		index().on(table.userId),
		wallOfYard(table.yardId, 'accounts')
	]
);

/** Where a boat stands; `x` and `y` in metres from the plan's lower left corner, null: not drawn yet. */
export const stands = pgTable(
	'stands',
	{
		id: uuid().primaryKey().defaultRandom(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		name: text().notNull(),
		position: integer().notNull(),
		x: doublePrecision(),
		y: doublePrecision(),
		/** What breaks the wind there. */
		lee: jsonb().$type<LeeSector[]>().notNull().default([]),
		revision: revision()
	},
	(table) => [
		unique().on(table.yardId, table.name),
		index().on(table.yardId, table.position, table.id),
		wallOfYard(table.yardId)
	]
);
export type StandRow = typeof stands.$inferSelect;
