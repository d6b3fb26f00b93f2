import { slotStart } from './slots';

/** An instant: epoch ms or ISO 8601. Every text is in the zone given (IANA name), 24 h. */
export type Instant = number | string;

type Field = 'weekday' | 'day' | 'month' | 'year' | 'hour' | 'minute';

// Making one takes as long as a hundred uses.
const formatters = new Map<string, Intl.DateTimeFormat>();

function formatterOf(timeZone: string): Intl.DateTimeFormat {
	const known = formatters.get(timeZone);
	if (known) return known;
	const made = new Intl.DateTimeFormat('en-US', {
		timeZone,
		weekday: 'long',
		day: 'numeric',
		month: 'short',
		year: 'numeric',
		hour: '2-digit',
		minute: '2-digit',
		hourCycle: 'h23'
	});
	formatters.set(timeZone, made);
	return made;
}

/**
 * What the clocks and calendars of a zone show. The platform's own formatter: one that goes through
 * a Date of the reader's zone reads an hour wrong wherever the reader's clocks spring forward.
 */
function shown(instant: Instant, timeZone: string): Record<Field, string> {
	const fields = { weekday: '', day: '', month: '', year: '', hour: '', minute: '' };
	const time = typeof instant === 'string' ? Date.parse(instant) : instant;
	for (const { type, value } of formatterOf(timeZone).formatToParts(time)) {
		if (type in fields) fields[type as Field] = value;
	}
	return fields;
}

/** "09:45" */
export function clock(instant: Instant, timeZone: string): string {
	const { hour, minute } = shown(instant, timeZone);
	return `${hour}:${minute}`;
}

/** "Wed": short for "Wednesday" in English is its first three letters. */
const short = (weekday: string): string => weekday.slice(0, 3);

/** "Wed 13" */
export function day(instant: Instant, timeZone: string): string {
	const it = shown(instant, timeZone);
	return `${short(it.weekday)} ${it.day}`;
}

/** "Wed 09:45" */
export function dayAndClock(instant: Instant, timeZone: string): string {
	const it = shown(instant, timeZone);
	return `${short(it.weekday)} ${it.hour}:${it.minute}`;
}

/** "Wed 13 May, 09:45" */
export function dateAndClock(instant: Instant, timeZone: string): string {
	const it = shown(instant, timeZone);
	return `${short(it.weekday)} ${it.day} ${it.month}, ${it.hour}:${it.minute}`;
}

/** A slot at which a local hour begins. */
export interface LocalHour {
	readonly slot: number;
	/** 0 to 23, on the yard's clocks. */
	readonly hour: number;
}

/**
 * The full hours of an axis as the yard's clocks show them: a spring day has 23, an autumn day 25,
 * and zones off the full hour have theirs at their own slots.
 * @param start ISO 8601 instant of slot 0
 */
export function localHours(start: string, slotCount: number, timeZone: string): LocalHour[] {
	const hours: LocalHour[] = [];
	for (let slot = 0; slot < slotCount; slot++) {
		const { hour, minute } = shown(slotStart(start, slot), timeZone);
		if (minute === '00') {
			hours.push({ slot, hour: Number(hour) });
			// The next quarter-hours cannot be full hours.
			slot += 3;
		}
	}
	return hours;
}

/** Whether two zones show the same clock and day at an instant. */
export function sameClock(instant: Instant, one: string, other: string): boolean {
	return dateAndClock(instant, one) === dateAndClock(instant, other);
}

/** "Wednesday" */
export function weekday(instant: Instant, timeZone: string): string {
	return shown(instant, timeZone).weekday;
}
