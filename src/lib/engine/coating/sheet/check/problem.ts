/** What can be wrong with a sheet so that it is refused. */
export const PROBLEM_CODES = [
	'missing',
	'wrongType',
	'unknownField',
	'notOneOf',
	'tooMuch',
	'tooLittle',
	'notRising',
	'leastOverMost',
	'maximumUnderMinimum',
	'inductionOverPotLife',
	'hoursAsMinutes',
	'minutesAsHours',
	'fahrenheitAsCelsius',
	'filmUnit',
	'fractionForPercent',
	'spreadAgainstFilm',
	'wetThinnerThanDry'
] as const;
export type ProblemCode = (typeof PROBLEM_CODES)[number];

/** What a person should look at again; the sheet stands. */
export const WARNING_CODES = [
	'silent',
	'lengthens',
	'rowOutsideLimits',
	'limitsPastRows',
	'rowsDoNotMeet',
	'outOfOrder',
	'spreadOffFilm',
	'wetOffFilm'
] as const;
export type WarningCode = (typeof WARNING_CODES)[number];

export type ProblemUnit = '°C' | 'min' | 'µm' | 'm²/L' | '%' | null;

/**
 * One finding on a sheet, with everything a sentence about it needs.
 *
 * @template C - ProblemCode where it refuses the sheet, WarningCode where it does not
 */
export interface SheetFinding<C extends ProblemCode | WarningCode = ProblemCode | WarningCode> {
	readonly code: C;
	/** Name of the sheet; empty where it has none yet. */
	readonly sheet: string;
	/** Where it stands in the sheet, as a JSON pointer's parts. */
	readonly path: readonly (string | number)[];
	/** Row of the table, counted from 0; null where it is the table or no table. */
	readonly row: number | null;
	/** °C at which two tables were compared; null where they were not. */
	readonly celsius: number | null;
	/** What stands there, and what it is held against. */
	readonly found: number | string | null;
	readonly against: number | string | null;
	readonly unit: ProblemUnit;
}
export type SheetProblem = SheetFinding<ProblemCode>;
export type SheetWarning = SheetFinding<WarningCode>;

type Details = Partial<Omit<SheetFinding, 'code' | 'sheet' | 'path'>>;

/** A finding with nothing said but what is given. */
export function finding<C extends ProblemCode | WarningCode>(
	code: C,
	sheet: string,
	path: readonly (string | number)[],
	{ row = null, celsius = null, found = null, against = null, unit = null }: Details = {}
): SheetFinding<C> {
	return { code, sheet, path, row, celsius, found, against, unit };
}
