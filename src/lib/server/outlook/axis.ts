import { localDays, nights, SLOT_SECONDS, type LocalDay, type Site } from '../../engine';

/** The quarter-hours of a page: from local midnight of today over whole local days. */
export interface Axis {
	/** UTC epoch seconds of slot 0. */
	readonly start: number;
	readonly slotCount: number;
	readonly days: readonly LocalDay[];
	/** Slot of the weather's grid at which the axis starts. */
	readonly offset: number;
}

/**
 * The axis of a yard at an instant (UTC epoch seconds), before the weather's grid is known.
 *
 * @param count - local days on it
 */
export function axisAt(timeZone: string, now: number, count: number): Omit<Axis, 'offset'> {
	const days = localDays(timeZone, now, count);
	return {
		start: days[0].start,
		slotCount: days.reduce((sum, { slots }) => sum + slots, 0),
		days
	};
}

/** Slots [from, to) of an axis. */
export interface Span {
	from: number;
	to: number;
}

/** Civil nights on an axis, as slots; the edges go to the nearest quarter-hour. */
export function nightSpans(site: Site, { start, slotCount }: Omit<Axis, 'offset'>): Span[] {
	const slotOf = (t: number): number => Math.round((t - start) / SLOT_SECONDS);
	return nights(site, start, start + slotCount * SLOT_SECONDS)
		.map(({ from, to }) => ({ from: slotOf(from), to: slotOf(to) }))
		.filter(({ from, to }) => to > from);
}

/** Spans in which a condition holds. */
export function spansWhere(slotCount: number, holds: (slot: number) => boolean): Span[] {
	const spans: Span[] = [];
	for (let i = 0; i < slotCount; i++) {
		if (!holds(i)) continue;
		const last = spans[spans.length - 1];
		if (last !== undefined && last.to === i) last.to = i + 1;
		else spans.push({ from: i, to: i + 1 });
	}
	return spans;
}
