import { z } from 'zod';
import { HAZARDS } from '../hazards';
import { limitsSchema } from '../limits';
import { layingMethodSchema } from '../methodWind';
import { timesSchema, timeTableSchema } from '../times';
import { COATING_TYPES } from './coatingTypes';
import { filmSchema, thinnerSchema } from './film';
import { maximumPassedSchema } from './maximumPassed';
import { mixRatioSchema } from './mixRatio';
import { SUBSTRATES } from './substrates';

/** What in the tin its neighbours must know of. */
export const CONTENTS = [
	'cuprousOxide',
	'metallicCopper',
	'copperThiocyanate',
	'zincDust',
	'strongSolvent'
] as const;
export type Content = (typeof CONTENTS)[number];

const windWord = z.strictObject({
	/** m/s at the limits' wind height. */
	wind: z.number().min(0).max(60).optional(),
	gust: z.number().min(0).max(60).optional()
});

/** Overcoat times toward one following kind of coating; what is absent holds as for the sheet. */
const followingSchema = z.strictObject({
	overcoatMin: timeTableSchema.optional(),
	overcoatMax: timeTableSchema.optional(),
	whenMaximumPassed: maximumPassedSchema.optional()
});
export type Following = z.infer<typeof followingSchema>;

/**
 * A coating's data sheet as one model. What the tin is silent about is absent; a time of `null`
 * says that the tin sets no limit. Units: °C, minutes, %, µm, m²/L, L, m/s, kg/L.
 */
export const sheetSchema = z.strictObject({
	name: z.string().min(1).max(200),
	type: z.enum(COATING_TYPES),
	/** A sample is generic and is to be checked against the tin. */
	sample: z.boolean(),
	/** Date of issue printed on the tin's own sheet, ISO 8601. */
	issuedOn: z.iso.date().optional(),
	mix: mixRatioSchema.optional(),
	film: filmSchema.optional(),
	/** Litres in each size of tin or kit sold. */
	tinLitres: z.array(z.number().positive().max(1000)).min(1).max(12).optional(),
	thinner: thinnerSchema.optional(),
	hazards: z.array(z.enum(HAZARDS)).max(HAZARDS.length),
	/** What the tin says it may be laid on; absent is silent. */
	substrates: z.array(z.enum(SUBSTRATES)).max(SUBSTRATES.length).optional(),
	contains: z.array(z.enum(CONTENTS)).max(CONTENTS.length).optional(),
	limits: limitsSchema,
	/** Most wind by method; stands over the limits' own. */
	wind: z.partialRecord(layingMethodSchema, windWord).optional(),
	times: timesSchema,
	following: z.partialRecord(z.enum(COATING_TYPES), followingSchema).optional(),
	whenMaximumPassed: maximumPassedSchema.optional()
});
export type Sheet = z.infer<typeof sheetSchema>;
