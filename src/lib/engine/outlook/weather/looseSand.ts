import {
	frictionVelocity,
	sandMoisture,
	thresholdFrictionVelocity,
	windOfFrictionVelocity
} from '../../met/sand';
import { convection, vapourTransfer } from '../../met/surface';
import { vapourDensity } from '../../met/humidity';
import { inSector, logProfileFactor } from '../../met/wind';
import { SAND_STATES } from '../../vocabulary';
import { DEFAULT_ROUGHNESS, type LooseSand } from './site';
import type { SlotWeather } from './slots';

const NONE = SAND_STATES.indexOf('none');
const LIFTING = SAND_STATES.indexOf('lifting');
const BLOWING = SAND_STATES.indexOf('blowing');
const UNKNOWN = 255;
const DRY_AIR_GAS_CONSTANT = 287.05;
const KELVIN = 273.15;

type Air = Pick<
	SlotWeather,
	| 'airTemperature'
	| 'vapourPressure'
	| 'pressure'
	| 'windSpeed'
	| 'windGust'
	| 'windDirection'
	| 'precipitation'
	| 'grid'
>;

/**
 * State of the yard's loose sand per slot, and the gust at 10 m that lifts it (m/s; +Infinity
 * where the wind does not come from a sector, NaN where it cannot be told).
 */
export function looseSandSlots(
	air: Air,
	looseSand: LooseSand | null,
	roughness = DEFAULT_ROUGHNESS
): { sand: Uint8Array; sandLiftGust: Float64Array } {
	const { count } = air.grid;
	const sand = new Uint8Array(count).fill(NONE);
	const sandLiftGust = new Float64Array(count).fill(Infinity);
	if (looseSand === null || looseSand.sectors.length === 0) return { sand, sandLiftGust };
	const to2Metres = logProfileFactor(roughness, 2);
	const density = new Float64Array(count);
	const transfer = new Float64Array(count);
	for (let i = 0; i < count; i++) {
		density[i] = vapourDensity(air.vapourPressure[i], air.airTemperature[i]);
		transfer[i] = vapourTransfer(
			convection(air.windSpeed[i] * to2Metres),
			air.airTemperature[i],
			air.pressure[i]
		);
	}
	const moisture = sandMoisture(air.precipitation, air.airTemperature, density, transfer);
	for (let i = 0; i < count; i++) {
		const direction = air.windDirection[i];
		const towards =
			direction === direction &&
			!looseSand.sectors.some(({ from, to }) => inSector(direction, from, to));
		if (towards) continue;
		const airDensity =
			(air.pressure[i] * 100) / (DRY_AIR_GAS_CONSTANT * (air.airTemperature[i] + KELVIN));
		const threshold = thresholdFrictionVelocity({
			grainDiameter: looseSand.grainDiameter,
			airDensity,
			moisturePercent: moisture[i],
			clayPercent: looseSand.clayPercent
		});
		sandLiftGust[i] = direction === direction ? windOfFrictionVelocity(threshold) : NaN;
		if (sandLiftGust[i] !== sandLiftGust[i] || air.windGust[i] !== air.windGust[i])
			sand[i] = UNKNOWN;
		else if (frictionVelocity(air.windSpeed[i]) > threshold) sand[i] = BLOWING;
		else if (air.windGust[i] > sandLiftGust[i]) sand[i] = LIFTING;
	}
	return { sand, sandLiftGust };
}
