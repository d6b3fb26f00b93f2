import { z } from 'zod';
import { checkUnits, formatTrouble } from '../canonical';
import { ForecastTrouble } from '../trouble';

const series = z.array(z.number().nullable());

/** The parts of Open-Meteo's JSON that are used; the same for forecast and ensemble. */
const answerSchema = z.object({
	latitude: z.number(),
	longitude: z.number(),
	elevation: z.number().optional(),
	utc_offset_seconds: z.int(),
	hourly_units: z.record(z.string(), z.string()),
	hourly: z.object({ time: z.array(z.int()).min(2) }).catchall(series)
});

export interface OpenMeteoHours {
	/** UTC epoch seconds. */
	time: number[];
	/** By Open-Meteo's own names, in the units asked for. */
	series: Map<string, (number | null)[]>;
}

/**
 * Reads the hours of an answer and checks that they are in UTC and in the units asked for.
 *
 * @param wanted - the series that must be there: name and unit
 * @param more - the unit of a further series by its name, or null where it is not wanted
 * @throws {ForecastTrouble} `wrongFormat`, `wrongUnits` or `badTimes`
 */
export function readHours(
	body: unknown,
	provider: string,
	wanted: Iterable<readonly [name: string, unit: string]>,
	more: (name: string) => string | null = () => null
): OpenMeteoHours {
	const parsed = answerSchema.safeParse(body);
	if (!parsed.success) throw formatTrouble(parsed.error, provider);
	const { hourly_units: units, utc_offset_seconds: offset } = parsed.data;
	const { time, ...rest } = parsed.data.hourly;
	if (offset !== 0)
		throw new ForecastTrouble(
			'badTimes',
			`${provider} answers ${offset} s off UTC, where UTC was asked for.`
		);
	checkUnits(units, [['time', 'unixtime']], provider);

	const expected = new Map(wanted);
	for (const name of expected.keys())
		if (rest[name] === undefined)
			throw new ForecastTrouble('wrongFormat', `${provider} left out ${name}.`);
	for (const name of Object.keys(rest)) {
		const unit = expected.get(name) ?? more(name);
		if (unit !== null) expected.set(name, unit);
	}
	const found = new Map<string, (number | null)[]>();
	for (const [name, unit] of expected) {
		const values = rest[name] ?? [];
		found.set(name, values);
		// A model without a variable sends nulls and no true unit.
		if (values.some((value) => value !== null)) checkUnits(units, [[name, unit]], provider);
	}
	return { time, series: found };
}
