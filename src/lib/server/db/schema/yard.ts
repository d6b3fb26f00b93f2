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
import type { LooseSand, WorkHours } from '../../../engine';
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
		/** Null: nobody has said whether there is loose sand. */
		looseSand: jsonb().$type<LooseSand>(),
		liftGust: doublePrecision().notNull().default(12),
		highWindGust: doublePrecision().notNull().default(14.4),
		dayRate: doublePrecision(),
		currency: text().notNull().default('EUR'),
		/** First choice of forecast; the other stands in when it fails. */
		forecastProvider: text({ enum: ['open-meteo', 'met-norway'] })
			.notNull()
			.default('open-meteo'),
		/** True for the seeded yard, laid anew relative to today while nobody has touched it. */
		demo: boolean().notNull().default(false),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		revision: revision()
	},
	(table) => [wallOfYard(table.id, 'accounts')]
);
export type Yard = typeof yards.$inferSelect;

export const ROLES = ['manager', 'painter', 'owner'] as const;
export type Role = (typeof ROLES)[number];

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

/** Where a boat stands. */
export const stands = pgTable(
	'stands',
	{
		id: uuid().primaryKey().defaultRandom(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		name: text().notNull(),
		position: integer().notNull(),
		revision: revision()
	},
	(table) => [unique().on(table.yardId, table.name), wallOfYard(table.yardId)]
);
