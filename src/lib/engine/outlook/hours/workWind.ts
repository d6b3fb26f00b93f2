import { gustAtHeight, meanAtHeight } from '../../met/wind';
import { leeShares } from '../face/lee';
import { DEFAULT_ROUGHNESS, type Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';

/** Height at which a method's wind limit is judged, m. */
const WORK_HEIGHT = 2;

/** Mean and gust at the step's work height behind lee and shelter, m/s. */
export interface WorkWind {
	readonly mean: Float64Array;
	readonly gust: Float64Array;
}

const remembered = new WeakMap<FaceConditions['weather'], Map<string, WorkWind>>();

/**
 * Mean and gust at a work height behind the stand's lee and the shelter, m/s. The lee breaks the
 * mean, not the gust's excess over it, which the wake of a hedge or wall does not calm; the shelter
 * takes its share of both. Once per weather, height and shelter, where no lee is stated.
 */
export function workWind(face: FaceConditions, site: Site, height: number = WORK_HEIGHT): WorkWind {
	const { weather, windFactor } = face;
	const roughness = site.roughness ?? DEFAULT_ROUGHNESS;
	const lee = leeShares(weather, face.lee, height, 'inNone');
	// Every stand has a lee of its own: kept for all of them they would fill the memory.
	if (lee !== null) return windBehind(face, meanAtHeight(1, roughness, height), lee);
	const key = `${roughness} ${height} ${windFactor}`;
	const ofWeather = remembered.get(weather) ?? new Map<string, WorkWind>();
	remembered.set(weather, ofWeather);
	const wind = ofWeather.get(key) ?? windBehind(face, meanAtHeight(1, roughness, height), null);
	ofWeather.set(key, wind);
	return wind;
}

function windBehind(
	{ weather, windFactor }: FaceConditions,
	scale: number,
	lee: Float64Array | null
): WorkWind {
	const count = weather.grid.count;
	const mean = new Float64Array(count);
	const gust = new Float64Array(count);
	for (let i = 0; i < count; i++) {
		const there = weather.windSpeed[i] * scale * (lee === null ? 1 : lee[i]);
		mean[i] = there * windFactor;
		gust[i] = gustAtHeight(weather.windSpeed[i], weather.windGust[i], there) * windFactor;
	}
	return { mean, gust };
}
