import { sql } from 'drizzle-orm';
import {
	index,
	integer,
	jsonb,
	pgTable,
	primaryKey,
	text,
	timestamp,
	uuid
} from 'drizzle-orm/pg-core';
import { PROVIDER_NAMES } from '../../../api/yard/settings';
import type { Hourly, Member } from '../../../engine';
import { steps } from './jobs';
import { wallOfYard, yardOfParent } from './walls';
import { yards } from './yard';

export const PROVIDERS = PROVIDER_NAMES;
export type ProviderName = (typeof PROVIDERS)[number];

/** One forecast as it came, canonical, series as arrays. Never changed once written. */
export const forecastRuns = pgTable(
	'forecast_runs',
	{
		id: uuid().primaryKey().defaultRandom(),
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		provider: text({ enum: PROVIDERS }).notNull(),
		issuedAt: timestamp({ withTimezone: true }).notNull(),
		fetchedAt: timestamp({ withTimezone: true }).notNull(),
		hourly: jsonb().$type<Hourly>().notNull(),
		members: jsonb().$type<Member[]>(),
		/** Beside the members themselves, half a megabyte that saying how many there are need not read. */
		memberCount: integer()
			.notNull()
			.generatedAlwaysAs(sql`coalesce(jsonb_array_length("members"), 0)`)
	},
	(table) => [index().on(table.yardId, table.fetchedAt.desc()), wallOfYard(table.yardId)]
);
export type ForecastRun = typeof forecastRuns.$inferSelect;

/**
 * How each provider has answered for a yard: validators for conditional requests, when it may be
 * asked again, and the last trouble.
 */
export const providerStates = pgTable(
	'provider_states',
	{
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		provider: text({ enum: PROVIDERS }).notNull(),
		etag: text(),
		lastModified: text(),
		expiresAt: timestamp({ withTimezone: true }),
		lastSuccessAt: timestamp({ withTimezone: true }),
		failures: integer().notNull().default(0),
		openUntil: timestamp({ withTimezone: true }),
		/** The last trouble in a sentence a person can read. */
		trouble: text(),
		troubleAt: timestamp({ withTimezone: true })
	},
	(table) => [
		primaryKey({ columns: [table.yardId, table.provider] }),
		wallOfYard(table.yardId, 'health')
	]
);

/**
 * A yard's own key of a provider's paid plan, sealed (see `forecast/sealedKey.ts`): who reads the
 * rows without the installation's secret reads nothing.
 */
export const forecastKeys = pgTable(
	'forecast_keys',
	{
		yardId: uuid()
			.notNull()
			.references(() => yards.id, { onDelete: 'cascade' }),
		provider: text({ enum: PROVIDERS }).notNull(),
		sealed: text().notNull(),
		setAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		setBy: text().notNull()
	},
	(table) => [primaryKey({ columns: [table.yardId, table.provider] }), wallOfYard(table.yardId)]
);

/** Computed hours, keyed by a hash of the engine's whole input and its version. Can be thrown away. */
export const outlooks = pgTable(
	'outlooks',
	{
		key: text().primaryKey(),
		stepId: uuid()
			.notNull()
			.references(() => steps.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		hours: jsonb().notNull(),
		createdAt: timestamp({ withTimezone: true }).notNull().defaultNow()
	},
	(table) => [index().on(table.stepId), wallOfYard(table.yardId)]
);
