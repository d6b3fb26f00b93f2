import { gustAtHeight, meanAtHeight } from '../../met/wind';
import type { Limits } from '../../coating/limits';
import { LIMITERS, type Limiter } from '../../vocabulary';
import { DEFAULT_ROUGHNESS } from '../face/airAtFace';
import type { ErrorQuantity, ErrorSeries } from './errors';
import type { LimitName, LimitUnit, Phase } from './result';
import {
	DIRECT_SUN,
	directSunRoom,
	distanceRoom,
	filmRoom,
	rainRoom,
	sandRoom,
	trendRoom,
	type RoomSeries
} from './roomSeries';
import type { Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';
import type { Step } from './step';

/**
 * The one place where limits are judged: every limit of a step becomes a track of rooms over the
 * slots, and states, stretches and readings are all drawn from the tracks.
 */
export interface LimitTrack extends RoomSeries {
	readonly limit: LimitName;
	readonly phase: Phase;
	/** Code of LIMITERS that this limit shuts with. */
	readonly limiter: number;
	readonly side: 'least' | 'most' | 'in';
	readonly unit: LimitUnit;
	/** What the value is held against; per slot where it moves, null where in or out. */
	readonly bound: number | Float64Array | null;
	readonly error: Float64Array | null;
	/** Slot at which a windowed track binds; null where it is the slot itself. */
	readonly at: Int32Array | null;
	/** The face's temperature, where a film below freezing is called frost. */
	readonly freezes: Float64Array | null;
	/** Worked out by the engine rather than read from the forecast. */
	readonly modelled: boolean;
	readonly face: FaceConditions;
	/** Which of the conditions given. */
	readonly faceIndex: number;
}

export const limiterCode = (limiter: Limiter): number => LIMITERS.indexOf(limiter);

/** Height at which a method's wind limit is judged, m. */
const WORK_HEIGHT = 2;

/** Mean and gust at the step's work height behind the shelter, m/s. */
export function workWind(
	face: FaceConditions,
	site: Site,
	height: number = WORK_HEIGHT
): { mean: Float64Array; gust: Float64Array } {
	const { weather, windFactor } = face;
	const roughness = site.roughness ?? DEFAULT_ROUGHNESS;
	const scale = meanAtHeight(1, roughness, height);
	const count = weather.grid.count;
	const mean = new Float64Array(count);
	const gust = new Float64Array(count);
	for (let i = 0; i < count; i++) {
		const there = weather.windSpeed[i] * scale;
		mean[i] = there * windFactor;
		gust[i] = gustAtHeight(weather.windSpeed[i], weather.windGust[i], there) * windFactor;
	}
	return { mean, gust };
}

/** The parts of a track that say which limit it is. */
interface TrackName {
	readonly limit: LimitName;
	readonly limiter: Limiter;
	readonly side: LimitTrack['side'];
	readonly unit: LimitUnit;
	readonly bound: LimitTrack['bound'];
	readonly error?: Float64Array;
	readonly freezes?: Float64Array;
	readonly modelled?: boolean;
}

/** Builds the tracks of the apply phase of one face. */
export function applyTracks(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	site: Site,
	errors: ErrorSeries
): LimitTrack[] {
	const { limits } = step;
	const tracks: LimitTrack[] = [];
	const add = (name: TrackName, series: RoomSeries): void => {
		tracks.push({
			limit: name.limit,
			phase: 'apply',
			limiter: limiterCode(name.limiter),
			side: name.side,
			unit: name.unit,
			bound: name.bound,
			error: name.error ?? null,
			at: null,
			freezes: name.freezes ?? null,
			modelled: name.modelled ?? false,
			face,
			faceIndex,
			value: series.value,
			scaled: series.scaled
		});
	};
	const distance = (
		limit: LimitName,
		limiter: Limiter,
		side: 'least' | 'most',
		unit: LimitUnit,
		value: Float64Array,
		bound: number | undefined,
		quantity: ErrorQuantity,
		modelled = false
	): void => {
		if (bound === undefined) return;
		const error = errors[quantity];
		add(
			{ limit, limiter, side, unit, bound, error, modelled },
			distanceRoom(value, bound, side, error)
		);
	};

	const air = limits.airTemperature;
	distance(
		'airTemperature',
		'cold',
		'least',
		'celsius',
		face.airTemperature,
		air?.min,
		'airTemperature'
	);
	distance(
		'airTemperature',
		'hot',
		'most',
		'celsius',
		face.airTemperature,
		air?.max,
		'airTemperature'
	);
	const surface = limits.surfaceTemperature;
	// The coldest and the warmest spot must both be inside.
	distance(
		'surfaceTemperature',
		'cold',
		'least',
		'celsius',
		face.surfaceShaded,
		surface?.min,
		'surfaceTemperature',
		true
	);
	distance(
		'surfaceTemperature',
		'hot',
		'most',
		'celsius',
		face.surfaceSunlit,
		surface?.max,
		'surfaceTemperature',
		true
	);
	const humidity = limits.relativeHumidity;
	distance(
		'relativeHumidity',
		'damp',
		'most',
		'percent',
		face.relativeHumidity,
		humidity?.max,
		'relativeHumidity'
	);
	distance(
		'relativeHumidity',
		'dry',
		'least',
		'percent',
		face.relativeHumidity,
		humidity?.min,
		'relativeHumidity'
	);
	distance('spread', 'dew', 'least', 'kelvin', face.spread, limits.spread?.min, 'spread', true);
	if (limits.wind !== undefined || limits.gust !== undefined) {
		const wind = workWind(face, site, limits.windHeight);
		distance('wind', 'wind', 'most', 'metresPerSecond', wind.mean, limits.wind?.max, 'wind');
		distance('gust', 'wind', 'most', 'metresPerSecond', wind.gust, limits.gust?.max, 'gust');
	}
	addInOrOut(limits, face, errors, add);
	return tracks;
}

function addInOrOut(
	limits: Limits,
	face: FaceConditions,
	errors: ErrorSeries,
	add: (name: TrackName, series: RoomSeries) => void
): void {
	if (limits.rainFree === true && face.rainReaches) {
		add(
			{ limit: 'rain', limiter: 'rain', side: 'most', unit: 'millimetres', bound: null },
			rainRoom(face.weather)
		);
	}
	if (limits.drySurface === true) {
		add(
			{
				limit: 'film',
				limiter: 'wet',
				side: 'most',
				unit: 'millimetres',
				bound: null,
				freezes: face.surfaceShaded,
				modelled: true
			},
			filmRoom(face.film)
		);
	}
	if (limits.noDirectSun === true) {
		add(
			{
				limit: 'directSun',
				limiter: 'sun',
				side: 'most',
				unit: 'wattsPerSquareMetre',
				bound: DIRECT_SUN,
				modelled: true
			},
			directSunRoom(face.beam)
		);
	}
	if (limits.surfaceTrend !== undefined) {
		const falling = limits.surfaceTrend === 'falling';
		add(
			{
				limit: 'surfaceTrend',
				limiter: falling ? 'rising' : 'falling',
				side: falling ? 'most' : 'least',
				unit: 'kelvin',
				bound: 0,
				modelled: true
			},
			trendRoom(face.surfaceShaded, limits.surfaceTrend)
		);
	}
	if (limits.sand === 'none' && face.dustReaches && face.weather.sandStated) {
		add(
			{
				limit: 'sand',
				limiter: 'sand',
				side: 'most',
				unit: 'metresPerSecond',
				bound: face.weather.sandLiftGust,
				error: errors.gust,
				modelled: true
			},
			sandRoom(face.weather, errors.gust)
		);
	}
}
