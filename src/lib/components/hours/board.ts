import type { Hours, HoursStep } from '$lib/api/hours';
import { SLOTS_PER_HOUR } from '$lib/time/slots';
import type { Units } from '$lib/units/quantity';
import type { Axis } from '../charts/axis';
import type { ReadingLine } from '../charts/readingLine.svelte';

/** Label column beside the axis, or labels above every lath and one day in view. */
export type Layout = 'wide' | 'narrow';

/** An hour somebody wants to read. */
export interface Place {
	readonly boat: Hours['boats'][number];
	readonly step: HoursStep;
	readonly slot: number;
}

/** Which forecast is drawn. One that came while the page was open is fresh, and laid on with a wipe. */
export interface Coat {
	readonly id: string;
	readonly fresh: boolean;
}

/** What every row of the board shares. */
export interface Board {
	readonly hours: Hours;
	/** False while every lath is bare because its hours are not known yet. */
	readonly found: boolean;
	/** It was first drawn so: what came later fits the room that was left for it. */
	readonly beganBare: boolean;
	readonly layout: Layout;
	readonly axis: Axis;
	readonly units: Units;
	readonly line: ReadingLine;
	/** Where now is, in slots and their fractions. */
	readonly nowSlot: number;
	/** Minutes since the forecast was issued, now. */
	readonly forecastAge: number;
	/** The day looked at, as an index. */
	readonly day: number;
	readonly coat: Coat;
	/** Figures in charts, px. */
	readonly figure: number;
	/** The numbers of the reading line stand on its left, the right edge being near. */
	readonly flip: boolean;
	readonly onopen: (place: Place) => void;
}

/** Hours the wide axis holds: with the labels they fill 1440 px between its margins. */
const WIDE_HOURS = 94;

/** Where the wide axis begins, as a slot: today's first hours are left out once they are past. */
export function wideStart(slotCount: number, nowSlot: number): number {
	const over = Math.max(0, Math.ceil(slotCount / SLOTS_PER_HOUR) - WIDE_HOURS);
	const past = Math.max(0, Math.floor(nowSlot / SLOTS_PER_HOUR));
	return Math.min(over, past) * SLOTS_PER_HOUR;
}

/** px an hour and figures, by layout. */
export const LAYOUTS = {
	wide: { pxPerHour: 12, figure: 13.5, hoursBetweenFigures: 6, airHeight: 92, windHeight: 84 },
	narrow: { pxPerHour: 27, figure: 15, hoursBetweenFigures: 2, airHeight: 104, windHeight: 96 }
} as const;
