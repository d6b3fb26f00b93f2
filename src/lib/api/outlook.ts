import { z } from 'zod';
import {
	faceSchema,
	forecastSchema,
	LIMITERS,
	looseSandSchema,
	memberSchema,
	SAND_STATES,
	shelterSchema,
	siteSchema,
	SLOT_FLAGS,
	STATES,
	STEP_FLAGS,
	stepSchema,
	usualErrorsSchema
} from '../engine';

/** Hours in a request: sixteen days, two of history and a daylight-saving hour to spare. */
const MOST_HOURS = 18 * 24 + 1;

/** An instant, ISO 8601 with seconds or without, offset or Z; becomes UTC epoch seconds. */
const instantSchema = z.iso
	.datetime({ offset: true, error: 'is not an instant like 2026-05-04T09:00:00Z' })
	.transform((text) => Math.floor(Date.parse(text) / 1000));

const { temperature, windSpeed, windDirection, precipitation } = memberSchema.required().shape;

const hourlyRequestSchema = z
	.strictObject({
		time: z.array(instantSchema).max(MOST_HOURS),
		...memberSchema.shape,
		temperature,
		windSpeed,
		windDirection,
		precipitation
	})
	.refine((hourly) => hourly.dewPoint !== undefined || hourly.relativeHumidity !== undefined, {
		error: 'needs relativeHumidity or dewPoint',
		path: ['relativeHumidity']
	});

/**
 * One step judged in a forecast, nothing stored. Units: °C, %, hPa at station level, m/s at 10 m,
 * degrees, mm, W/m², minutes, J/m²K. `null` in an array is a missing value.
 */
export const outlookRequestSchema = z.strictObject({
	site: siteSchema,
	forecast: z
		.strictObject({ issuedAt: instantSchema, hourly: hourlyRequestSchema })
		.transform((forecast): z.input<typeof forecastSchema> => forecast)
		.pipe(forecastSchema),
	face: faceSchema,
	shelter: shelterSchema.default('open'),
	looseSand: looseSandSchema.optional(),
	usualErrors: usualErrorsSchema.optional(),
	from: instantSchema.optional(),
	to: instantSchema.optional(),
	steps: z.array(stepSchema).length(1, { error: 'must hold exactly one step' })
});
export type OutlookRequest = z.infer<typeof outlookRequestSchema>;

const series = z.array(z.number().nullable());
const instant = z.iso.datetime();

/** One value per quarter-hour in every array; `null` is unknown. */
export const outlookResponseSchema = z.object({
	slots: z.object({
		/** Slot starts. */
		time: z.array(instant),
		airTemperature: series,
		dewPoint: series,
		relativeHumidity: series,
		surfaceTemperature: series,
		surfaceTemperatureSun: series,
		spread: series,
		film: series,
		windSpeed: series,
		windGust: series,
		windSpeed10: series,
		windGust10: series,
		precipitation: series,
		sand: z.array(z.enum(SAND_STATES).nullable()),
		flags: z.array(z.array(z.enum(SLOT_FLAGS)))
	}),
	steps: z.array(
		z.object({
			state: z.array(z.enum(STATES)),
			limiter: z.array(z.enum(LIMITERS)),
			room: series,
			/** Share of members; null without them. */
			chance: z.null(),
			stretches: z.array(
				z.object({
					from: instant,
					to: instant,
					lastStart: instant,
					bestStart: instant,
					room: z.number()
				})
			),
			best: z
				.object({
					start: instant,
					finish: instant,
					room: z.number(),
					limiter: z.enum(LIMITERS)
				})
				.nullable(),
			flags: z.array(z.enum(STEP_FLAGS))
		})
	)
});
export type OutlookResponse = z.infer<typeof outlookResponseSchema>;
