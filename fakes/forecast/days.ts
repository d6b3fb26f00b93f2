import { addDays } from 'date-fns';
import { formatInTimeZone, fromZonedTime } from 'date-fns-tz';
import { hash } from './noise';
import { FOLLOWED_BY, KNOT_HOURS, REGIMES, STORY, STORY_TODAY, type RegimeName } from './regimes';

/** Local days known before and after the anchor: past days of a request and a month ahead. */
const DAYS_BEFORE = 12;
const DAYS_AFTER = 40;

export interface Day {
	regime: RegimeName;
	/** UTC epoch seconds of the regime's knots, by the local clock of that date. */
	knots: number[];
}

/** @returns the local date, "2026-03-29", at an instant in UTC epoch seconds */
export function localDate(time: number, timeZone: string): string {
	return formatInTimeZone(time * 1000, timeZone, 'yyyy-MM-dd');
}

function shifted(date: string, days: number): string {
	return addDays(new Date(`${date}T12:00:00Z`), days)
		.toISOString()
		.slice(0, 10);
}

/**
 * The kinds of day around an anchor: the story where it has a day, seeded chance elsewhere.
 *
 * @param anchor - the local date that is the story's today
 */
export function daysAround(anchor: string, timeZone: string, seed: number): Day[] {
	const names = new Map<number, RegimeName>(
		STORY.map((regime, i) => [i - STORY_TODAY, regime] as const)
	);
	const after = (name: RegimeName, day: number): RegimeName => {
		const choices = FOLLOWED_BY[name];
		return choices[Math.floor(hash(seed, day) * choices.length)] ?? 'fair';
	};
	for (let day = STORY.length - STORY_TODAY; day <= DAYS_AFTER; day++)
		names.set(day, after(names.get(day - 1) ?? 'fair', day));
	for (let day = -DAYS_BEFORE; day < -STORY_TODAY; day++)
		names.set(day, after(names.get(day - 1) ?? 'fair', day));

	const days: Day[] = [];
	for (let day = -DAYS_BEFORE; day <= DAYS_AFTER; day++) {
		const date = shifted(anchor, day);
		days.push({
			regime: names.get(day) ?? 'fair',
			knots: KNOT_HOURS.map(
				(hour) =>
					fromZonedTime(`${date}T${String(hour).padStart(2, '0')}:00:00`, timeZone).getTime() / 1000
			)
		});
	}
	return days;
}

/** The regimes' low and high of a day, for its temperature. */
export const extremes = (day: Day): { low: number; high: number } => REGIMES[day.regime];
