import type { WorkHours } from '../../engine';

/** Days of a week, 1 = Monday … 7. */
export const WEEKDAYS = [1, 2, 3, 4, 5, 6, 7] as const;
export const WEEKDAY_WORDS = [
	'Monday',
	'Tuesday',
	'Wednesday',
	'Thursday',
	'Friday',
	'Saturday',
	'Sunday'
] as const;

/** From and to of a stretch of hours on one weekday, HH:MM. */
export interface DaySpan {
	readonly from: string;
	readonly to: string;
}

/** Weekly hours day by day: seven lists, Monday's first, each in order. */
export function byWeekday(hours: WorkHours): DaySpan[][] {
	return WEEKDAYS.map((day) =>
		hours
			.filter(({ days }) => days.includes(day))
			.map(({ from, to }) => ({ from, to }))
			.sort((a, b) => a.from.localeCompare(b.from))
	);
}

/** Seven lists as weekly hours, days of the same hours together. */
export function toWorkHours(week: readonly (readonly DaySpan[])[]): WorkHours {
	const hours: WorkHours = [];
	week.forEach((spans, index) => {
		for (const { from, to } of spans) {
			const same = hours.find((it) => it.from === from && it.to === to);
			if (same === undefined) hours.push({ days: [index + 1], from, to });
			else if (!same.days.includes(index + 1)) same.days.push(index + 1);
		}
	});
	return hours;
}

/** Weekly hours in words, a line for each run of days with the same hours: "Monday to Friday 07:30 to 18:00". */
export function weekWords(hours: WorkHours): string[] {
	const week = byWeekday(hours).map((spans) =>
		spans.map(({ from, to }) => `${from} to ${to}`).join(' and ')
	);
	const lines: string[] = [];
	for (let first = 0; first < week.length;) {
		let last = first;
		while (last + 1 < week.length && week[last + 1] === week[first]) last++;
		const days =
			first === last
				? WEEKDAY_WORDS[first]
				: `${WEEKDAY_WORDS[first]} ${last === first + 1 ? 'and' : 'to'} ${WEEKDAY_WORDS[last]}`;
		if (week[first] !== '') lines.push(`${days} ${week[first]}`);
		first = last + 1;
	}
	return lines;
}
