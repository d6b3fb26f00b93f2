import type { LimitReadingRow } from '$lib/api/reading';
import { clock } from '$lib/time/zone';
import { quantity, type Quantity, type Units } from '$lib/units/quantity';

/** What each limit is held against, as a person says it. */
const LIMIT_WORDS: Record<LimitReadingRow['limit'], string> = {
	hours: 'work hours',
	daylight: 'daylight',
	airTemperature: 'air',
	surfaceTemperature: 'hull',
	relativeHumidity: 'humidity',
	spread: 'spread',
	wind: 'mean wind',
	gust: 'gust',
	rain: 'rain',
	film: 'water film',
	directSun: 'sun on the face',
	surfaceTrend: 'hull, by the hour',
	sand: 'gust that lifts sand',
	curing: 'hull while curing',
	dryingTime: 'drying time'
};

const PHASE_WORDS: Record<LimitReadingRow['phase'], string> = {
	apply: '',
	wet: 'until dry',
	set: 'until the next coat'
};

/**
 * Where the number is from, of which face, and when it binds if that is later than the start.
 * @param faced whether the face must be told, because the step has several
 */
export function originWords(
	row: Pick<LimitReadingRow, 'origin' | 'face' | 'phase' | 'at'>,
	slotStart: string,
	timeZone: string,
	faced: boolean
): string {
	const later = Date.parse(row.at) > Date.parse(slotStart) ? `at ${clock(row.at, timeZone)}` : '';
	return [
		row.origin,
		faced ? row.face : '',
		[later, PHASE_WORDS[row.phase]].filter(Boolean).join(' ')
	]
		.filter(Boolean)
		.join(', ');
}

/** The bound in words: "gust, most 20.0 kn"; of in and out just what it is about. */
export function boundWords(
	row: Pick<LimitReadingRow, 'limit' | 'side' | 'bound' | 'unit'>,
	units: Units
): string {
	const about = LIMIT_WORDS[row.limit];
	if (row.bound === null || row.side === 'in') return about;
	const { number, unit } = quantity(row.bound, row.unit, units);
	return `${about}, ${row.side} ${number}${unit && `\u00a0${unit}`}`;
}

/** The value; in words where it is only in or out, or unknown. */
export function valueOf(
	row: Pick<LimitReadingRow, 'value' | 'side' | 'unit' | 'holds'>,
	units: Units
): Quantity {
	if (row.value !== null) return quantity(row.value, row.unit, units);
	if (row.side === 'in') return { number: row.holds ? 'inside' : 'outside', unit: '' };
	return { number: 'no data', unit: '' };
}
