import { z } from 'zod';
import { leeSchema } from './lee';
import { FINISHES, MATERIALS, SHELTERS } from '../../vocabulary';

/**
 * One side of a boat, as the heat balance sees it.
 *
 * `tilt` 0 faces up, 90 stands upright, 180 faces down; `azimuth` is where it looks, degrees from
 * north clockwise. `heatCapacity` in J/m²K, `inside.u` in W/m²K, `inside.temperature` in °C.
 * `material` and `finish` may stand for heat capacity, nodes and run-off depth.
 */
export const faceSchema = z
	.strictObject({
		tilt: z.number().min(0).max(180),
		azimuth: z.number().min(0).max(360),
		solarAbsorptance: z.number().min(0).max(1),
		emissivity: z.number().min(0).max(1),
		heatCapacity: z.number().min(500).max(5_000_000).optional(),
		material: z.enum(MATERIALS).optional(),
		finish: z.enum(FINISHES).optional(),
		inside: z
			.strictObject({
				u: z.number().min(0).max(50),
				temperature: z.number().min(-40).max(60).optional()
			})
			.optional(),
		/** Two-sided parts (rudder, keel, drive leg, propeller): both sides are run, the worse binds. */
		bothSides: z.boolean().optional(),
		/** From where the wind is broken at the stand; absent: from nowhere. */
		lee: leeSchema.optional()
	})
	.refine((face) => face.heatCapacity !== undefined || face.material !== undefined, {
		error: 'needs heatCapacity or material',
		path: ['heatCapacity']
	});
export type Face = z.infer<typeof faceSchema>;

/** How a shelter changes what the face meets; factors on wind, sun and sky seen (1 = open). */
export const shelterFactorsSchema = z.strictObject({
	wind: z.number().min(0).max(1),
	sun: z.number().min(0).max(1),
	sky: z.number().min(0).max(1),
	rain: z.boolean(),
	dust: z.boolean(),
	/** Warming of the air at the face, K; `sunHeat` is K at 1000 W/m² of global irradiance. */
	heat: z.number().min(-10).max(30),
	sunHeat: z.number().min(0).max(30).optional(),
	/** Moisture added to (or taken from) the air at the face, hPa of vapour pressure. */
	vapour: z.number().min(-10).max(20)
});
export type ShelterFactors = z.infer<typeof shelterFactorsSchema>;

export const shelterSchema = z.union([z.enum(SHELTERS), shelterFactorsSchema]);
export type Shelter = z.infer<typeof shelterSchema>;
