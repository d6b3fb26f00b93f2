import {
	dewPointFromRelativeHumidity,
	dewPointFromVapourPressure,
	relativeHumidityReference,
	saturationPressureOverIce
} from '../../met/humidity';
import type { Hourly } from './forecast';
import { valuesOf } from './hours';

/** Dew point at the hours, °C over water; NaN is missing. */
export interface HourlyDewPoint {
	readonly values: Float64Array;
	/** 1 where it rests on a humidity below freezing, taken over water for want of proof. */
	readonly assumed: Uint8Array;
}

/**
 * Dew point at the hours: as given, or from temperature and humidity; null where the forecast has
 * neither. Below 0 °C some sources state humidity over ice: where all three come in other hours they
 * tell which this one means, else it is taken over water and said so.
 */
export function hourlyDewPoint(hourly: Hourly): HourlyDewPoint | null {
	const dewPoint = valuesOf(hourly, 'dewPoint');
	const humidity = valuesOf(hourly, 'relativeHumidity');
	const temperature = valuesOf(hourly, 'temperature');
	const assumed = new Uint8Array(hourly.time.length);
	if (humidity === null || temperature === null)
		return dewPoint === null ? null : { values: dewPoint, assumed };
	const reference = dewPoint === null ? null : referenceOf(temperature, dewPoint, humidity);
	const values = Float64Array.from(humidity, (rh, k) => {
		if (dewPoint !== null && dewPoint[k] === dewPoint[k]) return dewPoint[k];
		const air = temperature[k];
		if (!(air < 0)) return dewPointFromRelativeHumidity(air, rh);
		if (reference === null && rh === rh) assumed[k] = 1;
		return reference === 'ice'
			? dewPointFromVapourPressure((saturationPressureOverIce(air) * rh) / 100)
			: dewPointFromRelativeHumidity(air, rh);
	});
	return { values, assumed };
}

/** What most of the hours below freezing say that state all three; null where none does. */
function referenceOf(
	temperature: Float64Array,
	dewPoint: Float64Array,
	humidity: Float64Array
): 'water' | 'ice' | null {
	let votes = 0;
	let isTold = false;
	temperature.forEach((air, k) => {
		const reference = relativeHumidityReference(air, dewPoint[k], humidity[k]);
		if (reference === 'unclear') return;
		isTold = true;
		votes += reference === 'ice' ? 1 : -1;
	});
	return isTold ? (votes > 0 ? 'ice' : 'water') : null;
}
