import { sheetSchema, type Sheet } from '../sheet';
import { durationProblems } from './durations';
import { filmProblems, filmWarnings } from './film';
import type { SheetProblem, SheetWarning } from './problem';
import { findingSentence } from './sentence';
import { shapeProblems } from './shape';
import { tableWarnings, windowProblems } from './tables';
import { fahrenheitProblems, rangeWarnings } from './temperatures';

export interface SheetCheck {
	readonly problems: readonly SheetProblem[];
	readonly warnings: readonly SheetWarning[];
}

/**
 * What is wrong with a sheet of the right shape, and what a person should look at again. Units
 * first: where one is mixed up, what follows from its numbers is not told too.
 */
export function checkSheet(sheet: Sheet): SheetCheck {
	const units = [...fahrenheitProblems(sheet), ...durationProblems(sheet)];
	const problems = [...(units.length > 0 ? units : windowProblems(sheet)), ...filmProblems(sheet)];
	if (problems.length > 0) return { problems, warnings: [] };
	return {
		problems,
		warnings: [...tableWarnings(sheet), ...rangeWarnings(sheet), ...filmWarnings(sheet)]
	};
}

export interface SheetReading extends SheetCheck {
	/** The sheet; null where a problem refuses it. */
	readonly sheet: Sheet | null;
}

const nameOf = (input: unknown): string =>
	typeof input === 'object' && input !== null && 'name' in input && typeof input.name === 'string'
		? input.name.slice(0, 200)
		: '';

/** Reads anything as a sheet: the sheet or the problems that refuse it, never an exception. */
export function readSheet(input: unknown): SheetReading {
	const parsed = sheetSchema.safeParse(input);
	if (!parsed.success) {
		const name = nameOf(input);
		const problems = parsed.error.issues.flatMap((issue) => shapeProblems(issue, name, input));
		return { sheet: null, problems, warnings: [] };
	}
	const check = checkSheet(parsed.data);
	return { sheet: check.problems.length === 0 ? parsed.data : null, ...check };
}

/** The sheet's schema with its checks, for larger schemas: each issue in the same sentence. */
export const checkedSheetSchema = sheetSchema.superRefine((sheet, context) => {
	for (const problem of checkSheet(sheet).problems)
		context.addIssue({
			code: 'custom',
			path: [...problem.path, ...(problem.row === null ? [] : [problem.row])],
			message: findingSentence(problem),
			params: { code: problem.code }
		});
});
