import { z } from 'zod';
import {
	faceSchema,
	forecastSchema,
	launchWishSchema,
	looseSandSchema,
	memberSchema,
	SHELTERS,
	shelterSchema,
	siteSchema,
	stepSchema,
	surfaceReadingSchema,
	usualErrorsSchema
} from '../../engine';

/** Hours in a request: sixteen days, two of history and a daylight-saving hour to spare. */
const MOST_HOURS = 18 * 24 + 1;
const HOUR = 3600;
/** How far outside the forecast an answer may be asked for, hours. */
const BEYOND_HOURS = 48;
const MOST_MEMBERS = 60;
const MOST_STEPS = 24;

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

/** A step whose start is fixed has `startAt`; one that is done and logged `finishedAt` too. */
const stepRequestSchema = stepSchema
	.extend({ startAt: instantSchema.optional(), finishedAt: instantSchema.optional() })
	.refine((step) => step.finishedAt === undefined || step.startAt !== undefined, {
		error: 'needs startAt, when the step began',
		path: ['startAt']
	})
	.refine(
		({ startAt, finishedAt }) =>
			startAt === undefined || finishedAt === undefined || finishedAt > startAt,
		{ error: 'is not after startAt', path: ['finishedAt'] }
	);

/**
 * A chain of steps judged in a forecast and its members, nothing stored. Units: °C, %, hPa at
 * station level, m/s at 10 m, degrees, mm, W/m², minutes, J/m²K. `null` in an array is a missing
 * value.
 */
export const outlookRequestSchema = z
	.strictObject({
		site: siteSchema,
		forecast: z
			.strictObject({
				issuedAt: instantSchema,
				hourly: hourlyRequestSchema,
				members: z.array(memberSchema.strict()).max(MOST_MEMBERS).optional()
			})
			.transform((forecast): z.input<typeof forecastSchema> => forecast)
			.pipe(forecastSchema),
		face: faceSchema,
		shelter: shelterSchema.default('open'),
		/** Shelters that could be put up, for what would open a shut run; absent: every kind. */
		shelters: z.array(z.enum(SHELTERS)).max(SHELTERS.length).optional(),
		looseSand: looseSandSchema.optional(),
		usualErrors: usualErrorsSchema.optional(),
		readings: z
			.array(surfaceReadingSchema.extend({ time: instantSchema }))
			.max(5_000)
			.optional(),
		from: instantSchema.optional(),
		to: instantSchema.optional(),
		steps: z.array(stepRequestSchema).min(1).max(MOST_STEPS),
		launchBy: instantSchema.optional(),
		launchSlots: z
			.array(instantSchema)
			.max(2_000)
			.optional()
			.describe(
				'Bookable times of the hoist. Where any are stated, a step of kind `launch` starts at one of them and at no other time, in every plan; its `state`, `stretches` and `best` are weather and hours alone. Without slots it may start in any workable quarter-hour.'
			),
		dayRate: launchWishSchema.shape.dayRate,
		currency: z.string().max(20).optional()
	})
	.superRefine(({ forecast, from, to }, context) => {
		const { time } = forecast.hourly;
		const first = time[0];
		const last = time[time.length - 1];
		const refuse = (path: (string | number)[], message: string) => {
			context.addIssue({ code: 'custom', path, message });
		};
		if (last - first > (MOST_HOURS - 1) * HOUR)
			refuse(
				['forecast', 'hourly', 'time', time.length - 1],
				`is ${Math.round((last - first) / HOUR)} hours after the first: at most ${MOST_HOURS - 1}`
			);
		for (const [name, instant] of [
			['from', from],
			['to', to]
		] as const) {
			if (instant === undefined) continue;
			if (instant < first - BEYOND_HOURS * HOUR || instant > last + BEYOND_HOURS * HOUR)
				refuse([name], `is more than ${BEYOND_HOURS} hours outside the forecast`);
		}
	});
export type OutlookRequest = z.infer<typeof outlookRequestSchema>;
