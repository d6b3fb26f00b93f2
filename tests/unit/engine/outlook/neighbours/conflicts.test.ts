import { describe, expect, test } from 'vitest';
import {
	plumeConflicts,
	quietStart
} from '../../../../../src/lib/engine/outlook/neighbours/conflicts';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import { forecastOf, SITE, slotAt, type Changes } from '../flatWeather';

const yardOf = (changes: Changes, members: Changes[] = []) => {
	const forecast = forecastOf(changes);
	return yardWeather({
		site: SITE,
		forecast: {
			...forecast,
			members: members.map((it) => {
				const { time, ...member } = forecastOf(it).hourly;
				return time.length > 0 ? member : {};
			})
		},
		looseSand: null
	});
};
/** West wind till noon of the second day, then east. */
const turning = {
	windDirection: (hour: number) => (hour < 36 ? 270 : 90),
	windSpeed: 5,
	windGust: 8
};
const sanding = {
	id: 'Marigold',
	place: { east: 0, north: 0 },
	activity: 'sanding',
	from: slotAt(30),
	to: slotAt(40)
} as const;
const wet = { id: 'Tern', place: { east: 15, north: 3 }, from: slotAt(32), to: slotAt(60) };

describe('dust and spray between stands', () => {
	test('lasts while both are at it and the wind carries it over', () => {
		const [conflict, ...others] = plumeConflicts(yardOf(turning), [sanding], [wet]);
		expect(others).toEqual([]);
		expect(conflict).toMatchObject({
			source: 'Marigold',
			target: 'Tern',
			activity: 'sanding',
			from: slotAt(32),
			direction: 270
		});
		// The wind turns in the hour before noon, through north.
		expect(conflict.to).toBeGreaterThan(slotAt(35));
		expect(conflict.to).toBeLessThan(slotAt(36));
		expect(conflict.distance).toBeCloseTo(Math.hypot(15, 3), 9);
		expect(conflict.bearing).toBeCloseTo(78.69, 2);
	});

	test('is none upwind, out of reach, on one’s own boat, or at another hour', () => {
		const yard = yardOf({ windDirection: 90 });
		expect(plumeConflicts(yard, [sanding], [wet])).toEqual([]);
		const west = yardOf({ windDirection: 270 });
		expect(
			plumeConflicts(west, [{ ...sanding, activity: 'sandingWithExtraction' }], [wet])
		).toEqual([]);
		expect(plumeConflicts(west, [sanding], [{ ...wet, id: 'Marigold' }])).toEqual([]);
		expect(plumeConflicts(west, [sanding], [{ ...wet, from: slotAt(40) }])).toEqual([]);
		expect(plumeConflicts(west, [sanding], [wet])).toHaveLength(1);
	});

	test('blasting and spraying reach further, and a yard may say how far', () => {
		const west = yardOf({ windDirection: 270 });
		const far = { ...wet, place: { east: 55, north: 0 } };
		expect(plumeConflicts(west, [sanding], [far])).toEqual([]);
		expect(plumeConflicts(west, [{ ...sanding, activity: 'spraying' }], [far])).toHaveLength(1);
		expect(plumeConflicts(west, [{ ...sanding, reach: 60 }], [far])).toHaveLength(1);
	});

	test('a direction the members do not agree on widens it', () => {
		const aside = { ...wet, place: { east: 15, north: -15 } };
		const sure = { windDirection: 270, windSpeed: 5 };
		expect(plumeConflicts(yardOf(sure), [sanding], [aside])).toEqual([]);
		const members = [250, 290, 320, 230].map((windDirection) => ({ windDirection, windSpeed: 5 }));
		expect(plumeConflicts(yardOf(sure, members), [sanding], [aside])).toHaveLength(1);
	});

	test('a direction that is missing may be any', () => {
		const yard = yardOf({ windDirection: () => null, windSpeed: 6, windGust: 9 });
		expect(plumeConflicts(yard, [sanding], [wet])).toMatchObject([{ direction: -1 }]);
	});

	test('a wind that turns away and back makes two', () => {
		const gusty = {
			windDirection: (hour: number) => (hour >= 34 && hour < 36 ? 90 : 270),
			windSpeed: 5,
			windGust: 8
		};
		expect(plumeConflicts(yardOf(gusty), [sanding], [wet])).toHaveLength(2);
	});
});

describe('another hour for the dusty work', () => {
	const yard = yardOf(turning);

	test('is the nearest start without a conflict', () => {
		const starts = [20, 21, 22, 30, 36, 40, 48].map(slotAt);
		expect(quietStart(yard, sanding, [wet], starts)).toBe(slotAt(36));
		expect(quietStart(yard, sanding, [wet], [20, 22, 48].map(slotAt))).toBe(slotAt(22));
	});

	test('is none where every start would dust', () => {
		expect(quietStart(yard, sanding, [wet], [30, 31].map(slotAt))).toBeNull();
		expect(quietStart(yard, sanding, [wet], [])).toBeNull();
	});
});
