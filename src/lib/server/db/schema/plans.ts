import { sql } from 'drizzle-orm';
import {
	boolean,
	doublePrecision,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	timestamp,
	uniqueIndex,
	uuid
} from 'drizzle-orm/pg-core';
import { PLAN_AIMS, PLAN_ANSWERS } from '../../../api/plans';
import { LIMITERS } from '../../../engine';
import { jobs, steps } from './jobs';
import { users } from './people';
import { wallOfYard, yardOfParent } from './walls';

/** A plan that somebody took for a job, as it stood then. One at a time is in force. */
export const plans = pgTable(
	'plans',
	{
		id: uuid().primaryKey().defaultRandom(),
		jobId: uuid()
			.notNull()
			.references(() => jobs.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		aim: text({ enum: PLAN_AIMS }).notNull(),
		takenBy: uuid().references(() => users.id, { onDelete: 'set null' }),
		takenAt: timestamp({ withTimezone: true }).notNull().defaultNow(),
		/** When the forecast it rests on was issued. */
		forecastIssuedAt: timestamp({ withTimezone: true }).notNull(),
		/** Members in which it held, and how many there were; null without members. */
		heldMembers: integer(),
		members: integer(),
		launchReadyAt: timestamp({ withTimezone: true }),
		launchReadyAssumed: boolean().notNull(),
		launchAt: timestamp({ withTimezone: true }),
		slipDays: integer(),
		costOfSlip: doublePrecision(),
		/** Null while it is in force. */
		endedAt: timestamp({ withTimezone: true }),
		endedBy: uuid().references(() => users.id, { onDelete: 'set null' })
	},
	(table) => [
		index().on(table.jobId, table.takenAt),
		uniqueIndex('plans_in_force')
			.on(table.jobId)
			.where(sql`${table.endedAt} is null`),
		wallOfYard(table.yardId)
	]
);
export type PlanRow = typeof plans.$inferSelect;

/** Where a plan puts a step. */
export const planSteps = pgTable(
	'plan_steps',
	{
		planId: uuid()
			.notNull()
			.references(() => plans.id, { onDelete: 'cascade' }),
		stepId: uuid()
			.notNull()
			.references(() => steps.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		startAt: timestamp({ withTimezone: true }).notNull(),
		finishAt: timestamp({ withTimezone: true }).notNull(),
		/** Least scaled room over the hours worked, and what has it; null of a step that was fixed. */
		room: doublePrecision(),
		limiter: text({ enum: LIMITERS })
	},
	(table) => [
		primaryKey({ columns: [table.planId, table.stepId] }),
		index().on(table.stepId),
		wallOfYard(table.yardId)
	]
);

/** What a painter named in a plan said to their step of it. */
export const planAnswers = pgTable(
	'plan_answers',
	{
		planId: uuid()
			.notNull()
			.references(() => plans.id, { onDelete: 'cascade' }),
		stepId: uuid()
			.notNull()
			.references(() => steps.id, { onDelete: 'cascade' }),
		yardId: yardOfParent(),
		userId: uuid()
			.notNull()
			.references(() => users.id, { onDelete: 'cascade' }),
		answer: text({ enum: PLAN_ANSWERS }).notNull(),
		/** Why not, in the painter's words. */
		reason: text(),
		at: timestamp({ withTimezone: true }).notNull().defaultNow()
	},
	(table) => [
		primaryKey({ columns: [table.planId, table.stepId, table.userId] }),
		wallOfYard(table.yardId)
	]
);
