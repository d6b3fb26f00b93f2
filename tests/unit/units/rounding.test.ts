import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { rounded, roundedTowardsLimit } from '../../../src/lib/units/rounding';

describe('rounded', () => {
	test('halves go away from zero and there is no minus nought', () => {
		expect(rounded(2.45, 1)).toBe('2.5');
		expect(rounded(-2.45, 1)).toBe('-2.5');
		expect(rounded(-0.04, 1)).toBe('0.0');
		expect(rounded(1.005, 2)).toBe('1.01');
	});
});

describe('rounded towards the limit', () => {
	test('room inside is cut down, never up', () => {
		expect(roundedTowardsLimit(2.49, 1)).toBe('2.4');
		expect(roundedTowardsLimit(0.09, 1)).toBe('0.0');
	});

	test('binary dust does not cost a digit', () => {
		expect(roundedTowardsLimit(0.29, 2)).toBe('0.29');
		expect(roundedTowardsLimit(0.1 + 0.2, 1)).toBe('0.3');
	});

	test('a breach is never shown as no breach', () => {
		expect(roundedTowardsLimit(-0.02, 1)).toBe('-0.1');
		expect(roundedTowardsLimit(-1.27, 1)).toBe('-1.2');
	});

	test('no room shown is larger than the room there is', () => {
		fc.assert(
			fc.property(fc.double({ min: 0, max: 1000, noNaN: true }), (room) => {
				expect(Number(roundedTowardsLimit(room, 1))).toBeLessThanOrEqual(room + 1e-9);
			})
		);
	});
});
