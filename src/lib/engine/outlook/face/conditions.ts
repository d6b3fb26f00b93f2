import { fillFaceIrradiance, skyView } from '../../met/irradiance';
import { STEFAN_BOLTZMANN } from '../../met/longwave';
import { MATERIAL_DEFAULTS, RUN_OFF_DEPTH } from '../../met/materials';
import { runSurface, type SurfaceBody, type SurfaceDrive } from '../../met/surface';
import { airAtFace, DEFAULT_ROUGHNESS } from './airAtFace';
import type { Face, Shelter } from './face';
import { flagBit } from '../weather/flags';
import { shelterFactors } from './shelter';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions, type SlotWeather } from '../weather/slots';

const KELVIN = 273.15;
const DEFAULT_ALBEDO = 0.2;
/** History that makes a start trustworthy, and how long a start without it is flagged. */
const HISTORY_SLOTS = (24 * 3600) / SLOT_SECONDS;
const ASSUMED_SLOTS = (6 * 3600) / SLOT_SECONDS;

/** The face as a body: what it states, else what its material has, else a GRP hull. */
function bodyOf(face: Face): SurfaceBody {
	const defaults = MATERIAL_DEFAULTS[face.material ?? 'grp'];
	return {
		heatCapacity: face.heatCapacity ?? defaults.heatCapacity,
		nodes: face.heatCapacity === undefined ? defaults.nodes : 1,
		conductance: face.heatCapacity === undefined ? defaults.conductance : 0,
		solarAbsorptance: face.solarAbsorptance,
		emissivity: face.emissivity,
		insideU: face.inside?.u ?? defaults.insideU,
		runOffDepth: RUN_OFF_DEPTH[face.finish ?? 'gloss']
	};
}

function conditionsOfSide(
	weather: SlotWeather,
	site: Site,
	face: Face,
	azimuth: number,
	shelter: Shelter
): FaceConditions {
	const factors = shelterFactors(shelter);
	const air = airAtFace(weather, factors, site.roughness ?? DEFAULT_ROUGHNESS);
	const { count } = weather.grid;
	const beam = new Float64Array(count);
	const shaded = new Float64Array(count);
	fillFaceIrradiance(weather, face.tilt, azimuth, site.albedo ?? DEFAULT_ALBEDO, beam, shaded);
	const sunlit = new Float64Array(count);
	const longwave = new Float64Array(count);
	const skySeen = skyView(face.tilt) * factors.sky;
	for (let i = 0; i < count; i++) {
		beam[i] *= factors.sun;
		shaded[i] *= factors.sun;
		sunlit[i] = beam[i] + shaded[i];
		const kelvin = air.airTemperature[i] + KELVIN;
		// What is not sky is ground or cover, at air temperature.
		const around = STEFAN_BOLTZMANN * kelvin * kelvin * kelvin * kelvin;
		longwave[i] = around + skySeen * (weather.skyLongwave[i] - around);
	}
	const drive: SurfaceDrive = {
		airTemperature: air.airTemperature,
		vapourDensity: air.vapourDensity,
		condensationPoint: air.condensationPoint,
		heatTransfer: air.heatTransfer,
		vapourTransfer: air.vapourTransfer,
		longwave,
		insideTemperature:
			face.inside?.temperature === undefined
				? air.dayMean
				: new Float64Array(count).fill(face.inside.temperature),
		rain: air.rain
	};
	const body = bodyOf(face);
	const surfaceShaded = new Float64Array(count);
	const film = new Float64Array(count);
	const starts = runSurface(drive, shaded, body, surfaceShaded, film);
	const surfaceSunlit = new Float64Array(count);
	runSurface(drive, sunlit, body, surfaceSunlit, new Float64Array(count));
	const spread = new Float64Array(count);
	for (let i = 0; i < count; i++) spread[i] = surfaceShaded[i] - air.dewPoint[i];

	const flags = weather.flags.slice();
	const issuedSlot = (weather.issuedAt - weather.grid.start) / SLOT_SECONDS;
	for (const start of starts) {
		if (start + HISTORY_SLOTS <= issuedSlot) continue;
		const end = Math.min(start + ASSUMED_SLOTS, count);
		for (let i = start; i < end; i++) flags[i] |= flagBit('assumed');
	}
	return {
		weather,
		airTemperature: air.airTemperature,
		dewPoint: air.dewPoint,
		relativeHumidity: air.relativeHumidity,
		surfaceShaded,
		surfaceSunlit,
		film,
		spread,
		beam,
		rainReaches: !factors.rain,
		dustReaches: !factors.dust,
		windFactor: factors.wind,
		flags
	};
}

/**
 * What a face meets under a shelter: two runs of the heat balance, shaded and sunlit. Two entries
 * where the part has two sides, the second looking the other way; else one.
 */
export function faceConditions(
	weather: SlotWeather,
	site: Site,
	face: Face,
	shelter: Shelter
): FaceConditions[] {
	const sides =
		face.bothSides === true ? [face.azimuth, (face.azimuth + 180) % 360] : [face.azimuth];
	return sides.map((azimuth) => conditionsOfSide(weather, site, face, azimuth, shelter));
}
