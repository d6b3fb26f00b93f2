import { z } from 'zod';
import { limitsSchema } from '../../coating/limits';
import { timesSchema } from '../../coating/times';
import { METHODS, STEP_KINDS } from '../../vocabulary';
import { workHoursSchema } from '../weather/site';

/** One step as the engine judges it. `workHours` absent: no hours limit; empty: never. */
export const stepSchema = z.strictObject({
	name: z.string().max(200),
	kind: z.enum(STEP_KINDS),
	durationMinutes: z
		.number()
		.positive()
		.max(14 * 1440),
	method: z.enum(METHODS),
	workHours: workHoursSchema.optional(),
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
