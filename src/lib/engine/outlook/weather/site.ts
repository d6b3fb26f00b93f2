import { z } from 'zod';

const isTimeZone = (name: string): boolean => {
	try {
		new Intl.DateTimeFormat('en', { timeZone: name });
		return true;
	} catch {
		return false;
	}
};

/** Ground roughness of a yard that states none, m (default, no source). */
export const DEFAULT_ROUGHNESS = 0.03;

/** Where the yard is. Degrees, metres; `roughness` in metres; `albedo` of the ground, 0 to 1. */
export const siteSchema = z.strictObject({
	latitude: z.number().min(-90).max(90),
	longitude: z.number().min(-180).max(180),
	elevation: z.number().min(-450).max(6000),
	timeZone: z.string().refine(isTimeZone, { error: 'is not an IANA time zone' }),
	roughness: z.number().min(0.0001).max(2).optional(),
	albedo: z.number().min(0).max(1).optional()
});
export type Site = z.infer<typeof siteSchema>;

/** Loose sand near the yard. Sectors in degrees the wind comes from, clockwise from `from` to `to`. */
export const looseSandSchema = z.strictObject({
	sectors: z
		.array(z.strictObject({ from: z.number().min(0).max(360), to: z.number().min(0).max(360) }))
		.max(36),
	/** mm */
	grainDiameter: z.number().min(0.05).max(2),
	clayPercent: z.number().min(0).max(60)
});
export type LooseSand = z.infer<typeof looseSandSchema>;

export const hourOfDaySchema = z
	.string()
	.regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'is not a time like 07:30');

/** Days 1 = Monday … 7; `to` at or before `from` runs past midnight and belongs to the day it starts on. */
export const workHoursSchema = z
	.array(
		z.strictObject({
			days: z.array(z.int().min(1).max(7)).min(1).max(7),
			from: hourOfDaySchema,
			to: hourOfDaySchema
		})
	)
	.max(50);
export type WorkHours = z.infer<typeof workHoursSchema>;
