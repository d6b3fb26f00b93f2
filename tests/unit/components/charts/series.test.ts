import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	clearPlaces,
	dailyExtremes,
	extent,
	gaps,
	levels,
	rainHours,
	rainSpells,
	steppedBand,
	thinned
} from '../../../../src/lib/components/charts/series';
import { hoursFixture } from '../../../fixtures/hours';

const { days, bands, start } = hoursFixture();

/** The value a line of points has at a slot. */
function onLine(points: ReturnType<typeof thinned>, slot: number): number {
	const right = points.findIndex((it) => it.slot >= slot);
	const to = points[right];
	if (to.slot === slot) return to.value ?? NaN;
	const from = points[right - 1];
	const share = (slot - from.slot) / (to.slot - from.slot);
	return (from.value ?? NaN) + ((to.value ?? NaN) - (from.value ?? NaN)) * share;
}

describe('a thinned line', () => {
	test('draws every value to a thirtieth of its unit with far fewer points', () => {
		const points = thinned(bands.airTemperature);
		expect(points.length).toBeLessThan(bands.airTemperature.length / 3);
		bands.airTemperature.forEach((value, slot) => {
			expect(Math.abs(onLine(points, slot) - (value ?? NaN))).toBeLessThanOrEqual(0.03 + 1e-9);
		});
	});

	test('holds whatever the values are', () => {
		const values = fc.array(fc.double({ min: -30, max: 50, noNaN: true }), { minLength: 1 });
		fc.assert(
			fc.property(values, (series) => {
				const points = thinned(series);
				series.forEach((value, slot) => {
					expect(Math.abs(onLine(points, slot) - value)).toBeLessThanOrEqual(0.03 + 1e-9);
				});
			})
		);
	});

	test('breaks where something is missing and goes on after it', () => {
		expect(thinned([1, 2, 3, null, null, 5, 6])).toEqual([
			{ slot: 0, value: 1 },
			{ slot: 2, value: 3 },
			{ slot: 3, value: null },
			{ slot: 5, value: 5 },
			{ slot: 6, value: 6 }
		]);
		expect(thinned([null, 4])).toEqual([
			{ slot: 0, value: null },
			{ slot: 1, value: 4 }
		]);
		expect(thinned([])).toEqual([]);
	});
});

describe('a series held over its hours', () => {
	test('has both ends of every level and nothing between', () => {
		expect(levels([3, 3, 3, 7, null])).toEqual([
			{ slot: 0, value: 3 },
			{ slot: 3, value: 3 },
			{ slot: 3, value: 7 },
			{ slot: 4, value: 7 },
			{ slot: 4, value: null },
			{ slot: 5, value: null }
		]);
	});

	test('makes a band with upright sides over the line below it', () => {
		expect(steppedBand([1, 1, 1, 1], [3, 3, 7, 7])).toEqual([
			{ slot: 0, low: 1, high: 3 },
			{ slot: 2, low: 1, high: 3 },
			{ slot: 2, low: 1, high: 7 },
			{ slot: 3, low: 1, high: 7 },
			{ slot: 4, low: 1, high: 7 }
		]);
	});
});

test('extent passes over what is missing and knows when all is', () => {
	expect(extent([null, 4, 9], [2, null])).toEqual([2, 9]);
	expect(extent([null], [])).toBeNull();
});

test('gaps are told from their first slot to one past their last', () => {
	expect(gaps([1, null, null, 4, null])).toEqual([
		{ from: 1, to: 3 },
		{ from: 4, to: 5 }
	]);
});

describe('the most of a day', () => {
	test('stands in the middle of its level', () => {
		const most = dailyExtremes(bands.windGust, days, 'most')[1];
		// Wednesday's breeze is strongest in the hours of 17:00 and 18:00.
		expect(most.slot).toBeGreaterThanOrEqual(96 + 17 * 4);
		expect(most.slot).toBeLessThanOrEqual(96 + 19 * 4);
	});

	test('is not claimed on the way up to the next day’s', () => {
		const rising = Array.from({ length: 192 }, (_, i) => i);
		const two = days.slice(0, 2);
		expect(dailyExtremes(rising, two, 'most').map((it) => it.value)).toEqual([191]);
		expect(dailyExtremes(rising, two, 'least').map((it) => it.value)).toEqual([0]);
	});

	test('is nothing on a day without values', () => {
		const nothing = Array.from({ length: 384 }, () => null);
		expect(dailyExtremes(nothing, days, 'most')).toEqual([]);
	});
});

describe('rain', () => {
	test('is one block an hour, even where two hours are alike', () => {
		const values = [0, 0, 0, 0, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 0];
		expect(rainHours(values, start)).toEqual([
			{ from: 4, to: 8, amount: 1.2 },
			{ from: 8, to: 12, amount: 1.2 }
		]);
	});

	test('keeps to the forecast’s hours where the yard’s day begins off them', () => {
		// Kathmandu's midnight is 18:15 UTC: the first hour on the axis has three slots left.
		const hours = rainHours([1, 1, 1, 1, 1, 1, 1], '2026-05-12T18:15:00Z');
		expect(hours.map((it) => [it.from, it.to])).toEqual([
			[0, 3],
			[3, 7]
		]);
	});

	test('is one spell over two dry hours, and two over three', () => {
		const hour = (from: number) => ({ from, to: from + 4, amount: 1 });
		expect(rainSpells([hour(0), hour(12)])).toEqual([{ from: 0, to: 16, amount: 2 }]);
		expect(rainSpells([hour(0), hour(16)])).toHaveLength(2);
	});

	test('of a few drops is drawn and not named', () => {
		expect(rainSpells([{ from: 0, to: 4, amount: 0.2 }])).toEqual([]);
	});
});

describe('a clear place for a word', () => {
	const calm = Array.from({ length: 96 }, () => 3);
	const [today] = days;

	test('is found after 06:00 and off the line at now', () => {
		expect(clearPlaces(calm, [today], 20, 10, -1)).toEqual([25]);
		expect(clearPlaces(calm, [today], 20, 10, 30)).toEqual([31]);
	});

	test('is found before 06:00 where the day has no other, and nowhere in a gale', () => {
		const windy = calm.map((it, slot) => (slot < 24 ? it : 20));
		expect(clearPlaces(windy, [today], 20, 10, -1)).toEqual([0]);
		expect(
			clearPlaces(
				calm.map(() => 20),
				[today],
				20,
				10,
				-1
			)
		).toEqual([]);
	});
});
