import { z } from 'zod';
import { LIMITERS, SAND_STATES, SLOT_FLAGS, STATES, STEP_FLAGS, STEP_KINDS } from '../engine';
import { sentenceSchema } from './sentence';

/** ISO 8601 instant in UTC. */
const instant = z.iso.datetime();
const valueSeries = z.array(z.number().nullable());

/** Slots [from, to) of the page's grid in one state with one limiter. */
export const runSchema = z.object({
	from: z.int(),
	to: z.int(),
	state: z.enum(STATES),
	limiter: z.enum(LIMITERS),
	/** What is missing where the limiter is `noData`, as a person would say it. */
	missing: z.string().nullable()
});
export type Run = z.infer<typeof runSchema>;

const spanSchema = z.object({ from: z.int(), to: z.int() });

/** Where the forecast shown came from, and how old it is. */
export const forecastSourceSchema = z.object({
	provider: z.string(),
	/** `provider`: the yard's own; `fallback`: the other one; `lastGood`: neither answered. */
	origin: z.enum(['provider', 'fallback', 'lastGood']),
	issuedAt: instant,
	fetchedAt: instant,
	ageMinutes: z.int(),
	stale: z.boolean(),
	attribution: z.object({ text: z.string(), url: z.string() }),
	members: z.int(),
	/** Why the yard's own provider was not used, in a sentence; null when it was. */
	trouble: z.string().nullable()
});
export type ForecastSource = z.infer<typeof forecastSourceSchema>;

export const hoursStepSchema = z.object({
	id: z.string(),
	jobId: z.string(),
	job: z.string(),
	name: z.string(),
	kind: z.enum(STEP_KINDS),
	faces: z.array(z.string()),
	shelter: z.string(),
	durationMinutes: z.number(),
	/** True when the sheet behind it is a sample to be checked against the tin. */
	sampleSheet: z.boolean(),
	sheet: z.string().nullable(),
	/** The usual caution of this kind of work; null where none is needed. */
	caution: z.string().nullable(),
	runs: z.array(runSchema),
	/** Start and finish as slot indices; least scaled room. */
	best: z
		.object({ start: z.int(), finish: z.int(), room: z.number(), limiter: z.enum(LIMITERS) })
		.nullable(),
	/** Best hours of each local day of the page, same order as `days`; null where nothing fits. */
	bestByDay: z.array(
		z
			.object({
				start: z.int(),
				finish: z.int(),
				from: z.int(),
				to: z.int(),
				room: z.number(),
				limiter: z.enum(LIMITERS),
				/** The limiter of the slot before the stretch and of the slot after it. */
				before: z.enum(LIMITERS),
				after: z.enum(LIMITERS)
			})
			.nullable()
	),
	flags: z.array(z.enum(STEP_FLAGS)),
	/** Sentence a screen reader hears for the batten. */
	spoken: z.string()
});
export type HoursStep = z.infer<typeof hoursStepSchema>;

/** The Hours page of a yard: everything on one axis of quarter-hours. */
export const hoursSchema = z.object({
	yard: z.object({
		slug: z.string(),
		name: z.string(),
		timeZone: z.string(),
		/** m/s at 10 m: the hoist stops at this gust. */
		liftGust: z.number(),
		/** m/s at 10 m: a day with a gust at or over it is a high-wind day. */
		highWindGust: z.number()
	}),
	now: instant,
	/** Slot 0 starts here: local midnight of today. */
	start: instant,
	slotCount: z.int(),
	/** Local days of the axis, today first. `slots` is 92, 96 or 100. */
	days: z.array(
		z.object({ date: z.iso.date(), startSlot: z.int(), slots: z.int(), highWind: z.boolean() })
	),
	/** Index into `days` that the sentence speaks of. */
	spokenDay: z.int(),
	/** The one step the sentence is about; absent or null where it speaks of several. */
	spokenStep: z.string().nullish(),
	/** Civil dusk to dawn. */
	nights: z.array(spanSchema),
	forecast: forecastSourceSchema.nullable(),
	headline: sentenceSchema,
	subline: sentenceSchema,
	/** One value per slot. m/s and °C; precipitation in mm of the slot's hour. */
	bands: z.object({
		airTemperature: valueSeries,
		dewPoint: valueSeries,
		windSpeed: valueSeries,
		windGust: valueSeries,
		windDirection: valueSeries,
		hourlyPrecipitation: valueSeries,
		/** Spans in which the first face shown is wet with dew. */
		dew: z.array(spanSchema),
		sand: z.array(spanSchema.extend({ state: z.enum(SAND_STATES) })),
		flags: z.array(spanSchema.extend({ flag: z.enum(SLOT_FLAGS) }))
	}),
	boats: z.array(
		z.object({
			id: z.string(),
			name: z.string(),
			stand: z.string().nullable(),
			steps: z.array(hoursStepSchema)
		})
	)
});
export type Hours = z.infer<typeof hoursSchema>;
