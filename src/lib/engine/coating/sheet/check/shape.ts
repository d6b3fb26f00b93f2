import type { z } from 'zod';
import { finding, type ProblemUnit, type SheetProblem } from './problem';
import { toCelsius } from './temperatures';

type Issue = z.core.$ZodIssue;
type Path = readonly (string | number)[];

const TABLES = ['times', 'following'];

/** The value at a path of anything typed; undefined where there is none. */
function valueAt(input: unknown, path: Path): unknown {
	let value = input;
	for (const key of path) {
		if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
		const inner: unknown = Reflect.get(value, key);
		value = inner;
	}
	return value;
}

function kindOf(value: unknown): string {
	if (value === null) return 'nothing';
	if (Array.isArray(value)) return `a list of ${value.length}`;
	if (typeof value === 'string') return `“${value.slice(0, 40)}”`;
	return typeof value === 'number' ? String(value) : `a ${typeof value}`;
}

const WANTED: Readonly<Record<string, string>> = {
	number: 'a number',
	string: 'a text',
	boolean: 'yes or no',
	array: 'a list',
	tuple: 'a temperature and a time',
	object: 'a group of fields',
	record: 'a group of fields'
};

/** Place and row of an issue: a number after a table's name is a row, what follows its column. */
function placeOf(path: Path): { place: Path; row: number | null; column: number | null } {
	const isTable = TABLES.includes(String(path[0]));
	const at = path.findIndex((part, i) => i > 1 && typeof part === 'number');
	if (!isTable || at === -1) return { place: path, row: null, column: null };
	const [row, column] = [path[at], path[at + 1]];
	return {
		place: path.slice(0, at),
		row: typeof row === 'number' ? row : null,
		column: typeof column === 'number' ? column : null
	};
}

/** The issues of the branch of a union that the typed value was meant for. */
function branchOf(issue: Extract<Issue, { code: 'invalid_union' }>, value: unknown): Issue[] {
	const nth = Array.isArray(value) ? 0 : typeof value === 'number' ? 1 : -1;
	return issue.errors[nth] ?? [];
}

function unitOf(path: Path, column: number | null): ProblemUnit {
	const names = path.map(String);
	if (column === 0 || names.some((name) => /temperature$|^curing$/i.test(name))) return '°C';
	if (TABLES.includes(names[0])) return 'min';
	return names.some((name) => /^(relativeHumidity|solids|loss|percent)$/.test(name)) ? '%' : null;
}

/** A number past its bound, or a list or text too long or short. */
function rangeProblem(
	issue: Extract<Issue, { code: 'too_big' | 'too_small' }>,
	sheet: string,
	path: Path,
	value: unknown
): SheetProblem {
	const { place, row, column } = placeOf(path);
	const isOver = issue.code === 'too_big';
	const bound = Number(isOver ? issue.maximum : issue.minimum);
	if (typeof value !== 'number')
		return finding('wrongType', sheet, place, {
			row,
			found: kindOf(value),
			against: `${isOver ? 'at most' : 'at least'} ${bound} ${Array.isArray(value) ? 'entries' : 'letters'}`
		});
	const unit = unitOf(path, column);
	const celsius = toCelsius(value);
	if (unit === '°C' && isOver && celsius <= bound)
		return finding('fahrenheitAsCelsius', sheet, place, {
			row,
			found: value,
			against: celsius,
			unit
		});
	return finding(isOver ? 'tooMuch' : 'tooLittle', sheet, place, {
		row,
		found: value,
		against: bound,
		unit
	});
}

function customProblem(
	issue: Extract<Issue, { code: 'custom' }>,
	sheet: string,
	path: Path
): SheetProblem {
	const { place, row } = placeOf(path);
	const { code, found, against } = issue.params ?? {};
	const numbers = { row, found: Number(found), against: Number(against) };
	return code === 'notRising'
		? finding('notRising', sheet, place, { ...numbers, unit: '°C' })
		: finding('leastOverMost', sheet, place, numbers);
}

/**
 * An issue of the sheet's schema as problems of the sheet, in the same words as every other.
 *
 * @param input - what was typed, whole
 */
export function shapeProblems(
	issue: Issue,
	sheet: string,
	input: unknown,
	before: Path = []
): SheetProblem[] {
	const path: Path = [
		...before,
		...issue.path.map((part) => (typeof part === 'number' ? part : String(part)))
	];
	const { place, row } = placeOf(path);
	const value = valueAt(input, path);
	const wrong = (against: string): SheetProblem[] => [
		finding('wrongType', sheet, place, { row, found: kindOf(value), against })
	];
	switch (issue.code) {
		case 'invalid_type':
			return value === undefined
				? [finding('missing', sheet, place, { row })]
				: wrong(WANTED[issue.expected] ?? issue.expected);
		case 'too_big':
		case 'too_small':
			return [rangeProblem(issue, sheet, path, value)];
		case 'invalid_value':
			return [
				value === undefined
					? finding('missing', sheet, place, { row })
					: finding('notOneOf', sheet, place, {
							row,
							found: kindOf(value),
							against: issue.values.map(String).join(', ')
						})
			];
		case 'unrecognized_keys':
			return issue.keys.map((key) =>
				finding('unknownField', sheet, place, { row, found: key.slice(0, 60) })
			);
		case 'invalid_key':
			return [
				finding('unknownField', sheet, place.slice(0, -1), {
					found: String(path.at(-1)).slice(0, 60)
				})
			];
		case 'invalid_union': {
			if (value === undefined) return [finding('missing', sheet, place, { row })];
			const inner = branchOf(issue, value);
			if (inner.length > 0) return inner.flatMap((it) => shapeProblems(it, sheet, input, path));
			return wrong(
				TABLES.includes(String(path[0]))
					? 'a table of temperatures and times, one time or “no limit”'
					: 'one of the ways the sheet knows'
			);
		}
		case 'custom':
			return [customProblem(issue, sheet, path)];
		case 'invalid_format':
			return wrong(`a ${issue.format}`);
		case 'invalid_element':
		case 'not_multiple_of':
			return wrong('something else');
	}
}
