import { z } from 'zod';
import { orderedSchema } from './range';

const windLimit = z.strictObject({ max: z.number().min(0).max(60) });

/**
 * The limits of a step, from the tin's sheet or the yard's rule. Each is optional; an absent
 * limit is silent and never shuts an hour.
 *
 * Units: °C, % relative humidity, K of spread, m/s at `windHeight` metres (2 when absent).
 */
export const limitsSchema = z.strictObject({
	airTemperature: orderedSchema(-40, 60).optional(),
	surfaceTemperature: orderedSchema(-40, 90).optional(),
	relativeHumidity: orderedSchema(0, 100).optional(),
	/** Surface temperature minus dew point; `untilDry` keeps the least until touch dry. */
	spread: z
		.strictObject({ min: z.number().min(0).max(20), untilDry: z.boolean().optional() })
		.optional(),
	wind: windLimit.optional(),
	gust: windLimit.optional(),
	windHeight: z.number().min(0.5).max(60).optional(),
	rainFree: z.boolean().optional(),
	drySurface: z.boolean().optional(),
	noDirectSun: z.boolean().optional(),
	/** `falling`: the surface may not rise; `rising`: it may not fall. */
	surfaceTrend: z.enum(['falling', 'rising']).optional(),
	daylight: z.boolean().optional(),
	sand: z.enum(['none']).optional(),
	/** Least surface temperature while the coat cures. */
	curing: z.strictObject({ min: z.number().min(-40).max(60) }).optional()
});
export type Limits = z.infer<typeof limitsSchema>;
