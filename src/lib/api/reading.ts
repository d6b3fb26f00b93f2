import { z } from 'zod';
import { LIMITERS, LIMIT_NAMES, LIMIT_UNITS, ORIGINS, PHASES, STATES } from '../engine';

/** One row of a reading: a limit, its value, the room and where the number is from. */
export const limitReadingSchema = z.object({
	limit: z.enum(LIMIT_NAMES),
	limiter: z.enum(LIMITERS),
	phase: z.enum(PHASES),
	face: z.string(),
	value: z.number().nullable(),
	bound: z.number().nullable(),
	side: z.enum(['least', 'most', 'in']),
	unit: z.enum(LIMIT_UNITS),
	room: z.number().nullable(),
	scaledRoom: z.number().nullable(),
	holds: z.boolean(),
	origin: z.enum(ORIGINS),
	at: z.iso.datetime(),
	/** The usual error of this quantity at this lead, in `unit`; null for in/out limits. */
	usualError: z.number().nullable()
});

/** Every limit of one step at one quarter-hour, least room first. */
export const readingSchema = z.object({
	stepId: z.string(),
	slotStart: z.iso.datetime(),
	timeZone: z.string(),
	state: z.enum(STATES),
	limiter: z.enum(LIMITERS),
	room: z.number().nullable(),
	/** What the reading says in a sentence, in the yard's zone. */
	title: z.string(),
	detail: z.string(),
	missing: z.array(z.string()),
	limits: z.array(limitReadingSchema),
	forecast: z.object({
		provider: z.string(),
		issuedAt: z.iso.datetime(),
		ageMinutes: z.int(),
		stale: z.boolean()
	})
});
export type Reading = z.infer<typeof readingSchema>;
export type LimitReadingRow = z.infer<typeof limitReadingSchema>;

/** What a reading is asked with: any instant in the quarter-hour, ISO 8601 with its offset. */
export const readingQuerySchema = z.object({
	at: z.iso.datetime({ offset: true, error: 'is not an instant like 2026-05-04T09:45:00Z' })
});
