import { z } from 'zod';

/**
 * One variable over the hours of a forecast; `null` is a missing value.
 * Every array of a forecast has one value per entry of `time`.
 */
const series = z.array(z.number().nullable());

/** Hourly variables of the canonical forecast and their plausible ranges (values outside are refused). */
export const HOURLY_RANGES = {
	temperature: [-80, 60],
	dewPoint: [-90, 45],
	relativeHumidity: [0, 105],
	pressure: [450, 1090],
	windSpeed: [0, 90],
	windGust: [0, 130],
	windDirection: [0, 360],
	precipitation: [0, 500],
	precipitationProbability: [0, 100],
	cloudCover: [0, 100],
	ghi: [0, 1600],
	dni: [0, 1500],
	dhi: [0, 1200]
} as const satisfies Record<string, readonly [number, number]>;
export type HourlyVariable = keyof typeof HOURLY_RANGES;
export const HOURLY_VARIABLES = Object.keys(HOURLY_RANGES) as HourlyVariable[];

const variables = Object.fromEntries(
	HOURLY_VARIABLES.map((name) => [name, series.optional()])
) as Record<HourlyVariable, z.ZodOptional<typeof series>>;

/**
 * The canonical hourly forecast.
 *
 * `time` is whole hours in UTC epoch seconds, strictly increasing; spacing wider than an hour is a
 * coarser stretch of the provider. Instants (temperature, dew point, pressure, wind, direction,
 * cloud) are at the stamp; gust, precipitation and its probability, and the irradiances belong to
 * the period that ends at the stamp (since the stamp before).
 *
 * Units: °C, %, hPa at station level, m/s at 10 m, degrees from north the wind comes from, mm,
 * %, % of sky, W/m².
 */
export const hourlySchema = z.object({ time: z.array(z.int()), ...variables });
export type Hourly = z.infer<typeof hourlySchema>;

/** A member shares the times of `hourly`; what it lacks comes from `hourly`. */
export const memberSchema = hourlySchema.omit({ time: true });
export type Member = z.infer<typeof memberSchema>;

export const forecastSchema = z
	.object({
		/** UTC epoch seconds; hours before it are history. */
		issuedAt: z.int(),
		hourly: hourlySchema,
		members: z.array(memberSchema).optional()
	})
	.superRefine((forecast, context) => {
		const { time } = forecast.hourly;
		const refuse = (path: (string | number)[], message: string) =>
			context.addIssue({ code: 'custom', path, message });
		if (time.length < 2) refuse(['hourly', 'time'], 'fewer than two hours');
		time.forEach((t, i) => {
			if (t % 3600 !== 0) refuse(['hourly', 'time', i], 'is not on a whole hour');
			if (i > 0 && t <= (time[i - 1] ?? 0))
				refuse(['hourly', 'time', i], 'is not after the hour before it');
		});
		const check = (values: Member, path: (string | number)[]) => {
			for (const name of HOURLY_VARIABLES) {
				const array = values[name];
				if (array === undefined) continue;
				if (array.length !== time.length)
					refuse([...path, name], `has ${array.length} values for ${time.length} hours`);
				const [least, most] = HOURLY_RANGES[name];
				array.forEach((value, i) => {
					if (value !== null && (value < least || value > most))
						refuse([...path, name, i], `${value} is outside ${least} to ${most}`);
				});
			}
		};
		check(forecast.hourly, ['hourly']);
		forecast.members?.forEach((member, i) => check(member, ['members', i]));
	});
export type Forecast = z.infer<typeof forecastSchema>;
