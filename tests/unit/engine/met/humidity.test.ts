import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	dewPointFromRelativeHumidity,
	dewPointFromVapourPressure,
	frostPointFromVapourPressure,
	relativeHumidityFromDewPoint,
	relativeHumidityReference,
	saturationPressureOverIce,
	saturationPressureOverWater,
	vapourPressureFromWetBulb,
	wetBulbFromRelativeHumidity
} from '../../../../src/lib/engine/met/humidity';

const celsius = fc.double({ min: -40, max: 50, noNaN: true });
const percent = fc.double({ min: 2, max: 100, noNaN: true });

describe('humidity', () => {
	test('dew and frost point undo the saturation pressures', () => {
		fc.assert(
			fc.property(celsius, (t) => {
				expect(dewPointFromVapourPressure(saturationPressureOverWater(t))).toBeCloseTo(t, 8);
				expect(frostPointFromVapourPressure(saturationPressureOverIce(t))).toBeCloseTo(t, 8);
			})
		);
	});

	test('humidity and dew point undo each other', () => {
		fc.assert(
			fc.property(celsius, percent, (t, rh) => {
				expect(relativeHumidityFromDewPoint(t, dewPointFromRelativeHumidity(t, rh))).toBeCloseTo(
					rh,
					6
				);
			})
		);
	});

	test('a wet bulb from humidity gives the humidity back', () => {
		fc.assert(
			fc.property(fc.double({ min: 0, max: 45, noNaN: true }), percent, (t, rh) => {
				const bulb = wetBulbFromRelativeHumidity(t, rh, 1000);
				const vapour = vapourPressureFromWetBulb(t, bulb, 1000);
				expect((100 * vapour) / saturationPressureOverWater(t)).toBeCloseTo(rh, 4);
			})
		);
	});

	test('the frost point lies between dew point and air below freezing', () => {
		fc.assert(
			fc.property(
				fc.double({ min: -25, max: -1, noNaN: true }),
				fc.double({ min: 20, max: 85, noNaN: true }),
				(t, rh) => {
					const vapour = (saturationPressureOverWater(t) * rh) / 100;
					expect(frostPointFromVapourPressure(vapour)).toBeGreaterThanOrEqual(
						dewPointFromVapourPressure(vapour)
					);
				}
			)
		);
	});

	test('what a source means by humidity below freezing is told from the three together', () => {
		const overWater = relativeHumidityFromDewPoint(-8, -10);
		const vapour = saturationPressureOverWater(-10);
		expect(relativeHumidityReference(-8, -10, overWater)).toBe('water');
		expect(relativeHumidityReference(-8, -10, (100 * vapour) / saturationPressureOverIce(-8))).toBe(
			'ice'
		);
		expect(relativeHumidityReference(5, 1, 75)).toBe('unclear');
		expect(relativeHumidityReference(-8, -10, 20)).toBe('unclear');
	});
});
