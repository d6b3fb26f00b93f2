import { saturationPressureOverIce, saturationPressureOverWater } from './humidity';
import { STEFAN_BOLTZMANN } from './longwave';

/**
 * Temperature and wetness of a face: one areal heat balance, semi-implicit,
 *
 *   C dTs/dt = a·I + ε(L_in − σTs⁴) + h(v)(Ta − Ts) + U(Ti − Ts) + λ·ṁ
 *
 * with a film of water that dew and rain fill and evaporation empties. °C, hPa, m/s, mm, W/m².
 */

const KELVIN = 273.15;
const VAPOUR_GAS_CONSTANT = 461.52;
const DRY_AIR_GAS_CONSTANT = 287.05;
const AIR_HEAT_CAPACITY = 1006;
/** Lewis number of moist air to the power ⅔. */
const LEWIS_TWO_THIRDS = 0.9;
/** Latent heats at 0 °C, J/kg; they change by under 4 % over the range met ashore. */
const VAPORISATION = 2.501e6;
const SUBLIMATION = 2.834e6;

const SLOT_SECONDS = 900;
/** Steps of the balance in a quarter-hour: of five minutes, or one for the members of an ensemble. */
export type StepsPerSlot = 1 | 3;
/** A start without history cycles this much of what follows once, dry. */
const CYCLE_SLOTS = 96;

/** Heat transfer coefficient of a face in wind at 2 m, W/m²K. Source: Watmuff 1977, for 0–7 m/s. */
export function convection(wind2: number): number {
	return 2.8 + 3 * wind2;
}

/** Mass transfer coefficient for vapour, m/s, from the heat transfer coefficient (Lewis relation). */
export function vapourTransfer(
	heatTransfer: number,
	temperature: number,
	pressure: number
): number {
	const density = (pressure * 100) / (DRY_AIR_GAS_CONSTANT * (temperature + KELVIN));
	return heatTransfer / (density * AIR_HEAT_CAPACITY * LEWIS_TWO_THIRDS);
}

/** Density of vapour saturated at a surface temperature, over ice below 0 °C, kg/m³. */
export function saturationDensity(temperature: number): number {
	const pressure =
		temperature < 0
			? saturationPressureOverIce(temperature)
			: saturationPressureOverWater(temperature);
	return (pressure * 100) / (VAPOUR_GAS_CONSTANT * (temperature + KELVIN));
}

/** The face as a body. */
export interface SurfaceBody {
	/** J/m²K */
	readonly heatCapacity: number;
	readonly nodes: 1 | 2;
	/** W/m²K between two nodes. */
	readonly conductance: number;
	readonly solarAbsorptance: number;
	readonly emissivity: number;
	/** W/m²K to the inside. */
	readonly insideU: number;
	/** mm of water before it runs off. */
	readonly runOffDepth: number;
}

/**
 * What drives a face, one value per slot at slot starts; NaN is missing. `rain` is mm reaching the
 * face in the slot.
 */
export interface SurfaceDrive {
	readonly airTemperature: Float64Array;
	/** kg/m³ of vapour in the air. */
	readonly vapourDensity: Float64Array;
	/** °C under which vapour settles on a surface: dew point, or frost point below 0 °C. */
	readonly condensationPoint: Float64Array;
	/** W/m²K */
	readonly heatTransfer: Float64Array;
	/** m/s */
	readonly vapourTransfer: Float64Array;
	/** W/m² of long wave arriving. */
	readonly longwave: Float64Array;
	/** °C of the air inside. */
	readonly insideTemperature: Float64Array;
	readonly rain: Float64Array;
}

/** Fluxes into a face at a state, W/m², and water gained, kg/m²s. */
export interface HeatBalance {
	readonly shortwave: number;
	readonly longwave: number;
	readonly convection: number;
	readonly inside: number;
	readonly latent: number;
	readonly condensation: number;
}

/**
 * The balance at one instant, for checks and for explaining a number.
 *
 * @param shortwave - W/m² arriving on the face
 * @param film - mm of water on it; without one, vapour settles but none leaves
 */
export function heatBalance(
	body: SurfaceBody,
	air: {
		airTemperature: number;
		vapourDensity: number;
		heatTransfer: number;
		vapourTransfer: number;
		longwave: number;
		insideTemperature: number;
	},
	shortwave: number,
	surfaceTemperature: number,
	film: number
): HeatBalance {
	const excess = air.vapourDensity - saturationDensity(surfaceTemperature);
	const condensation = film > 0 || excess > 0 ? air.vapourTransfer * excess : 0;
	return {
		shortwave: body.solarAbsorptance * shortwave,
		longwave:
			body.emissivity * (air.longwave - STEFAN_BOLTZMANN * (surfaceTemperature + KELVIN) ** 4),
		convection: air.heatTransfer * (air.airTemperature - surfaceTemperature),
		inside: body.insideU * (air.insideTemperature - surfaceTemperature),
		latent: (surfaceTemperature < 0 ? SUBLIMATION : VAPORISATION) * condensation,
		condensation
	};
}

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
