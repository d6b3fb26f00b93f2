import { describe, expect, test } from 'vitest';
import { quantity, roomQuantity, USUAL_UNITS, type Units } from '../../../src/lib/units/quantity';

const american: Units = { wind: 'mph', temperature: '°F', depth: 'in' };

describe('a value in the reader’s units', () => {
	test('wind comes in knots until somebody chooses otherwise', () => {
		expect(quantity(9, 'metresPerSecond', USUAL_UNITS)).toEqual({ number: '17.5', unit: 'kn' });
		expect(quantity(9, 'metresPerSecond', american)).toEqual({ number: '20.1', unit: 'mph' });
	});

	test('a temperature moves by 32 and a difference does not', () => {
		expect(quantity(10, 'celsius', american)).toEqual({ number: '50.0', unit: '°F' });
		expect(quantity(10, 'kelvin', american)).toEqual({ number: '18.0', unit: '°F' });
		expect(roomQuantity(10, 'celsius', american)).toEqual({ number: '18.0', unit: '°F' });
	});

	test('film and rain keep the hundredth of a millimetre', () => {
		expect(quantity(0.014, 'millimetres', USUAL_UNITS)).toEqual({ number: '0.01', unit: 'mm' });
		expect(quantity(0.254, 'millimetres', american)).toEqual({ number: '0.010', unit: 'in' });
	});

	test('room is cut after conversion, not before', () => {
		// 1.3 m/s is 2.527 kn.
		expect(roomQuantity(1.3, 'metresPerSecond', USUAL_UNITS).number).toBe('2.5');
		expect(roomQuantity(1.34, 'metresPerSecond', USUAL_UNITS).number).toBe('2.6');
		expect(roomQuantity(-0.01, 'metresPerSecond', USUAL_UNITS).number).toBe('-0.1');
	});

	test('percent, hours and sunlight keep their own units', () => {
		expect(quantity(57.6, 'percent', USUAL_UNITS)).toEqual({ number: '58', unit: '%' });
		expect(quantity(2.26, 'hours', USUAL_UNITS)).toEqual({ number: '2.3', unit: 'h' });
		expect(quantity(412.3, 'wattsPerSquareMetre', USUAL_UNITS).number).toBe('412');
		expect(quantity(1, 'none', USUAL_UNITS)).toEqual({ number: '1', unit: '' });
	});
});
