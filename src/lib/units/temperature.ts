/** Temperatures at the edge. Inside everything is °C, and differences are K. */
export const TEMPERATURE_UNITS = ['°C', '°F'] as const;
export type TemperatureUnit = (typeof TEMPERATURE_UNITS)[number];

/** A temperature in °C, in the unit. Exact: F = 1.8 C + 32. */
export function toTemperature(celsius: number, unit: TemperatureUnit): number {
	return unit === '°F' ? celsius * 1.8 + 32 : celsius;
}

/** A temperature in the unit, in °C. */
export function fromTemperature(value: number, unit: TemperatureUnit): number {
	return unit === '°F' ? (value - 32) / 1.8 : value;
}

/** A difference in K (a spread, a room, an error), in degrees of the unit: the 32 plays no part. */
export function toTemperatureDifference(kelvin: number, unit: TemperatureUnit): number {
	return unit === '°F' ? kelvin * 1.8 : kelvin;
}

/** A difference in degrees of the unit, in K. */
export function fromTemperatureDifference(value: number, unit: TemperatureUnit): number {
	return unit === '°F' ? value / 1.8 : value;
}
