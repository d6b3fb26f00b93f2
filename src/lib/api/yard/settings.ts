import { z } from 'zod';
import { looseSandSchema, siteSchema, workHoursSchema } from '../../engine';
import { hoistSchema } from './hoists';
import { holidaysSchema } from './holidays';
import { shelterStockSchema } from './shelters';

/** The provider of first choice; the other stands in when it fails. */
export const PROVIDER_NAMES = ['open-meteo', 'met-norway'] as const;

/** By what a slipped launch is billed: each day, or each week begun. */
export const SLIP_UNITS = ['day', 'week'] as const;
export type SlipUnit = (typeof SLIP_UNITS)[number];

/** Fewest and most local days on the Hours page. */
export const FEWEST_DAYS = 2;
export const MOST_DAYS = 10;

const { latitude, longitude, elevation, timeZone, roughness, albedo } = siteSchema.shape;

const gust = z.number().min(3).max(40);

/**
 * What a yard's managers settle. Degrees, metres; gusts in m/s at 10 m; hours, quiet hours and
 * dates in the yard's zone; the day rate is money a day in the currency.
 */
export const yardSettingsSchema = z.strictObject({
	name: z.string().trim().min(2, 'Give the yard a name.').max(80, 'Use at most 80 characters.'),
	latitude,
	longitude,
	elevation,
	timeZone,
	roughness: roughness.unwrap(),
	albedo: albedo.unwrap(),
	workHours: workHoursSchema.max(60),
	/** When sanders and blowers are still; brushes go on. */
	quietHours: workHoursSchema.max(60),
	holidays: holidaysSchema,
	/** Null: nobody has said whether there is loose sand. */
	looseSand: looseSandSchema.nullable(),
	liftGust: gust,
	highWindGust: gust,
	hoists: z.array(hoistSchema).max(40),
	/** Null: nobody has said what there is, and every kind is thought of. */
	shelters: z.array(shelterStockSchema).max(100).nullable(),
	dayRate: z.number().min(0).max(1_000_000).nullable(),
	currency: z.string().regex(/^[A-Z]{3}$/, 'is not a currency code like EUR'),
	slipFreeDays: z.int().min(0).max(60),
	slipPer: z.enum(SLIP_UNITS),
	daysAhead: z.int().min(FEWEST_DAYS).max(MOST_DAYS),
	forecastProvider: z.enum(PROVIDER_NAMES),
	/** The ground plan: its size, and where its upper edge looks, degrees from north clockwise. */
	groundWidth: z.number().min(10).max(3_000),
	groundDepth: z.number().min(10).max(3_000),
	groundBearing: z.number().min(0).lt(360)
});
export type YardSettings = z.infer<typeof yardSettingsSchema>;

/** A change of some of them, on the revision it was drawn from. */
export const yardPatchSchema = yardSettingsSchema.partial().extend({ revision: z.int().min(1) });
export type YardPatch = z.infer<typeof yardPatchSchema>;

/** A yard as the API tells it. */
export const yardDocumentSchema = yardSettingsSchema.extend({
	slug: z.string(),
	revision: z.int()
});
export type YardDocument = z.infer<typeof yardDocumentSchema>;
