import { z } from 'zod';
import { limitsSchema } from '../../coating/limits';
import { timesSchema } from '../../coating/times';
import { METHODS, STEP_KINDS } from '../../vocabulary';
import { workHoursSchema } from '../weather/site';

/** Spans in which nobody works: holidays, absences. UTC epoch seconds, [from, to). */
export const closedSpansSchema = z
	.array(
		z
			.strictObject({ from: z.int(), to: z.int() })
			.refine(({ from, to }) => from < to, { error: 'must end after it begins' })
	)
	.max(2_000);
export type ClosedSpans = z.infer<typeof closedSpansSchema>;

/**
 * One step as the engine judges it. `workHours` absent: no hours limit; empty: never. `closed` takes
 * hours away from them, or from all hours.
 */
export const stepSchema = z.strictObject({
	name: z.string().max(200),
	kind: z.enum(STEP_KINDS),
	durationMinutes: z
		.number()
		.positive()
		.max(14 * 1440),
	method: z.enum(METHODS),
	workHours: workHoursSchema.optional(),
	closed: closedSpansSchema.optional(),
	limits: limitsSchema,
	times: timesSchema
});
export type Step = z.infer<typeof stepSchema>;

const byLead = z.tuple([z.number().positive(), z.number().positive(), z.number().positive()]);

/** Usual forecast errors at leads of 24, 48 and 72 h, in each quantity's own unit. */
export const usualErrorsSchema = z.strictObject({
	airTemperature: byLead.optional(),
	dewPoint: byLead.optional(),
	surfaceTemperature: byLead.optional(),
	spread: byLead.optional(),
	relativeHumidity: byLead.optional(),
	wind: byLead.optional(),
	gust: byLead.optional()
});
export type UsualErrors = z.infer<typeof usualErrorsSchema>;
