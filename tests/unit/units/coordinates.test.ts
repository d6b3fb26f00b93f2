import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	coordinateField,
	coordinateWords,
	readCoordinate
} from '../../../src/lib/units/coordinates';

const latitude = (typed: string) => readCoordinate(typed, 'latitude');
const longitude = (typed: string) => readCoordinate(typed, 'longitude');

describe('readCoordinate', () => {
	test.each([
		['37.02', 37.02],
		['37,02', 37.02],
		['+37.02', 37.02],
		['-37.02', -37.02],
		['−37,02', -37.02],
		[' 37.02 N ', 37.02],
		['N37.02', 37.02],
		['n 37.02', 37.02],
		['37.02s', -37.02],
		['S 37.02°', -37.02],
		['37°01.2′N', 37.02],
		["37° 1,2' N", 37.02],
		['37 01.2 N', 37.02],
		['N 37 01.2', 37.02],
		['37º01’12”N', 37.02],
		['37°01\'12"S', -37.02],
		['37:01:12 N', 37.02],
		['37 deg 1 min 12 sec N', 37.02],
		['-37 1 12', -37.02],
		['３７.０２', 37.02],
		['0', 0],
		['-0', 0],
		['0 S', 0],
		['90 N', 90],
		['.5', 0.5],
		['37.', 37],
		['89°59.999′ S', -89.999983]
	])('reads %j as a latitude of %d°', (typed, degrees) => {
		expect(latitude(typed)).toEqual({ degrees, trouble: null });
	});

	test.each([
		['7.86 W', -7.86],
		['W007°51.6', -7.86],
		['-180', -180],
		['180 E', 180]
	])('reads %j as a longitude of %d°', (typed, degrees) => {
		expect(longitude(typed)).toEqual({ degrees, trouble: null });
	});

	test.each([
		['', 'Type the latitude'],
		['   ', 'Type the latitude'],
		['north', 'Type degrees'],
		['N', 'Type degrees'],
		['37.02, -7.86', 'Type degrees'],
		['37.0.2', 'Type degrees'],
		['37 01 12 05', 'Type degrees'],
		['1e1', 'Type degrees'],
		['0x10', 'Type degrees'],
		['--37', 'Type degrees'],
		['37 -1', 'Type degrees'],
		['Infinity', 'Type degrees'],
		['37.5 30 N', 'Only the last number'],
		['37 01.5 10 N', 'Only the last number'],
		['37 60 N', 'Minutes run from 0'],
		['37 59 61 N', 'Seconds run from 0'],
		['-37.02 S', 'either a sign or S'],
		['+37.02 N', 'either a sign or N'],
		['N 37.02 N', 'hemisphere once'],
		['37.02 W', 'W belongs to a longitude'],
		['E 37.02', 'E belongs to a longitude'],
		['90.01', 'between 0 and 90'],
		['90 00.1 S', 'between 0 and 90'],
		['137', 'between 0 and 90']
	])('says of %j what is wrong', (typed, words) => {
		const read = latitude(typed);
		expect(read.degrees).toBeNull();
		expect(read.trouble).toContain(words);
	});

	test('asks for E or W where O could be either', () => {
		expect(longitude('7.86 O').trouble).toContain('write E or W');
		expect(longitude('180.5').trouble).toContain('between 0 and 180');
		expect(longitude('7.86 N').trouble).toContain('N belongs to a latitude');
	});

	test('never throws, and reads only what lies on the globe', () => {
		fc.assert(
			fc.property(fc.string({ maxLength: 24 }), (typed) => {
				const { degrees, trouble } = latitude(typed);
				expect(degrees === null).toBe(trouble !== null);
				if (degrees !== null) expect(Math.abs(degrees)).toBeLessThanOrEqual(90);
			}),
			{ numRuns: 2_000 }
		);
	});
});

test('what is shown is read back as the same place', () => {
	fc.assert(
		fc.property(fc.integer({ min: -180_000_000, max: 180_000_000 }), (millionths) => {
			const degrees = millionths / 1e6;
			expect(longitude(coordinateField(degrees, 'longitude')).degrees).toBeCloseTo(degrees, 6);
			const back = longitude(coordinateWords(degrees, 'longitude')).degrees;
			// A hundredth of a minute is 18 m.
			expect(Math.abs((back ?? NaN) - degrees)).toBeLessThanOrEqual(1 / 12_000 + 1e-6);
		})
	);
	expect(coordinateWords(37.02, 'latitude')).toBe('37° 01.20′ N');
	expect(coordinateWords(-7.999999, 'longitude')).toBe('8° 00.00′ W');
});
