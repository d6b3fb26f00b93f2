import { pressureAt } from './air';
import type { HourWeather } from './weather';

export type UnitChoice = {
	temperature: 'celsius' | 'fahrenheit';
	wind: 'kmh' | 'ms' | 'mph' | 'kn';
	precipitation: 'mm' | 'inch';
};

interface Variable {
	/** In SI. */
	value(hour: HourWeather, elevation: number): number | null;
	quantity: 'temperature' | 'wind' | 'precipitation' | 'plain';
	/** As declared, for what has no choice of unit. */
	unit: string;
	digits: number;
}

const plain = (name: keyof HourWeather, unit: string, digits = 0): Variable => ({
	value: (hour) => hour[name],
	quantity: 'plain',
	unit,
	digits
});
const converted = (
	name: keyof HourWeather,
	quantity: Exclude<Variable['quantity'], 'plain'>,
	digits: number
): Variable => ({ value: (hour) => hour[name], quantity, unit: '', digits });

/** Variables that the fake has, by Open-Meteo's names, with the digits that service gives. */
export const VARIABLES: Record<string, Variable> = {
	temperature_2m: converted('temperature', 'temperature', 1),
	dew_point_2m: converted('dewPoint', 'temperature', 1),
	relative_humidity_2m: plain('relativeHumidity', '%'),
	pressure_msl: plain('seaLevelPressure', 'hPa', 1),
	surface_pressure: {
		value: ({ seaLevelPressure, temperature }, elevation) =>
			seaLevelPressure === null || temperature === null
				? null
				: pressureAt(seaLevelPressure, temperature, elevation),
		quantity: 'plain',
		unit: 'hPa',
		digits: 1
	},
	wind_speed_10m: converted('windSpeed', 'wind', 2),
	wind_gusts_10m: converted('windGust', 'wind', 2),
	wind_direction_10m: plain('windDirection', '°'),
	precipitation: converted('precipitation', 'precipitation', 2),
	precipitation_probability: plain('precipitationProbability', '%'),
	cloud_cover: plain('cloudCover', '%'),
	shortwave_radiation: plain('ghi', 'W/m²', 1),
	direct_normal_irradiance: plain('dni', 'W/m²', 1),
	diffuse_radiation: plain('dhi', 'W/m²', 1)
};

const TEMPERATURE = {
	celsius: ['°C', (celsius: number) => celsius],
	fahrenheit: ['°F', (celsius: number) => celsius * 1.8 + 32]
} as const;
const WIND = {
	ms: ['m/s', 1],
	kmh: ['km/h', 3.6],
	mph: ['mp/h', 3600 / 1609.344],
	kn: ['kn', 3600 / 1852]
} as const;
const PRECIPITATION = { mm: ['mm', 1], inch: ['inch', 1 / 25.4] } as const;

/** Unit as declared, and a value in it with the service's digits. */
export function inUnit(
	{ quantity, unit, digits }: Variable,
	choice: UnitChoice
): { unit: string; convert(value: number | null): number | null } {
	const round = (value: number) => Number(value.toFixed(digits));
	const declared = (name: string, of: (value: number) => number) => ({
		unit: name,
		convert: (value: number | null) => (value === null ? null : round(of(value)))
	});
	if (quantity === 'temperature') {
		const [name, of] = TEMPERATURE[choice.temperature];
		return declared(name, of);
	}
	if (quantity === 'wind') {
		const [name, factor] = WIND[choice.wind];
		return declared(name, (value) => value * factor);
	}
	if (quantity === 'precipitation') {
		const [name, factor] = PRECIPITATION[choice.precipitation];
		return declared(name, (value) => value * factor);
	}
	return declared(unit, (value) => value);
}
