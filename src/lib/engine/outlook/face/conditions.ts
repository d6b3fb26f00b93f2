import { beamShares, fillFaceIrradiance, skyView } from '../../met/irradiance';
import { MATERIAL_DEFAULTS, RUN_OFF_DEPTH, WET_FILM } from '../../met/materials';
import type { SurfaceBody, SurfaceDrive } from '../../met/surface';
import { driedFrom, runSurface, type StepsPerSlot } from '../../met/surfaceRun';
import { airAtFace, inLee } from './airAtFace';
import type { Face, Shelter, ShelterFactors } from './face';
import { flagBit } from '../weather/flags';
import { shelterFactors } from './shelter';
import { DEFAULT_ROUGHNESS, type Site } from '../weather/site';
import {
	SLOT_SECONDS,
	type FaceConditions,
	type SlotGrid,
	type SlotWeather
} from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';

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
		// A part with two sides has no inside.
		insideU: face.inside?.u ?? (face.bothSides === true ? 0 : defaults.insideU),
		runOffDepth: RUN_OFF_DEPTH[face.finish ?? 'gloss']
	};
}

/** The sunlit share of a face under a yard's sun, kept for its members. */
interface Side {
	readonly azimuth: number;
	readonly shares: Float64Array;
}

/** Light on one side of a face under the open sky. */
interface SideLight {
	readonly beam: Float64Array;
	readonly diffuse: Float64Array;
}

function lightOn(weather: SlotWeather, site: Site, face: Face, side: Side): SideLight {
	const beam = new Float64Array(weather.grid.count);
	const diffuse = new Float64Array(weather.grid.count);
	const albedo = site.albedo ?? DEFAULT_ALBEDO;
	fillFaceIrradiance(weather, side.shares, face.tilt, albedo, beam, diffuse);
	return { beam, diffuse };
}

/** Arrays that a run fills and nobody keeps; thousands of members would leave megabytes of them. */
const scratch = new Map<number, Record<'longwave' | 'sunlit' | 'unseenFilm', Float64Array>>();

function scratchOf(count: number) {
	const made = scratch.get(count) ?? {
		longwave: new Float64Array(count),
		sunlit: new Float64Array(count),
		unseenFilm: new Float64Array(count)
	};
	// Grids of one process are of few lengths; keep the last.
	if (!scratch.has(count)) scratch.clear();
	scratch.set(count, made);
	return made;
}

const scaled = (values: Float64Array, factor: number): Float64Array =>
	factor === 1 ? values : values.map((value) => value * factor);

function conditionsOfSide(
	weather: SlotWeather,
	site: Site,
	face: Face,
	light: SideLight,
	factors: ShelterFactors,
	washed: Uint8Array | null,
	stepsPerSlot: StepsPerSlot
): FaceConditions {
	const roughness = site.roughness ?? DEFAULT_ROUGHNESS;
	const lee = face.lee ?? [];
	const air = inLee(airAtFace(weather, factors, roughness), weather, factors, roughness, lee);
	const { count } = weather.grid;
	const beam = scaled(light.beam, factors.sun);
	const shaded = scaled(light.diffuse, factors.sun);
	const { longwave, sunlit, unseenFilm } = scratchOf(count);
	const skySeen = skyView(face.tilt) * factors.sky;
	let isSunlit = false;
	for (let i = 0; i < count; i++) {
		// What is not sky is ground or cover, at air temperature.
		longwave[i] = air.surroundings[i] + skySeen * air.skyExcess[i];
		sunlit[i] = beam[i] + shaded[i];
		if (beam[i] !== 0) isSunlit = true;
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
		rain: air.rain,
		washed
	};
	const body = bodyOf(face);
	const surfaceShaded = new Float64Array(count);
	const film = new Float64Array(count);
	const starts = runSurface(drive, shaded, body, surfaceShaded, film, stepsPerSlot);
	let surfaceSunlit = surfaceShaded;
	if (isSunlit) {
		surfaceSunlit = new Float64Array(count);
		runSurface(drive, sunlit, body, surfaceSunlit, unseenFilm, stepsPerSlot);
	}
	// The long wave of a run is scratch: what is asked later has its own.
	const kept = stepsPerSlot === 1 ? drive : { ...drive, longwave: longwave.slice() };
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
		lee,
		dries:
			stepsPerSlot === 1
				? null
				: (slot) => driedFrom(kept, shaded, body, slot, surfaceShaded[slot], WET_FILM),
		flags
	};
}

/** Sides of a face: two where the part has two, the second looking the other way; else one. */
function sidesOf(weather: SlotWeather, face: Face): Side[] {
	const azimuths =
		face.bothSides === true ? [face.azimuth, (face.azimuth + 180) % 360] : [face.azimuth];
	return azimuths.map((azimuth) => ({ azimuth, shares: beamShares(weather, face.tilt, azimuth) }));
}

/** 1 at the first slot that begins with each washing done; null without one on the grid. */
function washedSlots({ start, count }: SlotGrid, washedAt: readonly number[]): Uint8Array | null {
	const slots = washedAt
		.map((instant) => Math.ceil((instant - start) / SLOT_SECONDS))
		.filter((slot) => slot >= 0 && slot < count);
	if (slots.length === 0) return null;
	const washed = new Uint8Array(count);
	for (const slot of slots) washed[slot] = 1;
	return washed;
}

/**
 * What a face meets under a shelter: two runs of the heat balance, shaded and sunlit. Two entries
 * where the part has two sides, the second looking the other way; else one.
 *
 * @param washedAt - UTC epoch seconds at which washings of it were done: they wet it to run-off
 */
export function faceConditions(
	weather: SlotWeather,
	site: Site,
	face: Face,
	shelter: Shelter,
	washedAt: readonly number[] = []
): FaceConditions[] {
	const factors = shelterFactors(shelter);
	const washed = washedSlots(weather.grid, washedAt);
	return sidesOf(weather, face).map((side) =>
		conditionsOfSide(weather, site, face, lightOn(weather, site, face, side), factors, washed, 3)
	);
}

/**
 * {@link faceConditions} in every member of a yard's weather, on steps of a quarter-hour: one list
 * of sides per member.
 */
export function memberConditions(
	{ weather, members, site }: YardWeather,
	face: Face,
	shelter: Shelter,
	washedAt: readonly number[] = []
): FaceConditions[][] {
	if (members.length === 0) return [];
	const washed = washedSlots(weather.grid, washedAt);
	const factors = shelterFactors(shelter);
	const sides = sidesOf(weather, face).map((side) => ({
		side,
		light: lightOn(weather, site, face, side)
	}));
	return members.map((member) =>
		sides.map(({ side, light }) => {
			const own = member.ghi === weather.ghi ? light : lightOn(member, site, face, side);
			return conditionsOfSide(member, site, face, own, factors, washed, 1);
		})
	);
}
