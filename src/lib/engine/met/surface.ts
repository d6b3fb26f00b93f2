import { saturationPressureOverIce, saturationPressureOverWater } from './humidity';
import { STEFAN_BOLTZMANN } from './longwave';

/**
 * Temperature and wetness of a face: one areal heat balance, semi-implicit,
 *
 *   C dTs/dt = a·I + ε(L_in − σTs⁴) + h(v)(Ta − Ts) + U(Ti − Ts) + λ·ṁ
 *
 * with a film of water that dew and rain fill and evaporation empties. °C, hPa, m/s, mm, W/m².
 */

/** 0 °C, K. */
export const KELVIN = 273.15;
const VAPOUR_GAS_CONSTANT = 461.52;
const DRY_AIR_GAS_CONSTANT = 287.05;
const AIR_HEAT_CAPACITY = 1006;
/** Lewis number of moist air to the power ⅔. */
const LEWIS_TWO_THIRDS = 0.9;
/** Latent heats at 0 °C, J/kg; they change by under 4 % over the range met ashore. */
export const VAPORISATION = 2.501e6;
export const SUBLIMATION = 2.834e6;

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
	/** 1 where the face has been washed by the slot's start; null or absent where it never was. */
	readonly washed?: Uint8Array | null;
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
