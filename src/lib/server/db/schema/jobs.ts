import {
	doublePrecision,
	index,
	integer,
	jsonb,
	pgTable,
	primaryKey,
	text,
	timestamp,
	uuid
} from 'drizzle-orm/pg-core';
import {
	METHODS,
	SHELTERS,
	STEP_KINDS,
	type Limits,
	type TaskCode,
	type Times
} from '../../../engine';
import { STEP_STATES } from '../../../api/jobs';
import { boats, faces } from './boats';
import { users } from './people';
import { revision } from './revision';
import { sheets } from './sheets';
import { wallOfYard, yardOfParent } from './walls';

/** A queue of steps on one boat. */
export const jobs = pgTable(
	'jobs',
	{
		id: uuid().primaryKey().defaultRandom(),
		boatId: uuid()
			.notNull()
			.references(() => boats.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		name: text().notNull(),
		position: integer().notNull(),
		revision: revision()
	},
	(table) => [
		index().on(table.boatId),
		index('jobs_trigrams').using('gin', table.yardId, table.name.op('gin_trgm_ops')),
		wallOfYard(table.yardId)
	]
);

/**
 * One step. Limits and times come from its sheet, or from the rule of work it is done by; those of
 * its own stand over them, key by key.
 */
export const steps = pgTable(
	'steps',
	{
		id: uuid().primaryKey().defaultRandom(),
		jobId: uuid()
			.notNull()
			.references(() => jobs.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		position: integer().notNull(),
		name: text().notNull(),
		kind: text({ enum: STEP_KINDS }).notNull(),
		method: text({ enum: METHODS }).notNull(),
		durationMinutes: doublePrecision().notNull(),
		sheetId: uuid().references(() => sheets.id, { onDelete: 'restrict' }),
		limits: jsonb().$type<Limits>().notNull().default({}),
		times: jsonb().$type<Times>().notNull().default({}),
		shelter: text({ enum: SHELTERS }).notNull().default('open'),
		/** The rule of work it was queued by, where no sheet speaks for it. */
		task: text().$type<TaskCode>(),
		state: text({ enum: STEP_STATES }).notNull().default('queued'),
		/** A start fixed by hand, which every plan keeps. */
		pinnedAt: timestamp({ withTimezone: true }),
		/** When work on it began and ended, as said by who worked. */
		startedAt: timestamp({ withTimezone: true }),
		finishedAt: timestamp({ withTimezone: true }),
		updatedAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		revision: revision()
	},
	(table) => [
		index().on(table.jobId, table.position),
		// Lists, what changed last first: all, by state, by kind.
		index().on(table.yardId, table.updatedAt, table.id),
		index().on(table.yardId, table.state, table.updatedAt, table.id),
		index().on(table.yardId, table.kind, table.updatedAt, table.id),
		wallOfYard(table.yardId)
	]
);
export type StepRow = typeof steps.$inferSelect;

export const stepFaces = pgTable(
	'step_faces',
	{
		stepId: uuid()
			.notNull()
			.references(() => steps.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		faceId: uuid()
			.notNull()
			.references(() => faces.id, { onDelete: 'cascade' })
	},
	(table) => [primaryKey({ columns: [table.stepId, table.faceId] }), wallOfYard(table.yardId)]
);

/** A job of a boat that begins only when another of the same boat is done. */
export const jobWaits = pgTable(
	'job_waits',
	{
		jobId: uuid()
			.notNull()
			.references(() => jobs.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		afterId: uuid()
			.notNull()
			.references(() => jobs.id, { onDelete: 'cascade' })
	},
	(table) => [
		primaryKey({ columns: [table.jobId, table.afterId] }),
		index().on(table.afterId),
		wallOfYard(table.yardId)
	]
);

/** Who works on a step. */
export const stepPainters = pgTable(
	'step_painters',
	{
		stepId: uuid()
			.notNull()
			.references(() => steps.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' })
	},
	(table) => [
		primaryKey({ columns: [table.stepId, table.userId] }),
		index().on(table.userId),
		wallOfYard(table.yardId)
	]
);
