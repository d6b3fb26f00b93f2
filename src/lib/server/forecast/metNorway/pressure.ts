/** Standard gravity, m/s² (ISO 80000-3). */
const GRAVITY = 9.80665;
/** Specific gas constant of dry air, J/(kg K) (ICAO standard atmosphere, ISO 2533). */
const GAS_CONSTANT = 287.053;
/** Fall of temperature with height, K/m (ICAO standard atmosphere, ISO 2533). */
const LAPSE_RATE = 0.0065;
const KELVIN = 273.15;

/**
 * Station pressure from pressure at sea level: the hypsometric law of a column whose temperature
 * falls with height at the standard rate and is the air temperature at the station, dry.
 *
 * @param seaLevel - hPa
 * @param temperature - of the air at the station, °C
 * @param elevation - of the station above sea level, m
 * @returns hPa; within 0.1 hPa of a moist column for a yard under 100 m
 */
export function stationPressure(seaLevel: number, temperature: number, elevation: number): number {
	const atStation = temperature + KELVIN;
	const atSeaLevel = atStation + LAPSE_RATE * elevation;
	return seaLevel * (atStation / atSeaLevel) ** (GRAVITY / (GAS_CONSTANT * LAPSE_RATE));
}
