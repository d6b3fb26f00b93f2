import type { WorkHours } from '../engine';

interface Span {
	readonly from: number;
	readonly to: number;
}

const DAY = 1440;
const WEEK = 7 * DAY;

const minutesOf = (time: string): number => {
	const [hours, minutes] = time.split(':').map(Number);
	return hours * 60 + minutes;
};

const timeOf = (minutes: number): string =>
	`${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`;

/** Weekly hours as spans of minutes from Monday's midnight; what runs past Sunday's end comes again at the start. */
function weekSpans(hours: WorkHours): Span[] {
	const spans = hours.flatMap(({ days, from, to }) =>
		days.flatMap((day) => {
			const start = (day - 1) * DAY + minutesOf(from);
			const length = (minutesOf(to) - minutesOf(from) + DAY) % DAY || DAY;
			const end = start + length;
			return end <= WEEK
				? [{ from: start, to: end }]
				: [
						{ from: start, to: WEEK },
						{ from: 0, to: end - WEEK }
					];
		})
	);
	return joined(spans.sort((a, b) => a.from - b.from));
}

/** Spans in order with those that meet made one. */
function joined(spans: readonly Span[]): Span[] {
	const whole: { from: number; to: number }[] = [];
	for (const { from, to } of spans) {
		const last = whole.at(-1);
		if (last !== undefined && from <= last.to) last.to = Math.max(last.to, to);
		else whole.push({ from, to });
	}
	return whole;
}

/**
 * Spans cut at each midnight, as weekly hours, days of the same hours together. A day to its end is
 * written as to 00:00.
 */
function weeklyOf(spans: readonly Span[]): WorkHours {
	const hours: WorkHours = [];
	for (const { from, to } of spans) {
		for (let start = from; start < to;) {
			const day = Math.floor(start / DAY);
			const end = Math.min(to, (day + 1) * DAY);
			const [first, last] = [timeOf(start - day * DAY), timeOf((end - day * DAY) % DAY)];
			const same = hours.find((it) => it.from === first && it.to === last);
			if (same === undefined) hours.push({ days: [day + 1], from: first, to: last });
			else same.days.push(day + 1);
			start = end;
		}
	}
	return hours;
}

/** Weekly hours that lie inside both; empty where none do. */
export function hoursInBoth(a: WorkHours, b: WorkHours): WorkHours {
	const ours = weekSpans(a);
	const theirs = weekSpans(b);
	const both = ours.flatMap((one) =>
		theirs
			.map((other) => ({
				from: Math.max(one.from, other.from),
				to: Math.min(one.to, other.to)
			}))
			.filter(({ from, to }) => from < to)
	);
	return weeklyOf(both.sort((one, other) => one.from - other.from));
}

/** Weekly hours outside all of these: the whole week where there are none. */
export function hoursOutside(hours: WorkHours): WorkHours {
	const free: Span[] = [];
	let at = 0;
	for (const { from, to } of weekSpans(hours)) {
		if (from > at) free.push({ from: at, to: from });
		at = Math.max(at, to);
	}
	if (at < WEEK) free.push({ from: at, to: WEEK });
	return weeklyOf(free);
}
