import { z } from 'zod';

/**
 * The parts of Locationforecast 2.0 "complete" that are used: GeoJSON, described in MET Norway's
 * "General point forecast JSON format" and "Locationforecast data model". Values that a region or
 * a lead does not have are left out.
 */
const value = z.number().nullish();

const periodSchema = z
	.object({
		details: z
			.object({ precipitation_amount: value, probability_of_precipitation: value })
			.optional()
	})
	.optional();

/** Always UTC, "2020-06-10T13:00:00Z"; an offset is not in the format. */
const instant = z.iso.datetime();

export const entrySchema = z.object({
	time: instant,
	data: z.object({
		instant: z.object({
			details: z.object({
				air_temperature: value,
				dew_point_temperature: value,
				relative_humidity: value,
				air_pressure_at_sea_level: value,
				wind_speed: value,
				wind_speed_of_gust: value,
				wind_from_direction: value,
				cloud_area_fraction: value
			})
		}),
		next_1_hours: periodSchema,
		next_6_hours: periodSchema,
		next_12_hours: periodSchema
	})
});
export type Entry = z.infer<typeof entrySchema>;

export const answerSchema = z.object({
	type: z.literal('Feature'),
	geometry: z.object({
		type: z.literal('Point'),
		coordinates: z.array(z.number()).min(2).max(3)
	}),
	properties: z.object({
		meta: z.object({ updated_at: instant, units: z.record(z.string(), z.string()) }),
		timeseries: z.array(entrySchema).min(2)
	})
});

/** Units of the values used, as the data model states them. */
export const UNITS: Record<string, string> = {
	air_temperature: 'celsius',
	dew_point_temperature: 'celsius',
	relative_humidity: '%',
	air_pressure_at_sea_level: 'hPa',
	wind_speed: 'm/s',
	wind_speed_of_gust: 'm/s',
	wind_from_direction: 'degrees',
	cloud_area_fraction: '%',
	precipitation_amount: 'mm',
	probability_of_precipitation: '%'
};
