import type { LeeSector } from '../face/lee';

/** Length of a slot, seconds. Slot i of a grid is [start + i·900, start + (i + 1)·900). */
export const SLOT_SECONDS = 900;

/** A run of quarter-hours, UTC. `start` is epoch seconds on a quarter-hour. */
export interface SlotGrid {
	readonly start: number;
	readonly count: number;
}

/**
 * The weather of the open yard and the sun, per slot of a grid, at slot starts.
 * NaN is a missing value. All arrays have `grid.count` entries unless said.
 */
export interface SlotWeather {
	readonly grid: SlotGrid;
	/** UTC epoch seconds; leads are counted from here. */
	readonly issuedAt: number;
	/** °C */
	readonly airTemperature: Float64Array;
	/** °C, over water */
	readonly dewPoint: Float64Array;
	/** %, over water */
	readonly relativeHumidity: Float64Array;
	/** hPa at station level */
	readonly pressure: Float64Array;
	/** m/s at 10 m */
	readonly windSpeed: Float64Array;
	/** m/s at 10 m, the maximum of the slot's hour, held over it */
	readonly windGust: Float64Array;
	/** Degrees the wind comes from; −1 where variable. */
	readonly windDirection: Float64Array;
	/** mm in the slot */
	readonly precipitation: Float64Array;
	/** mm in the slot's hour */
	readonly hourlyPrecipitation: Float64Array;
	/** %; NaN where the forecast has none */
	readonly precipitationProbability: Float64Array;
	/** Fraction of sky, 0 to 1 */
	readonly cloudCover: Float64Array;
	/** W/m² on the horizontal, direct normal, diffuse; means over the slot */
	readonly ghi: Float64Array;
	readonly dni: Float64Array;
	readonly dhi: Float64Array;
	/** Degrees at the middle of the slot; azimuth from north clockwise. */
	readonly sunAltitude: Float64Array;
	readonly sunAzimuth: Float64Array;
	/** hPa */
	readonly vapourPressure: Float64Array;
	/** W/m² of long wave down from the whole open sky */
	readonly skyLongwave: Float64Array;
	/** 1 where the gust is worked out from the mean. */
	readonly gustDerived: Uint8Array;
	/** Bits of SLOT_FLAGS. */
	readonly flags: Uint8Array;
	/** Codes of SAND_STATES (255 unknown); gust threshold of lifting at 10 m, m/s. */
	readonly sand: Uint8Array;
	readonly sandLiftGust: Float64Array;
	/** False where a loose-sand sector was never stated. */
	readonly sandStated: boolean;
	/** First slot with a forecast hour behind it, and one past the last. */
	readonly knownFrom: number;
	readonly knownTo: number;
}

/** What one face meets, per slot. NaN is missing. Under a cover these are the values at the face. */
export interface FaceConditions {
	readonly weather: SlotWeather;
	/** °C, °C, % at the face */
	readonly airTemperature: Float64Array;
	readonly dewPoint: Float64Array;
	readonly relativeHumidity: Float64Array;
	/** °C, the run without beam, and the run with it */
	readonly surfaceShaded: Float64Array;
	readonly surfaceSunlit: Float64Array;
	/** mm of water on the shaded run */
	readonly film: Float64Array;
	/** K: shaded surface minus dew point */
	readonly spread: Float64Array;
	/** W/m² of direct sun on the face */
	readonly beam: Float64Array;
	/** Rain reaches the face. */
	readonly rainReaches: boolean;
	/** Blowing sand reaches the face. */
	readonly dustReaches: boolean;
	/** Factor of the shelter on mean and gust. */
	readonly windFactor: number;
	/** From where the wind is broken at the stand. */
	readonly lee: readonly LeeSector[];
	/** The first slot start at which the face, washed by a slot's start, is dry again; +Infinity: not in sight. Null in members. */
	readonly dries: ((slot: number) => number) | null;
	/** Bits of SLOT_FLAGS: the weather's and the face's own. */
	readonly flags: Uint8Array;
}
