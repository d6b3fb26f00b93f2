import { fromZonedTime } from 'date-fns-tz';
import { civilNights, sunUpSpans, type TimeSpan } from '../../met/sun';
import type { Site, WorkHours } from './site';
import { SLOT_SECONDS, type SlotGrid } from './slots';

/** A date of the yard's zone. `slots` is 92, 96 or 100. */
export interface LocalDay {
	/** yyyy-mm-dd */
	readonly date: string;
	/** UTC epoch seconds of local midnight (or the first moment of the day). */
	readonly start: number;
	readonly slots: number;
}

const DAY_SECONDS = 86_400;

const dateFormats = new Map<string, Intl.DateTimeFormat>();

/**
 * The local date of an instant, yyyy-mm-dd. By `Intl`, whose answer does not depend on the zone
 * this process itself runs in.
 */
export function localDate(timeZone: string, epochSeconds: number): string {
	const format =
		dateFormats.get(timeZone) ??
		new Intl.DateTimeFormat('en-CA', {
			timeZone,
			year: 'numeric',
			month: '2-digit',
			day: '2-digit'
		});
	dateFormats.set(timeZone, format);
	return format.format(epochSeconds * 1000);
}

const clockFormats = new Map<string, Intl.DateTimeFormat>();

/** The wall clock at an instant, comparable text: yyyy-mm-dd hh:mm. */
function wallClock(timeZone: string, epochSeconds: number): string {
	const format =
		clockFormats.get(timeZone) ??
		new Intl.DateTimeFormat('en-GB', {
			timeZone,
			hour: '2-digit',
			minute: '2-digit',
			hourCycle: 'h23'
		});
	clockFormats.set(timeZone, format);
	return `${localDate(timeZone, epochSeconds)} ${format.format(epochSeconds * 1000)}`;
}

/**
 * The instant of a wall-clock time on a local date, UTC epoch seconds. A time that the clock jumps
 * over (midnight, in some zones) is the moment it jumps.
 */
function instantOf(timeZone: string, date: string, time: string): number {
	let instant = Math.round(fromZonedTime(`${date}T${time}:00`, timeZone).getTime() / 1000);
	const asked = `${date} ${time}`;
	if (wallClock(timeZone, instant) === asked) return instant;
	while (wallClock(timeZone, instant) < asked) instant += 60;
	while (wallClock(timeZone, instant - 60) > asked) instant -= 60;
	return instant;
}

/** The date so many days after a date; calendar arithmetic, no zone. */
export function addDays(date: string, days: number): string {
	return new Date(Date.parse(`${date}T00:00:00Z`) + days * DAY_SECONDS * 1000)
		.toISOString()
		.slice(0, 10);
}

/** So many local days, from the one that holds an instant on. */
export function localDays(timeZone: string, fromEpoch: number, count: number): LocalDay[] {
	const first = localDate(timeZone, fromEpoch);
	const starts = Array.from({ length: count + 1 }, (_, i) =>
		instantOf(timeZone, addDays(first, i), '00:00')
	);
	return starts.slice(0, count).map((start, i) => ({
		date: addDays(first, i),
		start,
		slots: Math.round((starts[i + 1] - start) / SLOT_SECONDS)
	}));
}

/** Civil dusk to dawn at a site within [from, to], UTC epoch seconds. */
export function nights(
	site: Pick<Site, 'latitude' | 'longitude'>,
	from: number,
	to: number
): TimeSpan[] {
	return civilNights(site.latitude, site.longitude, from, to);
}

/** Marks the slots that lie wholly inside one of the spans with 1. */
function markWhole(grid: SlotGrid, spans: readonly TimeSpan[], mask: Uint8Array): void {
	for (const span of spans) {
		const first = Math.max(0, Math.ceil((span.from - grid.start) / SLOT_SECONDS));
		const end = Math.min(grid.count, Math.floor((span.to - grid.start) / SLOT_SECONDS));
		if (end > first) mask.fill(1, first, end);
	}
}

/** 1 for slots with daylight at both ends. */
export function daylightMask(
	site: Pick<Site, 'latitude' | 'longitude'>,
	grid: SlotGrid
): Uint8Array {
	const mask = new Uint8Array(grid.count);
	const end = grid.start + grid.count * SLOT_SECONDS;
	// A margin on both sides, so that a span cut by the grid is not cut at its edge slots.
	const spans = sunUpSpans(
		site.latitude,
		site.longitude,
		grid.start - DAY_SECONDS / 2,
		end + DAY_SECONDS / 2
	);
	markWhole(grid, spans, mask);
	return mask;
}

/** Takes the mark off every slot that a span touches. */
function unmarkTouched(grid: SlotGrid, spans: readonly TimeSpan[], mask: Uint8Array): void {
	for (const span of spans) {
		const first = Math.max(0, Math.floor((span.from - grid.start) / SLOT_SECONDS));
		const end = Math.min(grid.count, Math.ceil((span.to - grid.start) / SLOT_SECONDS));
		if (end > first) mask.fill(0, first, end);
	}
}

/**
 * 1 for slots wholly inside work hours of the site's zone (all slots without any) and outside every
 * span closed.
 */
export function workMask(
	timeZone: string,
	hours: WorkHours | undefined,
	closed: readonly TimeSpan[] | undefined,
	grid: SlotGrid
): Uint8Array {
	const mask =
		hours === undefined ? new Uint8Array(grid.count).fill(1) : weeklyMask(timeZone, hours, grid);
	unmarkTouched(grid, closed ?? [], mask);
	return mask;
}

/** 1 for slots wholly inside work hours of the site's zone. */
function weeklyMask(timeZone: string, hours: WorkHours, grid: SlotGrid): Uint8Array {
	const mask = new Uint8Array(grid.count);
	if (hours.length === 0) return mask;
	const days = Math.ceil((grid.count * SLOT_SECONDS) / DAY_SECONDS) + 3;
	const spans: TimeSpan[] = [];
	for (const { date } of localDays(timeZone, grid.start - DAY_SECONDS, days)) {
		const weekday = new Date(`${date}T00:00:00Z`).getUTCDay() || 7;
		for (const entry of hours) {
			if (!entry.days.includes(weekday)) continue;
			const endDate = entry.to <= entry.from ? addDays(date, 1) : date;
			spans.push({
				from: instantOf(timeZone, date, entry.from),
				to: instantOf(timeZone, endDate, entry.to)
			});
		}
	}
	spans.sort((a, b) => a.from - b.from);
	const joined: TimeSpan[] = [];
	for (const span of spans) {
		const before = joined[joined.length - 1];
		if (before !== undefined && span.from <= before.to)
			joined[joined.length - 1] = { from: before.from, to: Math.max(before.to, span.to) };
		else joined.push(span);
	}
	markWhole(grid, joined, mask);
	return mask;
}
