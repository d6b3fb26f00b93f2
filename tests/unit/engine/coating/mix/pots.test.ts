import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { potPlan } from '../../../../../src/lib/engine/coating/mix/pots';
import { errorOf, valueOf } from './value';

describe('potPlan', () => {
	test('a coat that is laid before its pot dies is one pot', () => {
		expect(valueOf(potPlan(1, 8, 16, 225, {}))).toEqual({
			count: 1,
			litres: 1,
			minutes: 30,
			bound: 'none'
		});
	});

	test('a slow hand on a short pot life mixes more and smaller pots', () => {
		// 8 m²/h for 30 min lays 4 m², half a litre at 8 m²/L.
		expect(valueOf(potPlan(2.2, 8, 8, 30, {}))).toEqual({
			count: 5,
			litres: expect.closeTo(0.44, 12),
			minutes: expect.closeTo(26.4, 9),
			bound: 'potLife'
		});
	});

	test('a pot is no larger than the one the sheet’s pot life is stated for', () => {
		expect(valueOf(potPlan(3, 8, 100, 225, { sheet: 1 }))).toMatchObject({
			count: 3,
			litres: 1,
			bound: 'sheet'
		});
	});

	test('nor than the person can carry', () => {
		expect(valueOf(potPlan(3, 8, 100, null, { sheet: 1, person: 0.5 }))).toMatchObject({
			count: 6,
			bound: 'person'
		});
	});

	test('exactly two pots are two, whatever the rounding', () => {
		expect(valueOf(potPlan(0.1 + 0.2, 8, 100, null, { person: 0.15 })).count).toBe(2);
	});

	test('a question that asks for thousands of pots is told so', () => {
		expect(errorOf(potPlan(100, 10, 0.01, 5, {}))).toMatchObject({ code: 'tooManyPots' });
		expect(errorOf(potPlan(100, 10, 10, 0, {}))).toMatchObject({ code: 'tooManyPots' });
	});

	test('no pot outlives its life, and together they are the coat', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 0.01, max: 60, noNaN: true }),
				fc.double({ min: 1, max: 20, noNaN: true }),
				fc.double({ min: 1, max: 90, noNaN: true }),
				fc.double({ min: 3, max: 900, noNaN: true }),
				fc.option(fc.double({ min: 0.1, max: 5, noNaN: true }), { nil: undefined }),
				(litres, spread, rate, workMinutes, person) => {
					const plan = potPlan(litres, spread, rate, workMinutes, { person });
					if (!plan.ok) {
						expect(plan.error.code).toBe('tooManyPots');
						return;
					}
					const { count, litres: each, minutes } = plan.value;
					expect(minutes).toBeLessThanOrEqual(workMinutes * (1 + 1e-6));
					if (person !== undefined) expect(each).toBeLessThanOrEqual(person * (1 + 1e-6));
					expect(count * each).toBeCloseTo(litres, 9);
					// One pot fewer would be too large for one of the bounds.
					if (count > 1) {
						const fewer = litres / (count - 1);
						const isTooSlow = ((fewer * spread) / rate) * 60 > workMinutes * (1 - 1e-6);
						expect(isTooSlow || (person !== undefined && fewer > person * (1 - 1e-6))).toBe(true);
					}
				}
			),
			{ numRuns: 500 }
		);
	});
});
