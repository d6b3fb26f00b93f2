import type { Hours } from '../../api/hours';
import {
	flagBit,
	SAND_STATES,
	SLOT_FLAGS,
	WET_FILM,
	WET_HOUR,
	type FaceConditions,
	type SlotWeather
} from '../../engine';
import { spansWhere, type Axis, type Span } from './axis';

const rounded = (value: number, decimals: number): number | null =>
	Number.isFinite(value) ? Number(value.toFixed(decimals)) : null;

/** Spans in which a face is wet with dew: wet spells that no rain began. */
function dewSpans(face: FaceConditions, axis: Axis): Span[] {
	const { hourlyPrecipitation } = face.weather;
	let raining = false;
	return spansWhere(axis.slotCount, (i) => {
		const slot = i + axis.offset;
		const wet = face.film[slot] >= WET_FILM;
		if (hourlyPrecipitation[slot] >= WET_HOUR) raining = true;
		else if (!wet) raining = false;
		return wet && !raining;
	});
}

/** The weather bands of the page, one value a slot of its axis. */
export function bandsOf(
	weather: SlotWeather,
	axis: Axis,
	face: FaceConditions | null
): Hours['bands'] {
	const series = (values: Float64Array, decimals: number): (number | null)[] =>
		Array.from({ length: axis.slotCount }, (_, i) => rounded(values[i + axis.offset], decimals));
	return {
		airTemperature: series(weather.airTemperature, 2),
		dewPoint: series(weather.dewPoint, 2),
		windSpeed: series(weather.windSpeed, 2),
		windGust: series(weather.windGust, 2),
		windDirection: series(weather.windDirection, 0).map((it) => (it === -1 ? null : it)),
		hourlyPrecipitation: series(weather.hourlyPrecipitation, 2),
		dew: face === null ? [] : dewSpans(face, axis),
		sand: SAND_STATES.flatMap((state, code) =>
			state === 'none'
				? []
				: spansWhere(axis.slotCount, (i) => weather.sand[i + axis.offset] === code).map((span) => ({
						...span,
						state
					}))
		).sort((a, b) => a.from - b.from),
		flags: SLOT_FLAGS.flatMap((flag) =>
			spansWhere(axis.slotCount, (i) => (weather.flags[i + axis.offset] & flagBit(flag)) !== 0).map(
				(span) => ({ ...span, flag })
			)
		)
	};
}

/** Bands of a page without a forecast: nothing known. */
export function emptyBands(slotCount: number): Hours['bands'] {
	const unknown = (): null[] => Array.from({ length: slotCount }, () => null);
	return {
		airTemperature: unknown(),
		dewPoint: unknown(),
		windSpeed: unknown(),
		windGust: unknown(),
		windDirection: unknown(),
		hourlyPrecipitation: unknown(),
		dew: [],
		sand: [],
		flags: []
	};
}
