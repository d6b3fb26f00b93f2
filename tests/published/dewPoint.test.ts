import { describe, expect, test } from 'vitest';
import psychrolib from 'psychrolib';
import {
	dewPointFromRelativeHumidity,
	frostPointFromVapourPressure,
	relativeHumidityFromDewPoint,
	saturationPressureOverIce,
	saturationPressureOverWater
} from '../../src/lib/engine/met/humidity';
import { everyCase, has, near, num, type Ruling } from './cases';

const celsius = (fahrenheit: number): number => ((fahrenheit - 32) * 5) / 9;

describe('dew point and humidity', () => {
	everyCase('02-dew-point-rh.json', 60, (it): Ruling => {
		const { inputs, expected } = it;
		if (has(expected, 'vpd_kpa'))
			return 'a pressure deficit the engine does not state (Tetens’ constants)';
		if (it.note?.includes('clamped') === true && num(inputs, 'dew_c') > num(inputs, 'temp_c'))
			return 'a dew point above the air: refused at the edge, the formula does not clamp';
		const otherConstants =
			typeof inputs.magnus === 'string' && !inputs.magnus.startsWith('WMO-No. 8');
		if (has(inputs, 'temp_c', 'dew_c') && has(expected, 'rh_pct')) {
			const [temperature, dewPoint] = [num(inputs, 'temp_c'), num(inputs, 'dew_c')];
			return () => {
				const value = relativeHumidityFromDewPoint(temperature, dewPoint);
				const own = inputs.magnus !== undefined && !otherConstants;
				near(value, num(expected, 'rh_pct'), own ? 1e-5 : 0.35, it);
			};
		}
		if (has(inputs, 'temp_c', 'rh_pct') && has(expected, 'dew_c')) {
			return () => {
				const value = dewPointFromRelativeHumidity(num(inputs, 'temp_c'), num(inputs, 'rh_pct'));
				const stated = it.tolerance.startsWith('abs 0.75') ? 0.75 : 0.15;
				near(value, num(expected, 'dew_c'), stated, it);
			};
		}
		if (has(inputs, 'rh_pct') && has(expected, 'dew_f')) {
			const temperature = has(inputs, 'temp_c')
				? num(inputs, 'temp_c')
				: celsius(num(inputs, 'temp_f'));
			const fahrenheit = it.tolerance.startsWith('abs 0.75') ? 0.75 : 1.5;
			return () => {
				const value = dewPointFromRelativeHumidity(temperature, num(inputs, 'rh_pct'));
				near(value, celsius(num(expected, 'dew_f')), (fahrenheit * 5) / 9, it);
			};
		}
		return `asks for ${Object.keys(expected).join(', ')} from ${Object.keys(inputs).join(', ')}, which the engine does not compute`;
	});
});

describe('dew and frost point against psychrolib', () => {
	psychrolib.SetUnitSystem(psychrolib.SI);
	const temperatures = Array.from({ length: 71 }, (_, i) => i - 20);
	const humidities = Array.from({ length: 20 }, (_, i) => 5 * (i + 1));

	test('the dew point at and above 0 °C is within 0.05 °C from 0 to 50 °C, 5 to 100 %', () => {
		let worst = 0;
		let compared = 0;
		for (const t of temperatures.filter((it) => it >= 0)) {
			for (const rh of humidities) {
				const reference = psychrolib.GetTDewPointFromRelHum(t, rh / 100);
				if (reference < 0) continue;
				worst = Math.max(worst, Math.abs(dewPointFromRelativeHumidity(t, rh) - reference));
				compared++;
			}
		}
		expect(compared).toBeGreaterThan(700);
		expect(worst).toBeLessThanOrEqual(0.05);
	});

	test('the frost point below 0 °C is within 0.05 °C from −20 °C, humidity over ice below 0 °C', () => {
		let worst = 0;
		let compared = 0;
		for (const t of temperatures) {
			for (const rh of humidities) {
				// psychrolib takes humidity over ice below 0 °C, and answers with the frost point.
				const reference = psychrolib.GetTDewPointFromRelHum(t, rh / 100);
				if (reference >= 0 || reference < -60) continue;
				const saturation = t <= 0 ? saturationPressureOverIce(t) : saturationPressureOverWater(t);
				const frostPoint = frostPointFromVapourPressure((saturation * rh) / 100);
				worst = Math.max(worst, Math.abs(frostPoint - reference));
				compared++;
			}
		}
		expect(compared).toBeGreaterThan(500);
		expect(worst).toBeLessThanOrEqual(0.05);
	});
});
