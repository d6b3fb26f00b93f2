import { minutesAt, timeCurve } from '../../curve';
import type { TimeTable } from '../../times';

/** Two tables at one temperature, minutes. */
export interface Meeting {
	/** °C; null where neither depends on it. */
	readonly celsius: number | null;
	readonly least: number;
	readonly most: number;
}

const KELVIN = 273.15;
const celsiusOf = (table: Exclude<TimeTable, null>): number[] =>
	timeCurve(table).kelvin.map((kelvin) => kelvin - KELVIN);

/**
 * Where two tables are nearest to crossing: the temperature at which `most` is the least multiple
 * of `least`, over the temperatures both have rows for. Between rows ln τ of both is linear in 1/T,
 * so their ratio is least at a row of one of them and no temperature between is missed.
 *
 * @returns `apart` with the nearest ends where they share no temperature; null where one sets no
 * limit or is silent
 */
export function nearestMeeting(
	least: TimeTable | undefined,
	most: TimeTable | undefined
): Meeting | { readonly apart: readonly [number, number] } | null {
	if (least === undefined || least === null || most === undefined || most === null) return null;
	const [leastRows, mostRows] = [celsiusOf(least), celsiusOf(most)];
	const ranges = [leastRows, mostRows].filter((rows) => rows.length > 1);
	if (ranges.length === 0) {
		const [one, other] = [minutesAt(least, 20, 'earliest'), minutesAt(most, 20, 'earliest')];
		return { celsius: null, least: one, most: other };
	}
	const from = Math.max(...ranges.map((rows) => rows[0]));
	const to = Math.min(...ranges.map((rows) => rows[rows.length - 1]));
	if (from > to) return { apart: [from, to] };
	const meetings = ranges
		.flat()
		.filter((celsius) => celsius >= from && celsius <= to)
		.map((celsius) => ({
			celsius: Number(celsius.toFixed(6)),
			least: minutesAt(least, celsius, 'earliest'),
			most: minutesAt(most, celsius, 'earliest')
		}));
	return meetings.reduce((worst, it) =>
		it.most * worst.least < worst.most * it.least ? it : worst
	);
}

/** Rounding of an exponential; nearer than this counts as equal. */
const SAME = 1e-9;

export const isUnder = ({ least, most }: Meeting): boolean => most < least * (1 - SAME);

/** Row of a table at a temperature; null where none is. */
export function rowAt(table: TimeTable | undefined, celsius: number | null): number | null {
	if (!Array.isArray(table) || celsius === null) return null;
	const row = table.findIndex(([at]) => Math.abs(at - celsius) < 1e-5);
	return row === -1 ? null : row;
}
