import { formatInTimeZone } from 'date-fns-tz/formatInTimeZone';
import { slotStart } from './slots';

/** An instant: epoch ms or ISO 8601. Every text is in the zone given (IANA name), 24 h. */
export type Instant = number | string;

/** "09:45" */
export function clock(instant: Instant, timeZone: string): string {
	return formatInTimeZone(instant, timeZone, 'HH:mm');
}

/** "Wed 13" */
export function day(instant: Instant, timeZone: string): string {
	return formatInTimeZone(instant, timeZone, 'EEE d');
}

/** "Wed 09:45" */
export function dayAndClock(instant: Instant, timeZone: string): string {
	return formatInTimeZone(instant, timeZone, 'EEE HH:mm');
}

/** "Wed 13 May, 09:45" */
export function dateAndClock(instant: Instant, timeZone: string): string {
	return formatInTimeZone(instant, timeZone, 'EEE d MMM, HH:mm');
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
		const [hour, minute] = clock(slotStart(start, slot), timeZone).split(':').map(Number);
		if (minute === 0) {
			hours.push({ slot, hour });
			// The next quarter-hours cannot be full hours.
			slot += 3;
		}
	}
	return hours;
}

/** Whether two zones show the same clock at an instant. */
export function sameClock(instant: Instant, one: string, other: string): boolean {
	const pattern = "yyyy-MM-dd'T'HH:mm";
	return formatInTimeZone(instant, one, pattern) === formatInTimeZone(instant, other, pattern);
}
