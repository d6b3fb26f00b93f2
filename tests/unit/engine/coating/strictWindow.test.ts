import { describe, expect, test } from 'vitest';
import {
	highestHeldHour,
	strictBandOf,
	strictVerdict
} from '../../../../src/lib/engine/coating/strictWindow';
import { PU_OVER_PU } from '../../../fixtures/published/strictBands';

const steady = (celsius: number, slots = 400): Float64Array =>
	new Float64Array(slots).fill(celsius);
/** Steady but for some slots. */
const with_ = (celsius: number, from: number, to: number, other: number): Float64Array =>
	steady(celsius).fill(other, from, to);

describe('the highest temperature held for an hour', () => {
	test('is that of a whole hour, not of its peak', () => {
		expect(highestHeldHour(with_(20, 100, 104, 35), 0, 400)).toBe(35);
		expect(highestHeldHour(with_(20, 100, 103, 35), 0, 400)).toBe(20);
	});

	test('is none of less than an hour, nor over a missing slot', () => {
		expect(highestHeldHour(steady(20), 10, 13)).toBeNaN();
		expect(highestHeldHour(with_(20, 50, 51, NaN), 0, 100)).toBeNaN();
	});
});

describe('the stricter recoat window', () => {
	const coat = { start: 0, finish: 8 };
	const next = (hoursAfterFinish: number, length = 8) => {
		const start = coat.finish + 4 * hoursAfterFinish;
		return { start, finish: start + length };
	};

	test('at a steady temperature is its band’s', () => {
		const verdict = (hours: number) => strictVerdict(PU_OVER_PU, steady(20), coat, next(hours));
		expect([7.75, 8, 46, 46.25].map(verdict)).toEqual(['early', 'inside', 'inside', 'late']);
	});

	test('one hot hour moves both ends to sooner', () => {
		const hot = with_(20, 30, 34, 40);
		expect(strictVerdict(PU_OVER_PU, hot, coat, next(24))).toBe('late');
		expect(strictVerdict(PU_OVER_PU, hot, coat, next(7))).toBe('inside');
		expect(strictVerdict(PU_OVER_PU, steady(20), coat, next(7))).toBe('early');
	});

	test('over the last band is too hot, over the unknown unknown', () => {
		expect(strictVerdict(PU_OVER_PU, steady(60), coat, next(10))).toBe('tooHot');
		expect(strictVerdict(PU_OVER_PU, with_(20, 20, 21, NaN), coat, next(10))).toBe('unknown');
		expect(strictVerdict(PU_OVER_PU, steady(20), coat, next(0.5))).toBe('early');
	});

	test('bands hold up to their border', () => {
		expect(strictBandOf(PU_OVER_PU, PU_OVER_PU[0].to)).toBe(PU_OVER_PU[0]);
		expect(strictBandOf(PU_OVER_PU, PU_OVER_PU[0].to + 0.01)).toBe(PU_OVER_PU[1]);
	});
});
