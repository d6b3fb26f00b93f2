import type { LaunchSlots } from '../../api/yard/hoists';
import { addDays, localDays, type LaunchWish } from '../../engine';
import { clockInstant, dayStart } from '../../time/dates';
import type { Yard } from '../db/schema';

const DAY_SECONDS = 86_400;
/** Days after the launch aimed at in which a slipped one is looked for. */
const DAYS_BEYOND = 28;
/** As many as the engine takes. */
const MOST_SLOTS = 2_000;

/** Weekday of a date, 1 = Monday … 7. */
const weekdayOf = (date: string): number => new Date(`${date}T00:00:00Z`).getUTCDay() || 7;

const falls = ({ days, date }: LaunchSlots, on: string): boolean =>
	date === undefined ? (days?.includes(weekdayOf(on)) ?? false) : date === on;

/** Where the yard's lifting stops, m/s of gust at 10 m: its steadiest hoist's limit, else its own. */
export function liftGustOf({ hoists, liftGust }: Pick<Yard, 'hoists' | 'liftGust'>): number {
	return hoists.length === 0 ? liftGust : Math.max(...hoists.map(({ gust }) => gust ?? liftGust));
}

/** Bookable times of all hoists over some local days, none on a holiday, UTC epoch seconds in order. */
function slotsOver(
	{ hoists, holidays, timeZone }: Pick<Yard, 'hoists' | 'holidays' | 'timeZone'>,
	from: number,
	count: number
): number[] {
	const off = new Set(holidays.map(({ date }) => date));
	const slots = localDays(timeZone, from, count).flatMap(({ date }) => {
		if (off.has(date)) return [];
		const times = hoists.flatMap((hoist) =>
			hoist.slots.flatMap((it) => (falls(it, date) ? it.times : []))
		);
		return times.map((time) => clockInstant(timeZone, date, time));
	});
	return [...new Set(slots)].filter((at) => at >= from).sort((a, b) => a - b);
}

/**
 * When a launch date means that the boat has to be ready where no hoist states its times: at the
 * yard's first hour of it, and where the yard is closed that day at the date's first moment.
 */
export function launchInstant(
	{ timeZone, workHours }: Pick<Yard, 'timeZone' | 'workHours'>,
	date: string
): number {
	const first = workHours
		.filter(({ days }) => days.includes(weekdayOf(date)))
		.map(({ from }) => from)
		.sort()[0];
	return clockInstant(timeZone, date, first ?? '00:00');
}

/**
 * When a boat should go back in, as the engine takes it: at one of the hoists' times up to the end
 * of its date, where they state any, and what slipping costs.
 *
 * @param launchBy - yyyy-mm-dd; null where none is wished for
 * @param now - earlier times of the hoists are gone
 */
export function launchWishOf(yard: Yard, launchBy: string | null, now: Date): LaunchWish {
	const from = Math.floor(now.getTime() / 1000);
	const { timeZone } = yard;
	const end = launchBy === null ? from : dayStart(timeZone, addDays(launchBy, 1)) - 1;
	const days = Math.ceil(Math.max(0, end - from) / DAY_SECONDS) + DAYS_BEYOND;
	const launchSlots = slotsOver(yard, from, days).slice(0, MOST_SLOTS);
	const hasSlots = launchSlots.length > 0;
	return {
		...(launchBy === null ? {} : { launchBy: hasSlots ? end : launchInstant(yard, launchBy) }),
		...(hasSlots ? { launchSlots } : {}),
		...(yard.dayRate === null ? {} : { dayRate: yard.dayRate }),
		slipFreeDays: yard.slipFreeDays,
		slipPer: yard.slipPer
	};
}
