import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { minutesAt } from '../../../../../../src/lib/engine/coating/curve';
import {
	isUnder,
	nearestMeeting,
	rowAt
} from '../../../../../../src/lib/engine/coating/sheet/check/compare';
import { tables } from './arbitraries';

describe('nearestMeeting', () => {
	test('finds a crossing that lies at no common row', () => {
		const least: [number, number][] = [
			[10, 600],
			[20, 100],
			[30, 90]
		];
		const most: [number, number][] = [
			[10, 700],
			[30, 120]
		];
		const meeting = nearestMeeting(least, [
			[10, 700],
			[15, 200],
			[30, 120]
		]);
		expect(meeting).toMatchObject({ celsius: 15, most: expect.closeTo(200, 6) });
		if (meeting === null || 'apart' in meeting) throw new Error('they meet');
		expect(isUnder(meeting)).toBe(true);
		expect(meeting.least).toBeGreaterThan(200);
		const sound = nearestMeeting(least, most);
		if (sound === null || 'apart' in sound) throw new Error('they meet');
		expect(isUnder(sound)).toBe(false);
	});

	test('two constants meet at no temperature', () => {
		expect(nearestMeeting(60, 30)).toEqual({
			celsius: null,
			least: expect.closeTo(60, 9),
			most: expect.closeTo(30, 9)
		});
	});

	test('a constant is held against every row of a table', () => {
		const meeting = nearestMeeting(
			[
				[10, 300],
				[20, 100]
			],
			200
		);
		expect(meeting).toMatchObject({ celsius: 10, least: expect.closeTo(300, 6) });
	});

	test('a single row is a constant', () => {
		expect(nearestMeeting([[20, 300]], [[5, 200]])).toMatchObject({ celsius: null });
	});

	test('no limit and silence have nothing to meet', () => {
		expect(nearestMeeting(null, 30)).toBeNull();
		expect(nearestMeeting(30, null)).toBeNull();
		expect(nearestMeeting(undefined, 30)).toBeNull();
		expect(nearestMeeting(30, undefined)).toBeNull();
	});

	test('tables with no temperature in common are told apart by their nearest ends', () => {
		expect(
			nearestMeeting(
				[
					[5, 60],
					[10, 30]
				],
				[
					[15, 60],
					[20, 30]
				]
			)
		).toEqual({ apart: [expect.closeTo(15, 9), expect.closeTo(10, 9)] });
	});

	test('equal times do not cross', () => {
		const same: [number, number][] = [
			[5, 61.3],
			[20, 17.9]
		];
		const meeting = nearestMeeting(same, same);
		if (meeting === null || 'apart' in meeting) throw new Error('they meet');
		expect(isUnder(meeting)).toBe(false);
	});

	test('zero minutes are a time like any other', () => {
		const meeting = nearestMeeting(10, 0);
		if (meeting === null || 'apart' in meeting) throw new Error('they meet');
		expect(isUnder(meeting)).toBe(true);
	});

	test('agrees with a dense sampling of both curves', () => {
		fc.assert(
			fc.property(tables, tables, (least, most) => {
				const meeting = nearestMeeting(least, most);
				const from = Math.max(least[0][0], most[0][0]);
				const to = Math.min(least[least.length - 1][0], most[most.length - 1][0]);
				if (meeting === null) throw new Error('both are tables');
				if ('apart' in meeting) {
					expect(from).toBeGreaterThan(to);
					return;
				}
				let worst = Infinity;
				for (let i = 0; i <= 400; i++) {
					const celsius = from + ((to - from) * i) / 400;
					worst = Math.min(
						worst,
						minutesAt(most, celsius, 'earliest') / minutesAt(least, celsius, 'earliest')
					);
				}
				const found = meeting.most / meeting.least;
				expect(found).toBeLessThanOrEqual(worst * (1 + 1e-9));
				// Nothing is made up: the ratio is that of the curves at the temperature it names.
				const at = meeting.celsius ?? NaN;
				expect(found).toBeCloseTo(
					minutesAt(most, at, 'latest') / minutesAt(least, at, 'latest'),
					6 - Math.ceil(Math.log10(Math.max(found, 1)))
				);
			}),
			{ numRuns: 400 }
		);
	});
});

describe('rowAt', () => {
	test('names the row of a temperature, and none between rows', () => {
		const table: [number, number][] = [
			[5, 60],
			[20, 30]
		];
		expect(rowAt(table, 20)).toBe(1);
		expect(rowAt(table, 12)).toBeNull();
		expect(rowAt(60, 20)).toBeNull();
		expect(rowAt(undefined, 20)).toBeNull();
		expect(rowAt(table, null)).toBeNull();
	});
});
