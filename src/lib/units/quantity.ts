import type { LimitUnit } from '../engine';
import { toDepth, type DepthUnit } from './depth';
import { rounded, roundedTowardsLimit } from './rounding';
import { toSpeed, type SpeedUnit } from './speed';
import { toTemperature, toTemperatureDifference, type TemperatureUnit } from './temperature';

/** What a person reads in. */
export interface Units {
	readonly wind: SpeedUnit;
	readonly temperature: TemperatureUnit;
	readonly depth: DepthUnit;
}

/** Until a person has chosen: knots, because masts and hoists are read in them. */
export const USUAL_UNITS: Units = { wind: 'kn', temperature: '°C', depth: 'mm' };

/** A number as text and its unit, kept apart so that a screen can set the unit smaller. */
export interface Quantity {
	readonly number: string;
	/** Empty where the number has none. */
	readonly unit: string;
}

interface Shown {
	readonly value: number;
	readonly unit: string;
	readonly decimals: number;
}

/** A value of the engine in a person's unit, with the decimals it is worth. */
function shown(value: number, unit: LimitUnit, units: Units): Shown {
	switch (unit) {
		case 'celsius':
			return {
				value: toTemperature(value, units.temperature),
				unit: units.temperature,
				decimals: 1
			};
		case 'kelvin':
			return {
				value: toTemperatureDifference(value, units.temperature),
				unit: units.temperature,
				decimals: 1
			};
		case 'metresPerSecond':
			return { value: toSpeed(value, units.wind), unit: units.wind, decimals: 1 };
		case 'millimetres':
			return {
				value: toDepth(value, units.depth),
				unit: units.depth,
				decimals: units.depth === 'in' ? 3 : 2
			};
		case 'percent':
			return { value, unit: '%', decimals: 0 };
		case 'hours':
			return { value, unit: 'h', decimals: 1 };
		case 'wattsPerSquareMetre':
			return { value, unit: 'W/m²', decimals: 0 };
		case 'none':
			return { value, unit: '', decimals: 0 };
	}
}

/** A value in the person's unit, rounded to the nearest. */
export function quantity(value: number, unit: LimitUnit, units: Units): Quantity {
	const it = shown(value, unit, units);
	return { number: rounded(it.value, it.decimals), unit: it.unit };
}

/** A room in the person's unit, rounded towards the limit. A room in °C is a difference. */
export function roomQuantity(room: number, unit: LimitUnit, units: Units): Quantity {
	const it = shown(room, unit === 'celsius' ? 'kelvin' : unit, units);
	return { number: roundedTowardsLimit(it.value, it.decimals), unit: it.unit };
}
