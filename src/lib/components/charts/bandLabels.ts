import type { Hours } from '$lib/api/hours';
import type { Axis } from './axis';
import type { BandScale } from './bandScale';
import { dailyExtremes, type RainHour } from './series';
import { textWidth } from './textWidth';

/** A word on a band, in its place: baseline and anchor, px. */
export interface BandLabel {
	readonly x: number;
	readonly y: number;
	readonly text: string;
	readonly anchor: 'start' | 'middle' | 'end';
}

const BESIDE = 6;
const OVER_LINE = 7;
/** A trough is named only where it lies this far under the highest of the page, K. */
const TROUGH_WORTH_NAMING = 3;

/** What a label covers: from, to, top and bottom, px. */
function box({ x, y, text, anchor }: BandLabel, size: number) {
	const width = textWidth(text, size, 600);
	const left = anchor === 'start' ? x : anchor === 'end' ? x - width : x - width / 2;
	return { left, right: left + width, top: y - size, bottom: y };
}

/** Whether two labels lie on one another. */
export function collide(one: BandLabel, other: BandLabel, size: number): boolean {
	const a = box(one, size);
	const b = box(other, size);
	return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}

/** Words of the spells of rain: after the blocks, or before them where the axis ends. */
export function rainLabels(
	spells: readonly RainHour[],
	words: (spell: RainHour) => string,
	axis: Axis,
	size: number
): BandLabel[] {
	return spells.map((spell) => {
		const text = words(spell);
		const after = axis.x(spell.to) + BESIDE;
		return after + textWidth(text, size, 600) < axis.width
			? { x: after, y: size, text, anchor: 'start' }
			: { x: axis.x(spell.from) - BESIDE, y: size, text, anchor: 'end' };
	});
}

/** The day's most and least of a line, over it, where no other word stands and the axis holds them. */
export function extremeLabels(
	values: Hours['bands']['airTemperature'],
	days: Hours['days'],
	axis: Axis,
	scale: BandScale,
	size: number,
	taken: readonly BandLabel[]
): BandLabel[] {
	const peaks = dailyExtremes(values, days, 'most');
	const highest = Math.max(...peaks.map((it) => it.value));
	const troughs = dailyExtremes(values, days, 'least').filter(
		(it) => highest - it.value >= TROUGH_WORTH_NAMING
	);
	return [...peaks, ...troughs]
		.map(({ slot, value }): BandLabel => ({
			x: axis.x(slot),
			y: scale.y(value) - OVER_LINE,
			text: scale.text(value),
			anchor: 'middle'
		}))
		.filter((it) => {
			const { left, right } = box(it, size);
			return left > 0 && right < axis.width && !taken.some((other) => collide(it, other, size));
		});
}
