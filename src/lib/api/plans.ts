import { z } from 'zod';
import { LIMITERS } from '../engine';
import { outlookResponseSchema } from './outlook/response';

const instant = z.iso.datetime();
export const PLAN_AIMS = ['soonest', 'surest', 'byDate'] as const;
export type PlanAim = (typeof PLAN_AIMS)[number];
export const PLAN_ANSWERS = ['accepted', 'declined'] as const;
const person = z.object({ id: z.string(), name: z.string() });

/** A plan that was taken, as it stood then. */
export const takenPlanSchema = z.object({
	id: z.string(),
	aim: z.enum(PLAN_AIMS),
	/** Null where the person has left since. */
	takenBy: person.nullable(),
	takenAt: instant,
	forecastIssuedAt: instant,
	/** Members in which it held, of how many; null without members. */
	heldMembers: z.int().nullable(),
	members: z.int().nullable(),
	launchAt: instant.nullable(),
	slipDays: z.int().nullable(),
	costOfSlip: z.number().nullable(),
	/** Steps were added, dropped or put in another order since: it is no plan of this queue any more. */
	outdated: z.boolean(),
	steps: z.array(
		z.object({
			stepId: z.string(),
			name: z.string(),
			start: instant,
			finish: instant,
			limiter: z.enum(LIMITERS).nullable(),
			room: z.number().nullable(),
			painters: z.array(
				person.extend({
					/** Null while they have not said. */
					answer: z.enum(PLAN_ANSWERS).nullable(),
					reason: z.string().nullable()
				})
			),
			/** Why it no longer holds in the forecast at hand; null while it does. */
			broken: z.enum(LIMITERS).nullable()
		})
	)
});
export type TakenPlan = z.infer<typeof takenPlanSchema>;

/** The plans of a job: one in force, and what can be chosen now. `step` counts in `stepIds`. */
export const jobPlansSchema = z.object({
	taken: takenPlanSchema.nullable(),
	/** Identifies the forecast the offers rest on; null without a forecast. */
	forecast: z.object({ runId: z.string(), issuedAt: instant, members: z.int() }).nullable(),
	/** No start before it: now, or the end of a job it waits for. */
	from: instant.nullable(),
	stepIds: z.array(z.string()),
	offers: outlookResponseSchema.shape.plans,
	warnings: outlookResponseSchema.shape.warnings,
	/** Why there can be none; null where there can. */
	trouble: z.string().nullable()
});
export type JobPlans = z.infer<typeof jobPlansSchema>;

export const takePlanSchema = z.object({
	aim: z.enum(PLAN_AIMS, { error: 'Choose one of the plans.' }),
	/** Starts as they were shown, in order, so that no other plan is taken than the one seen. */
	starts: z
		.array(z.iso.datetime({ offset: true }))
		.min(1)
		.max(200)
});

export const answerPlanSchema = z.object({
	stepId: z.uuid(),
	answer: z.enum(PLAN_ANSWERS),
	reason: z.string().trim().max(300, 'Use at most 300 characters.').optional()
});
