import { STEFAN_BOLTZMANN } from './longwave';
import {
	KELVIN,
	saturationDensity,
	SUBLIMATION,
	VAPORISATION,
	type SurfaceBody,
	type SurfaceDrive
} from './surface';

/** The heat balance of a face stepped through a grid of quarter-hours. */

const SLOT_SECONDS = 900;
/** Steps of the balance in a quarter-hour: of five minutes, or one for the members of an ensemble. */
export type StepsPerSlot = 1 | 3;
/** A start without history cycles this much of what follows once, dry. */
const CYCLE_SLOTS = 96;

/** State carried from slot to slot; scratch of one run. */
interface SurfaceState {
	temperature: number;
	core: number;
	film: number;
}

/** Runs slots [from, to) from `state`, writing the state at each slot's start where asked. */
function advance(
	drive: SurfaceDrive,
	shortwave: Float64Array,
	body: SurfaceBody,
	state: SurfaceState,
	from: number,
	to: number,
	dry: boolean,
	stepsPerSlot: StepsPerSlot,
	temperature: Float64Array | null,
	film: Float64Array | null
): void {
	const dt = SLOT_SECONDS / stepsPerSlot;
	const { emissivity, insideU, runOffDepth, conductance } = body;
	const twoNodes = body.nodes === 2;
	const capacityRate = (twoNodes ? body.heatCapacity / 2 : body.heatCapacity) / dt;
	const frontU = twoNodes ? conductance : insideU;
	const lastSlot = drive.airTemperature.length - 1;
	let surface = state.temperature;
	let core = state.core;
	let water = state.film;
	for (let i = from; i < to; i++) {
		if (!dry && drive.washed?.[i] === 1) water = runOffDepth;
		if (temperature !== null) temperature[i] = surface;
		const rain = drive.rain[i];
		if (film !== null) film[i] = rain === rain ? water : NaN;
		// Instants at both ends of the slot, meant over it; the last slot has only its start.
		const next =
			i < lastSlot && drive.airTemperature[i + 1] === drive.airTemperature[i + 1] ? i + 1 : i;
		const air = 0.5 * (drive.airTemperature[i] + drive.airTemperature[next]);
		const vapour = 0.5 * (drive.vapourDensity[i] + drive.vapourDensity[next]);
		const settles = 0.5 * (drive.condensationPoint[i] + drive.condensationPoint[next]);
		const h = 0.5 * (drive.heatTransfer[i] + drive.heatTransfer[next]);
		const k = 0.5 * (drive.vapourTransfer[i] + drive.vapourTransfer[next]);
		const longwave = 0.5 * (drive.longwave[i] + drive.longwave[next]);
		const inside = drive.insideTemperature[i];
		const gain = body.solarAbsorptance * shortwave[i] + emissivity * longwave + h * air;
		const rainPerStep = dry ? 0 : rain / stepsPerSlot;
		for (let step = 0; step < stepsPerSlot; step++) {
			if (rainPerStep > 0) water = Math.min(water + rainPerStep, runOffDepth);
			const kelvin = surface + KELVIN;
			const cubed = STEFAN_BOLTZMANN * emissivity * kelvin * kelvin * kelvin;
			const behind = twoNodes ? core : inside;
			// Emission linearised about the present temperature: σT⁴ + 4σT³(T′ − T).
			const slope = capacityRate + 4 * cubed + h + frontU;
			let source =
				capacityRate * surface + gain - cubed * kelvin + 4 * cubed * surface + frontU * behind;
			let condensed = 0;
			if ((water > 0 || surface < settles) && !dry) {
				const saturation = saturationDensity(surface);
				// d ln ρ/dT of Magnus' form less the 1/T of the gas law.
				const frozen = surface < 0;
				const rise = frozen
					? (22.46 * 272.62) / (272.62 + surface) ** 2
					: (17.62 * 243.12) / (243.12 + surface) ** 2;
				const saturationSlope = saturation * (rise - 1 / kelvin);
				const latent = frozen ? SUBLIMATION : VAPORISATION;
				const wetSlope = slope + latent * k * saturationSlope;
				const wetSource = source + latent * k * (vapour - saturation + saturationSlope * surface);
				const wetSurface = wetSource / wetSlope;
				condensed = k * (vapour - saturation - saturationSlope * (wetSurface - surface)) * dt;
				// Evaporation ends with the film: no more heat leaves than the water there can carry.
				if (condensed < -water) {
					condensed = -water;
				}
				source += (latent * condensed) / dt;
			}
			const before = surface;
			surface = source / slope;
			if (twoNodes) {
				core =
					(capacityRate * core + conductance * (surface + before) * 0.5 + insideU * inside) /
					(capacityRate + conductance + insideU);
			}
			water = Math.min(Math.max(water + condensed, 0), runOffDepth);
		}
		// Rain unknown: it may have rained, so what follows starts wet.
		if (!dry && rain !== rain) water = runOffDepth;
	}
	state.temperature = surface;
	state.core = core;
	state.film = water;
}

