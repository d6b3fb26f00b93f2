import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	angleBetween,
	bearingTo,
	circularSpread,
	plumeReaches
} from '../../../../src/lib/engine/met/plume';

const HERE = { east: 0, north: 0 };

describe('bearings', () => {
	test('run clockwise from north', () => {
		const to = (east: number, north: number) => bearingTo(HERE, { east, north });
		expect(to(0, 10)).toEqual({ bearing: 0, distance: 10 });
		expect(to(10, 0).bearing).toBeCloseTo(90, 9);
		expect(to(0, -10).bearing).toBeCloseTo(180, 9);
		expect(to(-3, 4).distance).toBe(5);
		expect(to(-10, 0).bearing).toBeCloseTo(270, 9);
	});

	test('differ by the shorter way round', () => {
		expect(angleBetween(350, 20)).toBe(30);
		expect(angleBetween(20, 350)).toBe(30);
		expect(angleBetween(0, 180)).toBe(180);
		fc.assert(
			fc.property(
				fc.integer({ min: -720, max: 720 }),
				fc.integer({ min: -720, max: 720 }),
				(a, b) => {
					expect(angleBetween(a, b)).toBe(angleBetween(b, a));
					expect(angleBetween(a, b)).toBeGreaterThanOrEqual(0);
					expect(angleBetween(a, b)).toBeLessThanOrEqual(180);
				}
			)
		);
	});
});

describe('the spread of directions', () => {
	test('of two at right angles: R = cos 45°, √(−2 ln R) rad', () => {
		expect(circularSpread([0, 90])).toBeCloseTo(
			Math.sqrt(-2 * Math.log(Math.SQRT1_2)) * (180 / Math.PI),
			9
		);
	});

	test('of directions alike is nothing, of opposite ones all round', () => {
		expect(circularSpread([123, 123, 123])).toBeCloseTo(0, 5);
		expect(circularSpread([0, 180])).toBe(180);
		expect(circularSpread([40])).toBe(0);
	});

	test('nears the ordinary standard deviation of small ones', () => {
		expect(circularSpread([358, 0, 2])).toBeCloseTo(Math.sqrt(8 / 3), 2);
	});

	test('does not depend on where north is', () => {
		fc.assert(
			fc.property(
				fc.array(fc.integer({ min: 0, max: 359 }), { minLength: 2, maxLength: 12 }),
				fc.integer({ min: 1, max: 359 }),
				(directions, turn) => {
					expect(circularSpread(directions.map((it) => it + turn))).toBeCloseTo(
						circularSpread(directions),
						3
					);
				}
			)
		);
	});
});

describe('a plume', () => {
	const east = { east: 20, north: 0 };
	test('goes where the wind goes, 25° to either side', () => {
		const reaches = (direction: number, spread = 0): boolean =>
			plumeReaches(HERE, east, { direction, spread }, 30);
		expect(reaches(270)).toBe(true);
		expect([245, 246, 294, 295].map((it) => reaches(it))).toEqual([true, true, true, true]);
		expect([244, 296, 90].map((it) => reaches(it))).toEqual([false, false, false]);
		expect(reaches(240, 10)).toBe(true);
	});

	test('ends at its reach', () => {
		const wind = { direction: 270, spread: 0 };
		expect(plumeReaches(HERE, east, wind, 20)).toBe(true);
		expect(plumeReaches(HERE, east, wind, 19.9)).toBe(false);
	});

	test('of a variable wind goes every way', () => {
		expect(plumeReaches(HERE, east, { direction: -1, spread: 0 }, 30)).toBe(true);
	});
});
