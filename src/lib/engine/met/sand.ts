import { saturationDensity } from './surface';

/** Blowing sand. m/s, mm of grain, % of mass, kg/m³. */

const GRAVITY = 9.80665;
const QUARTZ_DENSITY = 2650;
const VON_KARMAN = 0.4;
/** Roughness of loose ground, m. */
const LOOSE_GROUND_ROUGHNESS = 1e-4;
/** Bagnold's constant of the impact threshold in air for grains over 0.2 mm. */
const BAGNOLD_CONSTANT = 0.1;

/** Top layer that dries and lifts: 5 mm of sand at 1600 kg/m³ with 40 % pores. */
const LAYER_MASS = 8;
const LAYER_WATER = 2;
const SLOT_SECONDS = 900;

/** Ratio of wind at 10 m to friction velocity over loose ground. */
const PROFILE = Math.log(10 / LOOSE_GROUND_ROUGHNESS) / VON_KARMAN;

/** Friction velocity of a wind at 10 m over loose ground, m/s. */
export function frictionVelocity(wind10: number): number {
	return wind10 / PROFILE;
}

/** Wind at 10 m of a friction velocity over loose ground, m/s. */
export function windOfFrictionVelocity(velocity: number): number {
	return velocity * PROFILE;
}

/**
 * How much moisture raises the threshold. Source: Fécan, Marticorena and Bergametti 1999:
 * √(1 + 1.21(w − w′)^0.68) over w′ = 0.0014c² + 0.17c, all in per cent.
 */
export function moistureFactor(moisturePercent: number, clayPercent: number): number {
	const bound = 0.0014 * clayPercent ** 2 + 0.17 * clayPercent;
	const free = moisturePercent - bound;
	return free <= 0 ? 1 : Math.sqrt(1 + 1.21 * free ** 0.68);
}

/** Friction velocity at which grains start to move, m/s. Source: Bagnold 1941, Fécan et al. 1999. */
export function thresholdFrictionVelocity({
	grainDiameter,
	airDensity,
	moisturePercent,
	clayPercent
}: {
	grainDiameter: number;
	airDensity: number;
	moisturePercent: number;
	clayPercent: number;
}): number {
	const dry =
		BAGNOLD_CONSTANT *
		Math.sqrt(((QUARTZ_DENSITY - airDensity) / airDensity) * GRAVITY * (grainDiameter / 1000));
	return dry * moistureFactor(moisturePercent, clayPercent);
}

/** Air at 15 °C and 1013.25 hPa, kg/m³. */
const STANDARD_AIR = 1.225;

/** The gust at 10 m that lifts dry grains of a diameter (mm) in ordinary air, m/s. */
export function dryLiftGust(grainDiameter: number): number {
	return windOfFrictionVelocity(
		thresholdFrictionVelocity({
			grainDiameter,
			airDensity: STANDARD_AIR,
			moisturePercent: 0,
			clayPercent: 0
		})
	);
}

/** Sand carried across a metre of front, kg/m·s. Source: White 1979, corrected form, from memory. */
export function sandFlux(velocity: number, threshold: number, airDensity: number): number {
	if (velocity <= threshold) return 0;
	const ratio = threshold / velocity;
	return ((2.61 * airDensity) / GRAVITY) * velocity ** 3 * (1 - ratio) * (1 + ratio) ** 2;
}

/**
 * Moisture of the top layer of sand, per cent of mass at slot starts; dry at the first slot.
 * Filled by rain (mm per slot), emptied by evaporation at air temperature. NaN rain leaves the
 * layer's moisture unknown (NaN) until a slot in which it would be dry from full.
 */
export function sandMoisture(
	rain: Float64Array,
	airTemperature: Float64Array,
	vapourDensity: Float64Array,
	vapourTransfer: Float64Array
): Float64Array {
	const moisture = new Float64Array(rain.length);
	let least = 0;
	let most = 0;
	for (let i = 0; i < rain.length; i++) {
		moisture[i] = least === most ? (100 * least) / LAYER_MASS : NaN;
		const unknown = rain[i] !== rain[i];
		most = unknown ? LAYER_WATER : Math.min(most + rain[i], LAYER_WATER);
		least = unknown ? least : Math.min(least + rain[i], LAYER_WATER);
		if (most === 0) continue;
		const deficit = saturationDensity(airTemperature[i]) - vapourDensity[i];
		const dried = vapourTransfer[i] * Math.max(deficit, 0) * SLOT_SECONDS;
		if (dried === dried) {
			most = Math.max(most - dried, 0);
			least = Math.max(least - dried, 0);
		} else {
			least = 0;
		}
	}
	return moisture;
}
