import { fromZonedTime } from 'date-fns-tz';

/** The first moment of a date in a zone, UTC epoch seconds. */
export function dayStart(timeZone: string, date: string): number {
	return Math.round(fromZonedTime(`${date}T00:00:00`, timeZone).getTime() / 1000);
}

/** The instant of a wall-clock time ("07:30") on a date in a zone, UTC epoch seconds. */
export function clockInstant(timeZone: string, date: string, time: string): number {
	return Math.round(fromZonedTime(`${date}T${time}:00`, timeZone).getTime() / 1000);
}

/** The instant of what was typed as local date and time ("2026-05-04T09:45") in a zone; null where it is none. */
export function instantOfLocal(timeZone: string, local: string): Date | null {
	const instant = fromZonedTime(local, timeZone);
	return Number.isNaN(instant.getTime()) ? null : instant;
}

/** An instant as a form's local date and time ("2026-05-04T09:45") in a zone. */
export function localOfInstant(timeZone: string, instant: string): string {
	// Swedish writes dates as ISO 8601 does.
	return new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'short' })
		.format(Date.parse(instant))
		.replace(' ', 'T');
}
