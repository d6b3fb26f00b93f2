import { z } from 'zod';
import {
	LIMITERS,
	METHODS,
	REMEDY_CODES,
	SAND_STATES,
	SHELTERS,
	SLOT_FLAGS,
	STATES,
	STEP_FLAGS,
	STEP_KINDS,
	WARNING_CODES
} from '../../engine';

const series = z.array(z.number().nullable());
const instant = z.iso.datetime();
const limiter = z.enum(LIMITERS);
/** Share of members, 0 to 1; null without members. */
const chance = z.number().min(0).max(1).nullable();
/** Place in `steps` of the request. */
const stepIndex = z.int().min(0);

/** One value per quarter-hour in every array; `null` is unknown. */
const slotsSchema = z.object({
	/** Slot starts. */
	time: z.array(instant),
	airTemperature: series,
	dewPoint: series,
	relativeHumidity: series,
	surfaceTemperature: series,
	surfaceTemperatureSun: series,
	spread: series,
	film: series,
	windSpeed: series,
	windGust: series,
	windSpeed10: series,
	windGust10: series,
	precipitation: series,
	sand: z.array(z.enum(SAND_STATES).nullable()),
	flags: z.array(z.array(z.enum(SLOT_FLAGS)))
});

const stepSchema = z.object({
	state: z.array(z.enum(STATES)),
	limiter: z.array(limiter),
	room: series,
	/** Share of members in which each slot is workable; null without members. */
	chance: z.array(z.number()).nullable(),
	stretches: z.array(
		z.object({
			from: instant,
			to: instant,
			lastStart: instant,
			bestStart: instant,
			room: z.number(),
			/** Of the best start, gone through to its end. */
			chance
		})
	),
	best: z.object({ start: instant, finish: instant, room: z.number(), limiter, chance }).nullable(),
	flags: z.array(z.enum(STEP_FLAGS))
});

const planSchema = z.object({
	steps: z.array(
		z.object({
			/** Null for an abrading that the plan puts in because a recoat window would be missed. */
			step: stepIndex.nullable(),
			kind: z.enum(STEP_KINDS),
			start: instant,
			finish: instant,
			/** Null for a step whose start was given. */
			limiter: limiter.nullable(),
			room: z.number().nullable(),
			earliestNext: instant.nullable(),
			latestNext: instant.nullable()
		})
	),
	/** Abradings put in. */
	inserted: z.int(),
	holdChance: chance,
	launchReady: z.object({
		earliest: instant.nullable(),
		latest: instant.nullable(),
		/** Reaches past the forecast. */
		assumed: z.boolean(),
		/** After which the last coat has stood ashore too long. */
		closes: instant.nullable()
	}),
	/** The start of its launch step, without one the first launch it can make; whole days and money it slips. */
	launch: instant.nullable(),
	slipDays: z.int().nullable(),
	costOfSlip: z.number().nullable()
});

const plan = planSchema.nullable();

export const outlookResponseSchema = z.object({
	slots: slotsSchema,
	steps: z.array(stepSchema),
	plans: z.object({ soonest: plan, surest: plan, byDate: plan }),
	/** Fields that a code does not use are null. */
	warnings: z.array(
		z.object({
			code: z.enum(WARNING_CODES),
			step: stepIndex.nullable(),
			/** The step whose recoat window it is. */
			after: stepIndex.nullable(),
			/** Workable hours left. */
			hours: z.number().nullable(),
			hasStarts: z.boolean().nullable(),
			/** Launch slots ahead, inside the forecast. */
			slots: z.int().min(0).nullable(),
			opens: instant.nullable(),
			closes: instant.nullable(),
			launch: instant.nullable(),
			launchBy: instant.nullable(),
			readyAt: instant.nullable()
		})
	),
	remedies: z
		.array(
			z.object({
				code: z.enum(REMEDY_CODES),
				step: stepIndex,
				/** The shut run and what shuts it. */
				from: instant,
				to: instant,
				limiter,
				/** 0: tried, and no gain. */
				gainMinutes: z.number(),
				opensFrom: instant.nullable(),
				opensTo: instant.nullable(),
				shelter: z.enum(SHELTERS).nullable(),
				method: z.enum(METHODS).nullable(),
				/** Rests on the usual wind limits of a method, for want of the sheet's. */
				assumed: z.boolean()
			})
		)
		.describe(
			'What would open the shut runs of each step that is not fixed, step by step. Told are the first runs from `from` on: 96 of all steps together, shared evenly, but four of each.'
		)
});
export type OutlookResponse = z.infer<typeof outlookResponseSchema>;