const known = (drive: SurfaceDrive, shortwave: Float64Array, i: number): boolean => {
	const sum =
		drive.airTemperature[i] +
		drive.vapourDensity[i] +
		drive.heatTransfer[i] +
		drive.longwave[i] +
		drive.insideTemperature[i] +
		shortwave[i];
	return sum === sum;
};

/**
 * Runs the balance over a grid of quarter-hours, writing temperature (°C) and film (mm) at slot
 * starts. NaN drives give NaN in that slot; the run starts again after the gap, wet. Every start
 * cycles the day after it once with a dry film, so that it does not remember a guessed temperature.
 *
 * @param stepsPerSlot - one step a slot is within 0.3 K root mean square of three (benchmark)
 * @returns slots at which the run started (again)
 */
export function runSurface(
	drive: SurfaceDrive,
	shortwave: Float64Array,
	body: SurfaceBody,
	temperature: Float64Array,
	film: Float64Array,
	stepsPerSlot: StepsPerSlot = 3
): number[] {
	const count = temperature.length;
	const starts: number[] = [];
	let i = 0;
	while (i < count) {
		if (!known(drive, shortwave, i)) {
			temperature[i] = NaN;
			film[i] = NaN;
			i++;
			continue;
		}
		let end = i + 1;
		while (end < count && known(drive, shortwave, end)) end++;
		const air = drive.airTemperature[i];
		const state: SurfaceState = { temperature: air, core: air, film: 0 };
		advance(
			drive,
			shortwave,
			body,
			state,
			i,
			Math.min(i + CYCLE_SLOTS, end),
			true,
			stepsPerSlot,
			null,
			null
		);
		// What fell or settled in a gap nobody knows: the face comes out of it wet.
		state.film = starts.length === 0 ? 0 : body.runOffDepth;
		advance(drive, shortwave, body, state, i, end, false, stepsPerSlot, temperature, film);
		starts.push(i);
		i = end;
	}
	return starts;
}

/**
 * The first slot start at which a face wet to run-off at a slot's start is dry again; +Infinity
 * where the grid, or what is known of it, ends first.
 *
 * @param temperature - °C of the face as it is wetted
 * @param wetFilm - mm from which it counts as wet
 */
export function driedFrom(
	drive: SurfaceDrive,
	shortwave: Float64Array,
	body: SurfaceBody,
	slot: number,
	temperature: number,
	wetFilm: number
): number {
	const count = drive.airTemperature.length;
	const state: SurfaceState = { temperature, core: temperature, film: body.runOffDepth };
	for (let i = slot; i < count; i++) {
		if (!known(drive, shortwave, i) || drive.rain[i] !== drive.rain[i]) return Infinity;
		advance(drive, shortwave, body, state, i, i + 1, false, 3, null, null);
		if (state.film < wetFilm) return i + 1;
	}
	return Infinity;
}
