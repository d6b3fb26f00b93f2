import type { TimeTable } from '../../times';
import { COATING_TYPES, COATINGS } from '../coatingTypes';
import { timesBefore } from '../forStep';
import type { Sheet } from '../sheet';
import { isUnder, nearestMeeting, rowAt } from './compare';
import { finding, type SheetProblem, type SheetWarning } from './problem';

type Path = readonly (string | number)[];

/** Every table of a sheet with its place. */
export function tablesOf(sheet: Sheet): { path: Path; name: string; table: TimeTable }[] {
	const own = Object.entries(sheet.times).map(([name, table]) => ({
		path: ['times', name],
		name,
		table
	}));
	const pairs = Object.entries(sheet.following ?? {}).flatMap(([next, pair]) =>
		(['overcoatMin', 'overcoatMax'] as const).flatMap((name) => {
			const table = pair?.[name];
			return table === undefined ? [] : [{ path: ['following', next, name], name, table }];
		})
	);
	return [...own, ...pairs];
}

interface Pair {
	readonly least: TimeTable | undefined;
	readonly most: TimeTable | undefined;
	/** Place of the maximum, or of what contradicts it. */
	readonly path: Path;
}

/** Windows of a sheet: overcoat in general and toward each following coating, and the launch. */
function windowsOf(sheet: Sheet): Pair[] {
	const { times } = sheet;
	const pairs = COATING_TYPES.filter((next) => sheet.following?.[next] !== undefined).map(
		(next): Pair => {
			const coat = timesBefore(sheet, next);
			const name = coat.overcoatMax === 'pair' ? 'overcoatMax' : 'overcoatMin';
			return {
				least: coat.times.overcoatMin,
				most: coat.times.overcoatMax,
				path: ['following', next, name]
			};
		}
	);
	return [
		{ least: times.overcoatMin, most: times.overcoatMax, path: ['times', 'overcoatMax'] },
		{ least: times.launchMin, most: times.launchMax, path: ['times', 'launchMax'] },
		...pairs
	];
}

/** Windows that close before they open, at any temperature of their rows. */
export function windowProblems(sheet: Sheet): SheetProblem[] {
	const closed = windowsOf(sheet).flatMap(({ least, most, path }) => {
		const meeting = nearestMeeting(least, most);
		if (meeting === null || 'apart' in meeting || !isUnder(meeting)) return [];
		return finding('maximumUnderMinimum', sheet.name, path, {
			row: rowAt(most, meeting.celsius),
			celsius: meeting.celsius,
			found: meeting.most,
			against: meeting.least,
			unit: 'min'
		});
	});
	const { induction, potLife } = sheet.times;
	const meeting = nearestMeeting(induction, potLife);
	if (meeting === null || 'apart' in meeting || meeting.most > meeting.least) return closed;
	return [
		...closed,
		finding('inductionOverPotLife', sheet.name, ['times', 'induction'], {
			row: rowAt(induction, meeting.celsius),
			celsius: meeting.celsius,
			found: meeting.least,
			against: meeting.most,
			unit: 'min'
		})
	];
}

/** Windows whose two tables share no temperature, so that neither checks the other. */
function apartWarnings(sheet: Sheet): SheetWarning[] {
	return windowsOf(sheet).flatMap(({ least, most, path }) => {
		const meeting = nearestMeeting(least, most);
		if (meeting === null || !('apart' in meeting)) return [];
		const [found, against] = meeting.apart;
		return finding('rowsDoNotMeet', sheet.name, path, { found, against, unit: '°C' });
	});
}

/** What dries first should be first: dust free, touch dry, dry to sand. */
function orderWarnings({ name, times }: Sheet): SheetWarning[] {
	return (
		[
			['dustFree', 'touchDry'],
			['touchDry', 'dryToSand']
		] as const
	).flatMap(([earlier, later]) => {
		const meeting = nearestMeeting(times[earlier], times[later]);
		if (meeting === null || 'apart' in meeting || !isUnder(meeting)) return [];
		return finding('outOfOrder', name, ['times', earlier], {
			row: rowAt(times[earlier], meeting.celsius),
			celsius: meeting.celsius,
			found: meeting.least,
			against: meeting.most,
			unit: 'min'
		});
	});
}

/** Times that lengthen as it warms: possible, and nearly always a slip. */
function lengtheningWarnings(sheet: Sheet): SheetWarning[] {
	return tablesOf(sheet).flatMap(({ path, table }) => {
		if (!Array.isArray(table)) return [];
		return table.flatMap(([, minutes], row) => {
			const before = table[row - 1]?.[1] ?? Infinity;
			if (minutes <= before) return [];
			return finding('lengthens', sheet.name, path, {
				row,
				found: minutes,
				against: before,
				unit: 'min'
			});
		});
	});
}

/** Times that a plan needs of this kind of coating and the tin does not give. */
function silentWarnings(sheet: Sheet): SheetWarning[] {
	const needed = new Set(COATINGS[sheet.type].needs);
	if ((sheet.mix?.parts.length ?? 1) > 1) needed.add('potLife');
	if (sheet.limits.rainFree === true && sheet.times.keepDry === undefined) needed.add('touchDry');
	const stated = new Set(tablesOf(sheet).map(({ name }) => name));
	return [...needed]
		.filter((name) => !stated.has(name))
		.map((name) => finding('silent', sheet.name, ['times', name]));
}

export function tableWarnings(sheet: Sheet): SheetWarning[] {
	return [
		...silentWarnings(sheet),
		...lengtheningWarnings(sheet),
		...orderWarnings(sheet),
		...apartWarnings(sheet)
	];
}
