import type { Hours } from '$lib/api/hours';
import { SLOT_MS, SLOTS_PER_HOUR } from '$lib/time/slots';
import { overlap, type Span } from './axis';

/** One place of a line; null breaks it. */
export interface Point {
	readonly slot: number;
	readonly value: number | null;
}

type Values = readonly (number | null)[];

/** How far a value may lie off the line that is drawn: far under a pixel. */
const TOLERANCE = 0.03;

/** The slots between two kept ones that the straight line between them misses (Douglas and Peucker). */
function missed(values: readonly number[], from: number, to: number): number[] {
	let worst = TOLERANCE;
	let at = -1;
	for (let i = from + 1; i < to; i++) {
		const straight = values[from] + ((values[to] - values[from]) * (i - from)) / (to - from);
		const off = Math.abs(values[i] - straight);
		if (off > worst) [worst, at] = [off, i];
	}
	return at < 0 ? [] : [...missed(values, from, at), at, ...missed(values, at, to)];
}

/** A series as few points that draw the same line; a null stands for each gap. */
export function thinned(values: Values): Point[] {
	const points: Point[] = [];
	let known: number[] = [];
	const close = (end: number) => {
		const first = end - known.length;
		const last = known.length - 1;
		const kept = last > 0 ? [0, ...missed(known, 0, last), last] : [0];
		if (last >= 0) points.push(...kept.map((i) => ({ slot: first + i, value: known[i] })));
		known = [];
	};
	values.forEach((value, slot) => {
		if (value !== null) return known.push(value);
		if (known.length > 0 || slot === 0) {
			close(slot);
			points.push({ slot, value: null });
		}
	});
	close(values.length);
	return points;
}

/** A series held over its slots (a gust is its hour's most): both ends of every level. */
export function levels(values: Values): Point[] {
	const points: Point[] = [];
	values.forEach((value, slot) => {
		const last = points.at(-1);
		if (slot > 0 && last && last.value === value)
			points[points.length - 1] = { slot: slot + 1, value };
		else points.push({ slot, value }, { slot: slot + 1, value });
	});
	return points;
}

/** A place on the band from mean to gust. */
export interface BandPoint {
	readonly slot: number;
	readonly low: number | null;
	readonly high: number | null;
}

/** The band between a line and a series held over its slots, with the corners of its steps. */
export function steppedBand(low: Values, high: Values): BandPoint[] {
	const kinks = new Set(thinned(low).map((it) => it.slot));
	const points: BandPoint[] = [];
	high.forEach((value, slot) => {
		const before = slot === 0 ? value : high[slot - 1];
		if (slot > 0 && value === before && !kinks.has(slot)) return;
		if (value !== before) points.push({ slot, low: low[slot], high: before });
		points.push({ slot, low: low[slot], high: value });
	});
	const end = high.length;
	if (end > 0) points.push({ slot: end, low: low[end - 1], high: high[end - 1] });
	return points;
}

/** Where a series has nothing. */
export function gaps(values: Values): Span[] {
	const spans: Span[] = [];
	values.forEach((value, slot) => {
		if (value !== null) return;
		const last = spans.at(-1);
		if (last?.to === slot) spans[spans.length - 1] = { from: last.from, to: slot + 1 };
		else spans.push({ from: slot, to: slot + 1 });
	});
	return spans;
}

/** The least and the most of one or more series; null where all is missing. */
export function extent(...series: readonly Values[]): [number, number] | null {
	const known = series.flat().filter((it) => it !== null);
	return known.length === 0 ? null : [Math.min(...known), Math.max(...known)];
}

/** The place of the most of each day (or the least), in the middle of its level. */
export function dailyExtremes(
	values: Values,
	days: Hours['days'],
	which: 'most' | 'least'
): { slot: number; value: number }[] {
	return days.flatMap((day) => {
		const end = day.startSlot + day.slots;
		let best: { from: number; to: number; value: number } | null = null;
		for (let slot = day.startSlot; slot < Math.min(end, values.length); slot++) {
			const value = values[slot];
			if (value === null) continue;
			if (best === null || (which === 'most' ? value > best.value : value < best.value)) {
				best = { from: slot, to: slot, value };
			} else if (value === best.value && best.to === slot - 1) best.to = slot;
		}
		if (!best) return [];
		// On its way up to the next day's most (or down from the last one's), a day has none of its own.
		const { value } = best;
		const onTheWay = [values[best.from - 1], values[best.to + 1]].some(
			(it) => typeof it === 'number' && (which === 'most' ? it > value : it < value)
		);
		return onTheWay ? [] : [{ slot: (best.from + best.to + 1) / 2, value }];
	});
}

/** Rain of one hour. */
export interface RainHour extends Span {
	/** mm */
	readonly amount: number;
}

/** Hours with rain, from a series that gives every slot its hour's amount. */
export function rainHours(values: Values, start: string): RainHour[] {
	const offset = (Date.parse(start) / SLOT_MS) % SLOTS_PER_HOUR;
	const hours: RainHour[] = [];
	values.forEach((amount, slot) => {
		if (amount === null || amount <= 0) return;
		const last = hours.at(-1);
		const newHour = (slot + offset) % SLOTS_PER_HOUR === 0;
		if (last && last.to === slot && !newHour) hours[hours.length - 1] = { ...last, to: slot + 1 };
		else hours.push({ from: slot, to: slot + 1, amount });
	});
	return hours;
}

/** Rain with at most two dry hours in it. */
const SPELL_GAP = 2 * SLOTS_PER_HOUR;
/** mm: under this a spell is drawn and not named. */
const SPELL_LEAST = 0.5;

/** Spells of rain worth a word: from, to and mm in all. */
export function rainSpells(hours: readonly RainHour[]): RainHour[] {
	const spells: RainHour[] = [];
	for (const hour of hours) {
		const last = spells.at(-1);
		if (last && hour.from - last.to <= SPELL_GAP) {
			spells[spells.length - 1] = {
				from: last.from,
				to: hour.to,
				amount: last.amount + hour.amount
			};
		} else spells.push(hour);
	}
	return spells.filter((it) => it.amount >= SPELL_LEAST);
}

/**
 * Where a word can stand over a line without touching it: the first place of each day, from 06:00
 * on if there is one, over which every value stays under `below` for `slots`, and that does not
 * lie across the slot `avoid`.
 */
export function clearPlaces(
	values: Values,
	days: Hours['days'],
	slots: number,
	below: number,
	avoid: number
): number[] {
	const clear = (from: number, window: Span) =>
		(avoid < from || avoid >= from + slots) &&
		overlap({ from, to: from + slots }, window)?.to === from + slots &&
		values.slice(from, from + slots).every((it) => it === null || it < below);
	return days.flatMap((day) => {
		const window = { from: day.startSlot, to: day.startSlot + day.slots };
		const places = Array.from({ length: day.slots }, (_, i) => day.startSlot + i).filter((slot) =>
			clear(slot, window)
		);
		const morning = places.find((slot) => slot >= day.startSlot + 6 * SLOTS_PER_HOUR + 1);
		return morning ?? places[0] ?? [];
	});
}
