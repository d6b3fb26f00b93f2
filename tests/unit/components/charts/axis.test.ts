import { describe, expect, test } from 'vitest';
import { createAxis, cut, dayOf, overlap } from '../../../../src/lib/components/charts/axis';
import { linear } from '../../../../src/lib/components/charts/linear';
import { at, hoursFixture } from '../../../fixtures/hours';

const hours = hoursFixture();

describe('the axis of a page', () => {
	const axis = createAxis(hours, 12);

	test('four days at 12 px an hour are 1152 px', () => {
		expect(axis.width).toBe(1152);
		expect(axis.x(at(1, '09:45'))).toBe((24 + 9.75) * 12);
	});

	test('a place leads back to the slot it lies in', () => {
		expect(axis.slotUnder(axis.x(at(1, '09:45')))).toBe(at(1, '09:45'));
		expect(axis.slotUnder(axis.x(at(1, '09:45')) + 2.9)).toBe(at(1, '09:45'));
	});

	test('a place beyond the ends is the slot at the end', () => {
		expect(axis.slotUnder(-50)).toBe(0);
		expect(axis.slotUnder(5000)).toBe(383);
	});

	test('midnights part the days and the page’s own ends are no midnights', () => {
		expect(axis.midnights).toEqual([96, 192, 288]);
		expect(axis.atDayStart && axis.atDayEnd).toBe(true);
	});
});

describe('a window of it', () => {
	const axis = createAxis(hours, 27, { from: at(1, '06:00'), to: at(1, '19:00') });

	test('it begins at its own left edge and is cut, not ended', () => {
		expect(axis.x(at(1, '06:00'))).toBe(0);
		expect(axis.width).toBe(13 * 27);
		expect(axis.atDayStart || axis.atDayEnd).toBe(false);
	});

	test('it has the hours and nights inside it only', () => {
		expect(axis.hours.map((it) => it.hour)).toEqual([
			6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18
		]);
		expect(axis.nights).toEqual([]);
	});
});

test('a day of 92 slots moves the next midnight with it', () => {
	const days = [
		{ date: '2026-03-29', startSlot: 0, slots: 92, highWind: false },
		{ date: '2026-03-30', startSlot: 92, slots: 96, highWind: false }
	];
	const axis = createAxis({ ...hours, start: '2026-03-29T00:00:00Z', slotCount: 188, days }, 12);
	expect(axis.midnights).toEqual([92]);
	expect(axis.hours.find((it) => it.slot === 92)?.hour).toBe(0);
	expect(dayOf(days, 91)).toBe(0);
	expect(dayOf(days, 92)).toBe(1);
});

test('spans that only touch have nothing in common', () => {
	expect(overlap({ from: 0, to: 4 }, { from: 4, to: 8 })).toBeNull();
	expect(overlap({ from: 0, to: 5 }, { from: 4, to: 8 })).toEqual({ from: 4, to: 5 });
});

test('what is cut to a window keeps what it says, and what lies outside is left out', () => {
	const spans = [
		{ from: 0, to: 6, state: 'lifting' },
		{ from: 10, to: 12, state: 'blowing' }
	];
	expect(cut(spans, { from: 4, to: 10 })).toEqual([{ from: 4, to: 6, state: 'lifting' }]);
});

test('a straight scale runs there and back', () => {
	const scale = linear([10, 20], [100, 0]);
	expect(scale(10)).toBe(100);
	expect(scale(15)).toBe(50);
	expect(scale.invert(50)).toBe(15);
});
