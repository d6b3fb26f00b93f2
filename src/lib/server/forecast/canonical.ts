import type { z } from 'zod';
import {
	forecastSchema,
	HOURLY_VARIABLES,
	type Forecast,
	type Hourly,
	type HourlyVariable
} from '../../engine';
import { ForecastTrouble, type TroubleCode } from './trouble';

/**
 * Brings what an adapter read into the canonical forecast, or refuses it whole.
 *
 * A variable without a single value is left out: absent, not missing at every hour.
 *
 * @param provider - named in the trouble
 * @throws {ForecastTrouble} `badTimes`, `wrongLength`, `implausible` or `wrongFormat`
 */
export function toCanonical(read: Forecast, provider: string): Forecast {
	const checked = forecastSchema.safeParse(read);
	if (!checked.success) throw asTrouble(checked.error, provider);
	const { issuedAt, hourly, members } = checked.data;
	const { time, ...series } = hourly;
	return {
		issuedAt,
		hourly: { time, ...dropEmpty(series) },
		...(members === undefined || members.length === 0 ? {} : { members: members.map(dropEmpty) })
	};
}

type Series = Omit<Hourly, 'time'>;

function dropEmpty(series: Series): Series {
	const kept: Series = {};
	for (const name of HOURLY_VARIABLES) {
		const values = series[name];
		if (values?.some((value) => value !== null)) kept[name] = values;
	}
	return kept;
}

/** The path of the first issue says what is wrong: a time, a whole series or one of its values. */
function asTrouble(error: z.ZodError, provider: string): ForecastTrouble {
	const issue = error.issues[0];
	const path = issue?.path ?? [];
	const last = path.at(-1);
	const isSeries = (name: unknown): name is HourlyVariable =>
		HOURLY_VARIABLES.some((known) => known === name);
	let code: TroubleCode = 'wrongFormat';
	if (path.includes('time')) code = 'badTimes';
	else if (isSeries(last)) code = 'wrongLength';
	else if (typeof last === 'number') code = 'implausible';
	return new ForecastTrouble(
		code,
		`${provider} sent a forecast that cannot be right: ${path.join('.')} ${issue?.message ?? ''}.`,
		null,
		{ cause: error }
	);
}

/**
 * A provider's format as zod saw it fail, in one sentence.
 *
 * @param provider - named in the trouble
 */
export function formatTrouble(error: z.ZodError, provider: string): ForecastTrouble {
	const issue = error.issues[0];
	return new ForecastTrouble(
		issue?.path.includes('time') ? 'badTimes' : 'wrongFormat',
		`${provider} sent another format than documented: ${issue?.path.join('.') ?? ''}: ${issue?.message ?? ''}.`,
		null,
		{ cause: error }
	);
}

/**
 * Refuses an answer whose unit for any series is not the one asked for.
 *
 * @param declared - units as the provider declares them, by its own names
 * @param expected - units asked for, by the same names
 * @throws {ForecastTrouble} `wrongUnits`
 */
export function checkUnits(
	declared: Record<string, string>,
	expected: Iterable<readonly [name: string, unit: string]>,
	provider: string
): void {
	for (const [name, unit] of expected) {
		const found = declared[name];
		if (found !== unit)
			throw new ForecastTrouble(
				'wrongUnits',
				found === undefined
					? `${provider} does not say in which unit ${name} is.`
					: `${provider} sent ${name} in ${found} where ${unit} was asked for.`
			);
	}
}
