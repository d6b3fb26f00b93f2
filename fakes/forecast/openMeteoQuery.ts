import { z } from 'zod';
import { VARIABLES } from './openMeteoUnits';

const number = (name: string, least: number, most: number) =>
	z.coerce
		.number({ error: `Parameter '${name}' must be a number.` })
		.refine((value) => value >= least && value <= most, {
			error: `${name} must be in range of ${least} to ${most}.`
		});

const variables = z
	.string({ error: "Parameter 'hourly' is needed by this fake." })
	.transform((list) => list.split(',').filter((name) => name !== ''))
	.superRefine((names, context) => {
		for (const name of names)
			if (!(name in VARIABLES))
				context.addIssue(
					`Data corrupted at path ''. Cannot initialize variable from invalid String value ${name}.`
				);
	});

/** Query of both endpoints, with the service's own defaults. */
const querySchema = z.object({
	latitude: number('latitude', -90, 90),
	longitude: number('longitude', -180, 180),
	elevation: z.coerce.number().optional(),
	hourly: variables,
	temperature_unit: z.enum(['celsius', 'fahrenheit']).default('celsius'),
	wind_speed_unit: z.enum(['kmh', 'ms', 'mph', 'kn']).default('kmh'),
	precipitation_unit: z.enum(['mm', 'inch']).default('mm'),
	timeformat: z.enum(['iso8601', 'unixtime']).default('iso8601'),
	timezone: z.string().default('GMT').refine(isTimeZone, { error: 'Invalid timezone' }),
	past_days: number('Past days', 0, 92).default(0),
	forecast_days: number('Forecast days', 0, 35).default(7),
	models: z.string().optional()
});
export type Query = z.infer<typeof querySchema>;

function isTimeZone(name: string): boolean {
	try {
		new Intl.DateTimeFormat('en', { timeZone: name });
		return true;
	} catch {
		return false;
	}
}

/** @returns the query, or the reason the service would give for refusing it */
export function readQuery(params: URLSearchParams, mostDays: number): Query | string {
	const parsed = querySchema.safeParse(Object.fromEntries(params));
	if (!parsed.success) return parsed.error.issues[0]?.message ?? 'Bad request';
	if (parsed.data.forecast_days > mostDays)
		return `Forecast days is invalid. Allowed range 0 to ${mostDays}.`;
	return parsed.data;
}
