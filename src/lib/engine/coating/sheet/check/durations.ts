import { TIME_NAMES, type TimeName } from '../../times';
import { COATINGS } from '../coatingTypes';
import type { Sheet } from '../sheet';
import { finding, type SheetProblem } from './problem';
import { tablesOf } from './tables';

const HOUR = 60;
const DAY = 24 * HOUR;

/**
 * Minutes near 20 °C under and over which no coating sold is likely to go: `quick` for etch
 * primers, laminates and sealants. Defaults, no source: wide on purpose, so that only a slip of
 * unit falls outside.
 */
const USUAL: Readonly<Record<TimeName, { least: number; quick: number; most: number }>> = {
	potLife: { least: 15, quick: 3, most: 4 * DAY },
	induction: { least: 2, quick: 2, most: 6 * HOUR },
	dustFree: { least: 5, quick: 2, most: 2 * DAY },
	touchDry: { least: 10, quick: 2, most: 4 * DAY },
	keepDry: { least: 20, quick: 2, most: 7 * DAY },
	dryToSand: { least: 45, quick: 20, most: 21 * DAY },
	overcoatMin: { least: 30, quick: 2, most: 14 * DAY },
	overcoatMax: { least: 3 * HOUR, quick: 8, most: 3 * 365 * DAY },
	launchMin: { least: 2 * HOUR, quick: HOUR, most: 45 * DAY },
	launchMax: { least: DAY, quick: DAY, most: 10 * 365 * DAY },
	coatWithin: { least: 10, quick: 3, most: 30 * DAY }
};
const TIMES: readonly string[] = TIME_NAMES;
const isTimeName = (name: string): name is TimeName => TIMES.includes(name);

/** Times in a wrong unit: hours or days typed as minutes, or minutes typed as hours. */
export function durationProblems(sheet: Sheet): SheetProblem[] {
	const { quick: isQuick } = COATINGS[sheet.type];
	return tablesOf(sheet).flatMap(({ path, name, table }): SheetProblem[] => {
		if (table === null || !isTimeName(name)) return [];
		const rows = typeof table === 'number' ? [[20, table]] : table;
		const near = rows.reduce(
			(best, [celsius], row) =>
				Math.abs(celsius - 20) < Math.abs(rows[best][0] - 20) ? row : best,
			0
		);
		const minutes = rows[near][1];
		const { least, quick, most } = USUAL[name];
		const shortest = isQuick ? quick : least;
		const row = typeof table === 'number' ? null : near;
		const details = { row, found: minutes, unit: 'min' } as const;
		if (minutes > 0 && minutes < shortest)
			return [finding('hoursAsMinutes', sheet.name, path, { ...details, against: shortest })];
		return minutes > most
			? [finding('minutesAsHours', sheet.name, path, { ...details, against: most })]
			: [];
	});
}
