import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cureClock, finishPosition, finishSlots } from '../../../../src/lib/engine/coating/cure';
import { minutesAt } from '../../../../src/lib/engine/coating/curve';
import {
	timesSchema,
	timeTableSchema,
	type TimeTable
} from '../../../../src/lib/engine/coating/times';

const TABLE: Exclude<TimeTable, null> = [
	[10, 480],
	[20, 240],
	[30, 150]
];
const steady = (celsius: number, slots = 96): Float64Array => new Float64Array(slots).fill(celsius);

describe('time tables', () => {
	test('rows are met exactly and ln τ is linear in 1/T between them', () => {
		expect(minutesAt(TABLE, 20, 'earliest')).toBeCloseTo(240, 9);
		const kelvin = (t: number): number => 1 / (t + 273.15);
		const share = (kelvin(15) - kelvin(10)) / (kelvin(20) - kelvin(10));
		expect(minutesAt(TABLE, 15, 'earliest')).toBeCloseTo(480 * (240 / 480) ** share, 9);
	});

	test('five kelvins past the rows follow the end segment', () => {
		expect(minutesAt(TABLE, 34, 'earliest')).toBeLessThan(150);
		expect(minutesAt(TABLE, 6, 'earliest')).toBeGreaterThan(480);
	});

	test('hotter than that the earliest clock keeps its value and the latest goes on', () => {
		expect(minutesAt(TABLE, 60, 'earliest')).toBe(minutesAt(TABLE, 35, 'earliest'));
		expect(minutesAt(TABLE, 60, 'latest')).toBeLessThan(minutesAt(TABLE, 36, 'latest'));
	});

	test('colder than that the earliest clock stands still and the latest keeps its value', () => {
		expect(minutesAt(TABLE, 4, 'earliest')).toBe(Infinity);
		expect(minutesAt(TABLE, -20, 'latest')).toBe(minutesAt(TABLE, 5, 'latest'));
	});

	test('a table that does not rise in temperature is refused, naming the rule', () => {
		const parsed = timeTableSchema.safeParse([
			[20, 240],
			[10, 480]
		]);
		expect(parsed.success).toBe(false);
		expect(timesSchema.safeParse({ touchDry: TABLE, launchMax: null }).success).toBe(true);
		expect(timesSchema.safeParse({ touchdry: TABLE }).success).toBe(false);
	});
});

describe('the cure clock', () => {
	test('is additive under any split of time', () => {
		fc.assert(
			fc.property(
				fc.array(fc.double({ min: 6, max: 34, noNaN: true }), { minLength: 4, maxLength: 80 }),
				fc.nat(79),
				(temperatures, cut) => {
					const all = Float64Array.from(temperatures);
					const at = Math.min(cut, all.length);
					const total = (part: Float64Array): number =>
						cureClock(TABLE, part, 'earliest').progress[part.length];
					expect(total(all.slice(0, at)) + total(all.slice(at))).toBeCloseTo(total(all), 9);
				}
			)
		);
	});

	test('a warmer face is never later', () => {
		fc.assert(
			fc.property(
				fc.array(fc.double({ min: -5, max: 40, noNaN: true }), { minLength: 4, maxLength: 60 }),
				fc.double({ min: 0, max: 10, noNaN: true }),
				(temperatures, more) => {
					const cold = cureClock(TABLE, Float64Array.from(temperatures), 'earliest').progress;
					const warm = cureClock(
						TABLE,
						Float64Array.from(temperatures, (t) => t + more),
						'earliest'
					).progress;
					cold.forEach((value, i) => expect(warm[i]).toBeGreaterThanOrEqual(value - 1e-12));
				}
			)
		);
	});

	test('a coat at a constant row is through in exactly that row’s slots', () => {
		const ends = finishSlots(cureClock(TABLE, steady(20), 'earliest').progress);
		expect(ends[0]).toBe(16);
		expect(ends[40]).toBe(56);
		expect(ends[90]).toBe(97);
	});

	test('the exact finish of a start between slots is between slots', () => {
		const { progress } = cureClock([[20, 50]], steady(20), 'earliest');
		expect(finishPosition(progress, 2)).toBeCloseTo(2 + 50 / 15, 9);
		expect(finishPosition(progress, 2.5)).toBeCloseTo(2.5 + 50 / 15, 9);
		expect(finishPosition(progress, 95)).toBeNull();
	});

	test('under the least curing temperature only the earliest clock stands still', () => {
		expect(cureClock(TABLE, steady(12), 'earliest', 14).progress[96]).toBe(0);
		expect(cureClock(TABLE, steady(12), 'latest', 14).progress[96]).toBeGreaterThan(1);
		expect(cureClock(TABLE, steady(12), 'earliest', 14).standstill?.[96]).toBe(96);
	});

	test('an unknown temperature makes no progress and is counted, unless no temperature is asked for', () => {
		const gap = steady(20, 8);
		gap[3] = NaN;
		const clock = cureClock(TABLE, gap, 'earliest');
		expect(clock.progress[4]).toBe(clock.progress[3]);
		expect(clock.unknown?.[8]).toBe(1);
		expect(cureClock(60, gap, 'earliest').unknown).toBeNull();
	});
});
