import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	angleOf,
	pointAt,
	pointWords,
	sectorPath,
	sweep,
	turned,
	withEnd
} from '../../../../src/lib/components/settings/compass';

describe('the compass', () => {
	test('has north up and turns clockwise', () => {
		expect(pointAt(0, 100)).toEqual({ x: 0, y: -100 });
		expect(pointAt(90, 100)).toEqual({ x: 100, y: 0 });
		expect(pointAt(180, 100)).toEqual({ x: 0, y: 100 });
		expect(angleOf(-1, 0)).toBe(270);
		expect(angleOf(0, 0)).toBe(0);
	});

	test('a point is found again at its own whole degree', () => {
		fc.assert(
			fc.property(fc.integer({ min: 0, max: 359 }), (degrees) => {
				const { x, y } = pointAt(degrees, 150);
				expect(angleOf(x, y)).toBe(degrees);
			})
		);
	});

	test('a sector runs clockwise, over north too', () => {
		expect(sweep({ from: 350, to: 20 })).toBe(30);
		expect(sweep({ from: 20, to: 350 })).toBe(330);
		expect(sweep({ from: 0, to: 360 })).toBe(360);
	});

	test('draws the long way round over half a circle, and a whole one as two arcs', () => {
		expect(sectorPath({ from: 350, to: 20 }, 50, 100)).toMatch(/A100 100 0 0 1/);
		expect(sectorPath({ from: 20, to: 350 }, 50, 100)).toMatch(/A100 100 0 1 1/);
		expect(sectorPath({ from: 0, to: 360 }, 50, 100).match(/A/g)).toHaveLength(4);
	});

	test('an end moved onto the other stays where it was', () => {
		const sector = { from: 280, to: 350 };
		expect(withEnd(sector, 'to', 280)).toBe(sector);
		expect(withEnd(sector, 'to', -5)).toEqual({ from: 280, to: 355 });
		expect(withEnd(sector, 'from', 640)).toEqual(sector);
	});

	test('names the eight points', () => {
		expect([0, 22, 23, 180, 337, 338, -45].map(pointWords)).toEqual([
			'north',
			'north',
			'north-east',
			'south',
			'north-west',
			'north',
			'north-west'
		]);
		expect(turned(-1)).toBe(359);
	});
});
