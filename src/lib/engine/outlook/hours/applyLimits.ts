import { gustAtHeight, meanAtHeight } from '../../met/wind';
import { DEFAULT_ROUGHNESS } from '../face/airAtFace';
import type { Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';
import type { ErrorSeries } from './errors';
import { limiterCode, type Limit } from './limit';
import { DIRECT_SUN, directSunRoom, filmRoom, rainRoom, trendRoom } from './roomSeries';
import type { Step } from './step';

/** Height at which a method's wind limit is judged, m. */
const WORK_HEIGHT = 2;

/** Mean and gust at the step's work height behind the shelter, m/s. */
export interface WorkWind {
	readonly mean: Float64Array;
	readonly gust: Float64Array;
}

const remembered = new WeakMap<FaceConditions['weather'], Map<string, WorkWind>>();

/** Mean and gust at a work height behind the shelter, m/s; once per weather, height and shelter. */
export function workWind(face: FaceConditions, site: Site, height: number = WORK_HEIGHT): WorkWind {
	const { weather, windFactor } = face;
	const roughness = site.roughness ?? DEFAULT_ROUGHNESS;
	const key = `${roughness} ${height} ${windFactor}`;
	const ofWeather = remembered.get(weather) ?? new Map<string, WorkWind>();
	remembered.set(weather, ofWeather);
	const before = ofWeather.get(key);
	if (before !== undefined) return before;
	const scale = meanAtHeight(1, roughness, height);
	const count = weather.grid.count;
	const mean = new Float64Array(count);
	const gust = new Float64Array(count);
	for (let i = 0; i < count; i++) {
		const there = weather.windSpeed[i] * scale;
		mean[i] = there * windFactor;
		gust[i] = gustAtHeight(weather.windSpeed[i], weather.windGust[i], there) * windFactor;
	}
	const wind = { mean, gust };
	ofWeather.set(key, wind);
	return wind;
}

type Told = Pick<Limit, 'limit' | 'side' | 'unit' | 'value'> & Partial<Limit>;

/** What must hold in the slot itself: the limits of the apply phase on one face. */
export function applyLimits(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	site: Site,
	errors: ErrorSeries
): Limit[] {
	const { limits } = step;
	const list: Limit[] = [];
	const add = (limiter: Parameters<typeof limiterCode>[0], told: Told): void => {
		list.push({
			phase: 'apply',
			limiter: limiterCode(limiter),
			bound: null,
			error: null,
			rooms: null,
			freezes: null,
			modelled: false,
			face,
			faceIndex,
			...told
		});
	};

	const air = limits.airTemperature;
	const ofAir = {
		limit: 'airTemperature',
		unit: 'celsius',
		value: face.airTemperature,
		error: errors.airTemperature
	} as const;
	if (air?.min !== undefined) add('cold', { ...ofAir, side: 'least', bound: air.min });
	if (air?.max !== undefined) add('hot', { ...ofAir, side: 'most', bound: air.max });

	// The coldest and the warmest spot must both be inside.
	const surface = limits.surfaceTemperature;
	const ofSurface = {
		limit: 'surfaceTemperature',
		unit: 'celsius',
		error: errors.surfaceTemperature,
		modelled: true
	} as const;
	if (surface?.min !== undefined)
		add('cold', { ...ofSurface, value: face.surfaceShaded, side: 'least', bound: surface.min });
	if (surface?.max !== undefined)
		add('hot', { ...ofSurface, value: face.surfaceSunlit, side: 'most', bound: surface.max });

	const humidity = limits.relativeHumidity;
	const ofHumidity = {
		limit: 'relativeHumidity',
		unit: 'percent',
		value: face.relativeHumidity,
		error: errors.relativeHumidity
	} as const;
	if (humidity?.max !== undefined)
		add('damp', { ...ofHumidity, side: 'most', bound: humidity.max });
	if (humidity?.min !== undefined)
		add('dry', { ...ofHumidity, side: 'least', bound: humidity.min });

	if (limits.spread !== undefined) {
		add('dew', {
			limit: 'spread',
			side: 'least',
			unit: 'kelvin',
			value: face.spread,
			bound: limits.spread.min,
			error: errors.spread,
			modelled: true
		});
	}
	if (limits.wind !== undefined || limits.gust !== undefined) {
		const wind = workWind(face, site, limits.windHeight);
		const ofWind = { side: 'most', unit: 'metresPerSecond' } as const;
		if (limits.wind !== undefined)
			add('wind', {
				...ofWind,
				limit: 'wind',
				value: wind.mean,
				bound: limits.wind.max,
				error: errors.wind
			});
		if (limits.gust !== undefined)
			add('wind', {
				...ofWind,
				limit: 'gust',
				value: wind.gust,
				bound: limits.gust.max,
				error: errors.gust
			});
	}
	if (limits.rainFree === true && face.rainReaches)
		add('rain', { limit: 'rain', side: 'most', unit: 'millimetres', ...rainRoom(face.weather) });
	if (limits.drySurface === true)
		add('wet', {
			limit: 'film',
			side: 'most',
			unit: 'millimetres',
			...filmRoom(face.film),
			freezes: face.surfaceShaded,
			modelled: true
		});
	if (limits.noDirectSun === true)
		add('sun', {
			limit: 'directSun',
			side: 'most',
			unit: 'wattsPerSquareMetre',
			...directSunRoom(face.beam),
			bound: DIRECT_SUN,
			modelled: true
		});
	if (limits.surfaceTrend !== undefined) {
		const falling = limits.surfaceTrend === 'falling';
		add(falling ? 'rising' : 'falling', {
			limit: 'surfaceTrend',
			side: falling ? 'most' : 'least',
			unit: 'kelvin',
			...trendRoom(face.surfaceShaded, limits.surfaceTrend),
			bound: 0,
			modelled: true
		});
	}
	if (sandCounts(step, face)) add('sand', sandLimit(face, errors));
	return list;
}

/** Whether blowing sand shuts a step on a face: asked for, not kept off, and stated for the yard. */
export function sandCounts({ limits }: Step, face: FaceConditions): boolean {
	return limits.sand === 'none' && face.dustReaches && face.weather.sandStated;
}

/** Sand: the gust at 10 m stays under the one that lifts it. */
export function sandLimit({ weather }: FaceConditions, errors: ErrorSeries) {
	return {
		limit: 'sand',
		side: 'most',
		unit: 'metresPerSecond',
		value: weather.windGust,
		bound: weather.sandLiftGust,
		error: errors.gust,
		modelled: true
	} as const;
}
