import type { Sheet } from '../sheet';
import { finding, type SheetProblem, type SheetWarning } from './problem';
import { tablesOf } from './tables';

/** How far a table is carried past its rows by the clock, K. */
const REACH = 5;

export const toCelsius = (fahrenheit: number): number => (fahrenheit - 32) / 1.8;

/** Warmer than any sheet begins at, and than any lets work go on at, °C (defaults, no source). */
const WARMEST_FIRST = 40;
const WARMEST_LAST = 60;

/** Temperatures typed in Fahrenheit: a table or limit that begins hotter than any yard. */
export function fahrenheitProblems(sheet: Sheet): SheetProblem[] {
	const asFahrenheit = (path: readonly (string | number)[], found: number, row: number | null) =>
		finding('fahrenheitAsCelsius', sheet.name, path, {
			row,
			found,
			against: toCelsius(found),
			unit: '°C'
		});
	const tables = tablesOf(sheet).flatMap(({ path, table }) => {
		if (!Array.isArray(table)) return [];
		const last = table.length - 1;
		if (table[0][0] >= WARMEST_FIRST) return [asFahrenheit(path, table[0][0], 0)];
		return table[last][0] > WARMEST_LAST ? [asFahrenheit(path, table[last][0], last)] : [];
	});
	const { airTemperature, surfaceTemperature, curing } = sheet.limits;
	const limits = (
		[
			['airTemperature', 'min', airTemperature?.min, 35],
			['airTemperature', 'max', airTemperature?.max, 50],
			['surfaceTemperature', 'min', surfaceTemperature?.min, WARMEST_FIRST],
			['surfaceTemperature', 'max', surfaceTemperature?.max, 70],
			['curing', 'min', curing?.min, 35]
		] as const
	).flatMap(([limit, end, value, warmest]) =>
		value !== undefined && value > warmest
			? [asFahrenheit(['limits', limit, end], value, null)]
			: []
	);
	return [...tables, ...limits];
}

/** The temperatures a sheet lets work go on at, °C: those of the face, else of the air. */
function workingRange({ limits }: Sheet): { from: number; to: number } {
	const { airTemperature, surfaceTemperature, curing } = limits;
	const from = surfaceTemperature?.min ?? airTemperature?.min ?? -Infinity;
	return {
		from: Math.min(from, curing?.min ?? from),
		to: surfaceTemperature?.max ?? airTemperature?.max ?? Infinity
	};
}

/**
 * Rows the sheet's limits never let a face reach, and limits that no row is near. The one row just
 * past a limit is no slip: the curve up to the limit hangs on it.
 */
export function rangeWarnings(sheet: Sheet): SheetWarning[] {
	const { from, to } = workingRange(sheet);
	const tables = tablesOf(sheet);
	const outside = tables.flatMap(({ path, table }) => {
		if (!Array.isArray(table)) return [];
		return table.flatMap(([celsius], row) => {
			const isBelow = celsius < from && !(table[row + 1]?.[0] > from);
			const isAbove = celsius > to && !(table[row - 1]?.[0] < to);
			if (!isBelow && !isAbove) return [];
			return finding('rowOutsideLimits', sheet.name, path, {
				row,
				found: celsius,
				against: isBelow ? from : to,
				unit: '°C'
			});
		});
	});
	const past = tables.flatMap(({ path, table }) => {
		if (!Array.isArray(table) || table.length < 2) return [];
		const [first, last] = [table[0][0], table[table.length - 1][0]];
		const ends: [number, number][] = [];
		if (Number.isFinite(from) && from < first - REACH) ends.push([from, first]);
		if (Number.isFinite(to) && to > last + REACH) ends.push([to, last]);
		return ends.map(([found, against]) =>
			finding('limitsPastRows', sheet.name, path, { found, against, unit: '°C' })
		);
	});
	return [...outside, ...past];
}
