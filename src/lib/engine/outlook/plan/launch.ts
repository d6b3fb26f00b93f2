import { z } from 'zod';
import { localDate } from '../weather/calendar';
import { SLOT_SECONDS, type SlotGrid } from '../weather/slots';

/**
 * When a boat should go back in. Instants in UTC epoch seconds; the day rate is money a day, in
 * whatever currency.
 */
export const launchWishSchema = z.strictObject({
	launchBy: z.int().optional(),
	/** Bookable times of the hoist. */
	launchSlots: z.array(z.int()).max(2_000).optional(),
	dayRate: z.number().min(0).max(1_000_000).optional(),
	/** Days a launch may slip for nothing; absent: none. */
	slipFreeDays: z.int().min(0).max(366).optional(),
	/** By what the other days are billed, whole weeks for each begun; absent: day by day. */
	slipPer: z.enum(['day', 'week']).optional()
});
export type LaunchWish = z.infer<typeof launchWishSchema>;

/**
 * The launch aimed at: the last slot not after the date, without slots the date itself; null where
 * none is wanted, or slots are stated and none is in time.
 */
export function chosenLaunch({ launchBy, launchSlots }: LaunchWish): number | null {
	if (launchBy === undefined) return null;
	if (launchSlots === undefined || launchSlots.length === 0) return launchBy;
	const inTime = launchSlots.filter((slot) => slot <= launchBy);
	return inTime.length === 0 ? null : Math.max(...inTime);
}

/** The first launch from an instant on: a slot, without slots the instant itself; null without one. */
export function firstLaunch({ launchSlots }: LaunchWish, ready: number): number | null {
	if (!Number.isFinite(ready)) return null;
	if (launchSlots === undefined || launchSlots.length === 0) return ready;
	const after = launchSlots.filter((slot) => slot >= ready);
	return after.length === 0 ? null : Math.min(...after);
}

const DAY = 86_400;

/** Whole days between the dates of two instants in a zone; never under 0. */
function daysBetween(timeZone: string, from: number, to: number): number {
	const midnight = (instant: number): number =>
		Date.parse(`${localDate(timeZone, instant)}T00:00:00Z`) / 1000;
	return Math.max(0, Math.round((midnight(to) - midnight(from)) / DAY));
}

/** How far a plan slips past the launch aimed at. */
export interface Slip {
	/** UTC epoch seconds of the first launch the plan can make; null without one. */
	readonly launch: number | null;
	/** Whole days, by dates of the yard's zone; null where no launch is wanted or none can be made. */
	readonly days: number | null;
	/** The days billed × the day rate; null with either. */
	readonly cost: number | null;
}

/** The slip of a plan that is launch-ready at an instant (UTC epoch seconds, +Infinity for never). */
export function slipOf(wish: LaunchWish, timeZone: string, ready: number): Slip {
	const chosen = chosenLaunch(wish);
	const launch = chosen !== null && ready <= chosen ? chosen : firstLaunch(wish, ready);
	return slipAt(wish, timeZone, launch);
}

/** The slip of a launch at an instant (UTC epoch seconds); null where none can be made. */
export function slipAt(wish: LaunchWish, timeZone: string, launch: number | null): Slip {
	const aim = chosenLaunch(wish) ?? wish.launchBy;
	if (aim === undefined || launch === null) return { launch, days: null, cost: null };
	const days = daysBetween(timeZone, aim, launch);
	const { dayRate } = wish;
	return { launch, days, cost: dayRate === undefined ? null : billedDays(wish, days) * dayRate };
}

/** The days of a slip that are billed. */
function billedDays({ slipFreeDays = 0, slipPer = 'day' }: LaunchWish, days: number): number {
	const over = Math.max(0, days - slipFreeDays);
	return slipPer === 'day' ? over : Math.ceil(over / 7) * 7;
}

/**
 * Slot positions of the launch slots stated, rising, each once; null where none are. Fractions are
 * kept: a slot may begin at any minute.
 */
export function launchPositions(grid: SlotGrid, { launchSlots }: LaunchWish): Float64Array | null {
	if (launchSlots === undefined || launchSlots.length === 0) return null;
	return Float64Array.from(new Set(launchSlots), (slot) => positionOf(grid, slot)).sort();
}

/** An instant as a slot position of a grid. */
export function positionOf(grid: SlotGrid, instant: number): number {
	return (instant - grid.start) / SLOT_SECONDS;
}

/** A slot position as an instant, UTC epoch seconds; null past all that is known. */
export function instantAt(grid: SlotGrid, position: number): number | null {
	return Number.isFinite(position) ? Math.round(grid.start + position * SLOT_SECONDS) : null;
}
