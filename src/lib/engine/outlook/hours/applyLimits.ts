import type { Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';
import type { ErrorSeries } from './errors';
import { limitOn, type Limit } from './limit';
import { DIRECT_SUN, directSunRoom, rainRoom, trendRoom } from './roomSeries';
import { filmLimit, rainLimit, sandCounts, sandLimit, spreadLimit } from './sharedLimits';
import type { Step } from './step';
import { workWind } from './workWind';

const APPLY = 'apply' as const;

/** The limits of the apply phase that ask the air alone, whatever way the face looks. */
export function airLimits(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	site: Site,
	errors: ErrorSeries
): Limit[] {
	const { airTemperature, relativeHumidity, wind, gust, windHeight, rainFree } = step.limits;
	const list: Limit[] = [];
	const air = (side: Limit['side'], bound: number): Limit =>
		limitOn(face, faceIndex, side === 'least' ? 'cold' : 'hot', {
			limit: 'airTemperature',
			phase: APPLY,
			side,
			unit: 'celsius',
			value: face.airTemperature,
			bound,
			error: errors.airTemperature
		});
	if (airTemperature?.min !== undefined) list.push(air('least', airTemperature.min));
	if (airTemperature?.max !== undefined) list.push(air('most', airTemperature.max));
	const humidity = (side: Limit['side'], bound: number): Limit =>
		limitOn(face, faceIndex, side === 'least' ? 'dry' : 'damp', {
			limit: 'relativeHumidity',
			phase: APPLY,
			side,
			unit: 'percent',
			value: face.relativeHumidity,
			bound,
			error: errors.relativeHumidity
		});
	if (relativeHumidity?.max !== undefined) list.push(humidity('most', relativeHumidity.max));
	if (relativeHumidity?.min !== undefined) list.push(humidity('least', relativeHumidity.min));
	if (wind !== undefined || gust !== undefined) {
		const there = workWind(face, site, windHeight);
		const windy = (limit: 'wind' | 'gust', value: Float64Array, bound: number): Limit =>
			limitOn(face, faceIndex, 'wind', {
				limit,
				phase: APPLY,
				side: 'most',
				unit: 'metresPerSecond',
				value,
				bound,
				error: errors[limit]
			});
		if (wind !== undefined) list.push(windy('wind', there.mean, wind.max));
		if (gust !== undefined) list.push(windy('gust', there.gust, gust.max));
	}
	if (rainFree === true && face.rainReaches)
		list.push(rainLimit(face, faceIndex, APPLY, rainRoom(face.weather)));
	if (sandCounts(step, face)) list.push(sandLimit(face, faceIndex, APPLY, errors));
	return list;
}

/** The limits of the apply phase that ask the surface itself. */
export function faceLimits(
	{ limits }: Step,
	face: FaceConditions,
	faceIndex: number,
	errors: ErrorSeries
): Limit[] {
	const { surfaceTemperature, spread, drySurface, noDirectSun, surfaceTrend } = limits;
	const list: Limit[] = [];
	const surface = (side: Limit['side'], value: Float64Array, bound: number): Limit =>
		limitOn(face, faceIndex, side === 'least' ? 'cold' : 'hot', {
			limit: 'surfaceTemperature',
			phase: APPLY,
			side,
			unit: 'celsius',
			value,
			bound,
			error: errors.surfaceTemperature,
			modelled: true
		});
	// The coldest and the warmest spot must both be inside.
	if (surfaceTemperature?.min !== undefined)
		list.push(surface('least', face.surfaceShaded, surfaceTemperature.min));
	if (surfaceTemperature?.max !== undefined)
		list.push(surface('most', face.surfaceSunlit, surfaceTemperature.max));
	if (spread !== undefined) list.push(spreadLimit(face, faceIndex, APPLY, spread.min, errors));
	if (drySurface === true) list.push(filmLimit(face, faceIndex, APPLY));
	if (noDirectSun === true) {
		const { value, rooms } = directSunRoom(face.beam);
		list.push(
			limitOn(face, faceIndex, 'sun', {
				limit: 'directSun',
				phase: APPLY,
				side: 'most',
				unit: 'wattsPerSquareMetre',
				value,
				rooms,
				bound: DIRECT_SUN,
				modelled: true
			})
		);
	}
	if (surfaceTrend !== undefined) {
		const { value, rooms } = trendRoom(face.surfaceShaded, surfaceTrend);
		const isFalling = surfaceTrend === 'falling';
		list.push(
			limitOn(face, faceIndex, isFalling ? 'rising' : 'falling', {
				limit: 'surfaceTrend',
				phase: APPLY,
				side: isFalling ? 'most' : 'least',
				unit: 'kelvin',
				value,
				rooms,
				bound: 0,
				modelled: true
			})
		);
	}
	return list;
}
