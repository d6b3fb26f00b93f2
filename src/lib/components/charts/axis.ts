import type { Hours } from '$lib/api/hours';
import { SLOTS_PER_HOUR } from '$lib/time/slots';
import { localHours, type LocalHour } from '$lib/time/zone';
import { linear } from './linear';

/** Slots [from, to). */
export interface Span {
	readonly from: number;
	readonly to: number;
}

/** The part of Hours that says what the axis is. */
export type AxisSource = Pick<Hours, 'start' | 'slotCount' | 'days' | 'nights'> & {
	yard: Pick<Hours['yard'], 'timeZone'>;
};

/** One time axis for everything on a page: slots to px and back. */
export interface Axis extends Span {
	readonly pxPerHour: number;
	/** px */
	readonly width: number;
	/** px of a slot (or of a place inside one). */
	readonly x: (slot: number) => number;
	/** The slot under a place, kept on the axis. */
	readonly slotUnder: (px: number) => number;
	/** Local full hours on the axis. */
	readonly hours: readonly LocalHour[];
	/** Slots at which a local day begins, without the axis's own start. */
	readonly midnights: readonly number[];
	readonly nights: readonly Span[];
	/** Whether its ends are a day's own ends, and no mere cut. */
	readonly atDayStart: boolean;
	readonly atDayEnd: boolean;
}

/** What two spans have in common; null where they do not meet. */
export function overlap(one: Span, other: Span): Span | null {
	const from = Math.max(one.from, other.from);
	const to = Math.min(one.to, other.to);
	return from < to ? { from, to } : null;
}

/** What of some spans lies inside a window, cut to it. */
export function cut<S extends Span>(spans: readonly S[], window: Span): S[] {
	return spans.flatMap((it) => {
		const part = overlap(it, window);
		return part ? [{ ...it, ...part }] : [];
	});
}

/** An axis over the whole page, or over a window of it. */
export function createAxis(source: AxisSource, pxPerHour: number, window?: Span): Axis {
	const { from, to } = window ?? { from: 0, to: source.slotCount };
	const width = ((to - from) * pxPerHour) / SLOTS_PER_HOUR;
	const scale = linear([from, to], [0, width]);
	return {
		from,
		to,
		pxPerHour,
		width,
		x: scale,
		slotUnder: (px) => Math.min(to - 1, Math.max(from, Math.floor(scale.invert(px)))),
		hours: localHours(source.start, source.slotCount, source.yard.timeZone).filter(
			(it) => it.slot >= from && it.slot < to
		),
		midnights: source.days.map((it) => it.startSlot).filter((it) => it > from && it < to),
		nights: cut(source.nights, { from, to }),
		atDayStart: source.days.some((it) => it.startSlot === from),
		atDayEnd: source.days.some((it) => it.startSlot + it.slots === to)
	};
}

/** The day of the page that a slot belongs to, as an index. */
export function dayOf(days: Hours['days'], slot: number): number {
	const index = days.findLastIndex((it) => it.startSlot <= slot);
	return Math.max(0, index);
}
