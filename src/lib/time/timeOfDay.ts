/**
 * A time of day as a person types it ("07:30", "7.30", "730", "7") as HH:MM; null where it is none.
 * "24:00" is the midnight that ends a day, "00:00".
 */
export function readTimeOfDay(typed: string): string | null {
	const text = typed.trim();
	const found = /^(\d{1,2})(?:[:.h]?(\d{2}))?$/i.exec(text);
	if (found === null) return null;
	const [hour, minute] = [Number(found[1]), Number(found[2] ?? '0')];
	if (hour === 24 && minute === 0) return '00:00';
	if (hour > 23 || minute > 59) return null;
	return `${String(hour).padStart(2, '0')}:${String(minute).padStart(2, '0')}`;
}

/** Minutes since midnight of a time like 07:30; null where it is none. */
export function minuteOfDay(typed: string): number | null {
	const time = readTimeOfDay(typed);
	return time === null ? null : Number(time.slice(0, 2)) * 60 + Number(time.slice(3));
}

/** HH:MM of minutes since midnight; a whole day is "00:00". */
export function timeOfDay(minutes: number): string {
	const of = ((minutes % 1440) + 1440) % 1440;
	return `${String(Math.floor(of / 60)).padStart(2, '0')}:${String(of % 60).padStart(2, '0')}`;
}
