import {
	dewPointFromVapourPressure,
	frostPointFromVapourPressure,
	saturationPressureOverWater,
	vapourDensity
} from '../../met/humidity';
import { STEFAN_BOLTZMANN } from '../../met/longwave';
import { convection, vapourTransfer } from '../../met/surface';
import { logProfileFactor } from '../../met/wind';
import type { ShelterFactors } from './face';
import { leeShares, type LeeSector } from './lee';
import { SLOT_SECONDS, type SlotWeather } from '../weather/slots';

const FACE_HEIGHT = 2;
const KELVIN = 273.15;
const SLOTS_PER_DAY = (24 * 3600) / SLOT_SECONDS;

/** The air a face meets under a shelter, whatever way it looks. Shared by faces. */
export interface AirAtFace {
	readonly airTemperature: Float64Array;
	readonly dewPoint: Float64Array;
	readonly relativeHumidity: Float64Array;
	/** kg/m³ */
	readonly vapourDensity: Float64Array;
	/** °C: dew point, or frost point below 0 °C */
	readonly condensationPoint: Float64Array;
	/** W/m²K and m/s */
	readonly heatTransfer: Float64Array;
	readonly vapourTransfer: Float64Array;
	/** °C: mean of the air over the 24 h before; in the first day, that day's mean. */
	readonly dayMean: Float64Array;
	/** mm per slot that reaches the face */
	readonly rain: Float64Array;
	/** W/m² of long wave from what is at air temperature, and what the open sky sends beyond that. */
	readonly surroundings: Float64Array;
	readonly skyExcess: Float64Array;
}

/** Mean over the 24 h before each slot; in the first day that day's mean. Unknown slots are passed over. */
function runningDayMean(values: Float64Array): Float64Array {
	const out = new Float64Array(values.length);
	let sum = 0;
	let known = 0;
	const take = (i: number, sign: 1 | -1): void => {
		const value = values[i];
		if (value !== value) return;
		sum += sign * value;
		known += sign;
	};
	const first = Math.min(SLOTS_PER_DAY, values.length);
	for (let i = 0; i < first; i++) take(i, 1);
	for (let i = 0; i < values.length; i++) {
		if (i >= SLOTS_PER_DAY) {
			out[i] = sum / known;
			take(i, 1);
			take(i - SLOTS_PER_DAY, -1);
		} else {
			out[i] = sum / known;
		}
	}
	return out;
}

const remembered = new WeakMap<SlotWeather, Map<string, AirAtFace>>();

/**
 * The air under a shelter. Warming leaves vapour pressure and dew point as they are and recomputes
 * humidity; moisture added or removed moves the dew point. Computed once per weather and shelter.
 */
export function airAtFace(
	weather: SlotWeather,
	factors: ShelterFactors,
	roughness: number
): AirAtFace {
	const key = `${roughness} ${Object.entries(factors).join(' ')}`;
	const ofWeather = remembered.get(weather) ?? new Map<string, AirAtFace>();
	remembered.set(weather, ofWeather);
	const before = ofWeather.get(key);
	if (before !== undefined) return before;

	const { count } = weather.grid;
	const air: AirAtFace = {
		airTemperature: new Float64Array(count),
		dewPoint: new Float64Array(count),
		relativeHumidity: new Float64Array(count),
		vapourDensity: new Float64Array(count),
		condensationPoint: new Float64Array(count),
		heatTransfer: new Float64Array(count),
		vapourTransfer: new Float64Array(count),
		dayMean: new Float64Array(count),
		rain: factors.rain ? new Float64Array(count) : weather.precipitation,
		surroundings: new Float64Array(count),
		skyExcess: new Float64Array(count)
	};
	const windScale = logProfileFactor(roughness, FACE_HEIGHT) * factors.wind;
	const sunHeat = factors.sunHeat ?? 0;
	const warmed = factors.heat !== 0 || sunHeat !== 0;
	const changed = warmed || factors.vapour !== 0;
	for (let i = 0; i < count; i++) {
		const temperature = warmed
			? weather.airTemperature[i] + factors.heat + (sunHeat * weather.ghi[i]) / 1000
			: weather.airTemperature[i];
		const vapour = Math.max(0.01, weather.vapourPressure[i] + factors.vapour);
		const dewPoint =
			factors.vapour === 0 ? weather.dewPoint[i] : dewPointFromVapourPressure(vapour);
		air.airTemperature[i] = temperature;
		air.dewPoint[i] = dewPoint;
		air.relativeHumidity[i] = changed
			? (100 * vapour) / saturationPressureOverWater(temperature)
			: weather.relativeHumidity[i];
		air.vapourDensity[i] = vapourDensity(vapour, temperature);
		air.condensationPoint[i] = dewPoint < 0 ? frostPointFromVapourPressure(vapour) : dewPoint;
		const kelvin = temperature + KELVIN;
		const around = STEFAN_BOLTZMANN * kelvin * kelvin * kelvin * kelvin;
		air.surroundings[i] = around;
		air.skyExcess[i] = weather.skyLongwave[i] - around;
		const h = convection(weather.windSpeed[i] * windScale);
		air.heatTransfer[i] = h;
		air.vapourTransfer[i] = vapourTransfer(h, temperature, weather.pressure[i]);
	}
	air.dayMean.set(runningDayMean(air.airTemperature));
	ofWeather.set(key, air);
	return air;
}

/**
 * The air under a shelter where a lee breaks the wind over the face: less heat and vapour is carried
 * to and from it. In a variable wind the strongest lee counts, in which a face grows coldest at
 * night, warmest in the sun, and dries last.
 */
export function inLee(
	air: AirAtFace,
	weather: SlotWeather,
	factors: ShelterFactors,
	roughness: number,
	lee: readonly LeeSector[]
): AirAtFace {
	const shares = leeShares(weather, lee, FACE_HEIGHT, 'inAll');
	if (shares === null) return air;
	const windScale = logProfileFactor(roughness, FACE_HEIGHT) * factors.wind;
	const heatTransfer = shares.map((share, i) =>
		convection(weather.windSpeed[i] * windScale * share)
	);
	return {
		...air,
		heatTransfer,
		vapourTransfer: heatTransfer.map((h, i) =>
			vapourTransfer(h, air.airTemperature[i], weather.pressure[i])
		)
	};
}
