/**
 * Saturation vapour pressure over water, hPa (Magnus form, coefficients of Alduchov and
 * Eskridge 1996).
 */
export function saturationPressure(celsius: number): number {
	return 6.1094 * Math.exp((17.625 * celsius) / (celsius + 243.04));
}

/** %, at most 100. */
export function relativeHumidity(temperature: number, dewPoint: number): number {
	return Math.min(100, (100 * saturationPressure(dewPoint)) / saturationPressure(temperature));
}

/**
 * Pressure at a height from pressure at sea level, hPa: barometric law of a column at one
 * temperature, that of the air plus half a standard lapse.
 *
 * @param elevation - m
 */
export function pressureAt(seaLevel: number, temperature: number, elevation: number): number {
	const mean = temperature + 273.15 + (0.0065 * elevation) / 2;
	return seaLevel * Math.exp((-9.80665 * elevation) / (287.05 * mean));
}
