import { ticks } from 'd3-array';
import type { Hours } from '$lib/api/hours';
import { rounded } from '$lib/units/rounding';
import { toSpeed } from '$lib/units/speed';
import { toTemperature } from '$lib/units/temperature';
import type { Units } from '$lib/units/quantity';
import { linear } from './linear';
import { extent } from './series';

/** How high a value of a band stands, and the lines that say so. */
export interface BandScale {
	/** px. */
	readonly height: number;
	/** px from the top, of a value in the engine's unit (°C or m/s). */
	readonly y: (value: number) => number;
	/** A value in the reader's unit, with its sign but without the unit's name: "19°", "24". */
	readonly text: (value: number) => string;
	/** Scale lines: at most three. */
	readonly lines: readonly { readonly y: number; readonly text: string }[];
}

/** px kept free for the words over the peaks, and for the dew under the lines. */
const AIR_TOP = 30;
const AIR_BOTTOM = 18;
const WIND_TOP = 20;
/** The limit's line never lies at the very top. */
const LIMIT_SHARE = 1.25;
const MOST_LINES = 3;

function scaled(
	domain: [number, number],
	range: [number, number],
	height: number,
	convert: (value: number) => number,
	text: (shown: number) => string
): BandScale {
	const [from, to] = domain.map(convert);
	// A flat calm or a missing swing still needs a height to stand in.
	const scale = linear([from, to > from ? to : from + 1], range);
	const marks = ticks(from, to, MOST_LINES);
	const every = Math.ceil(marks.length / MOST_LINES);
	return {
		height,
		y: (value) => scale(convert(value)),
		text: (value) => text(convert(value)),
		lines: marks.filter((_, i) => i % every === 0).map((it) => ({ y: scale(it), text: text(it) }))
	};
}

/** The scale of air temperature and dew point; null where all of both is missing. */
export function airScale(bands: Hours['bands'], units: Units, height: number): BandScale | null {
	const range = extent(bands.airTemperature, bands.dewPoint);
	return (
		range &&
		scaled(
			range,
			[height - AIR_BOTTOM, AIR_TOP],
			height,
			(value) => toTemperature(value, units.temperature),
			(shown) => `${rounded(shown, 0)}°`
		)
	);
}

/** The scale of wind and gust, from calm to above the limit; null where all of both is missing. */
export function windScale(
	bands: Hours['bands'],
	limit: number,
	units: Units,
	height: number
): BandScale | null {
	const range = extent(bands.windSpeed, bands.windGust);
	return (
		range &&
		scaled(
			[0, Math.max(range[1], limit * LIMIT_SHARE)],
			[height, WIND_TOP],
			height,
			(value) => toSpeed(value, units.wind),
			(shown) => rounded(shown, 0)
		)
	);
}
