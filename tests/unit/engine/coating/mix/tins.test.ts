import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { tinsFor } from '../../../../../src/lib/engine/coating/mix/tins';

describe('tinsFor', () => {
	test('buys the least paint over, then the fewest tins', () => {
		expect(tinsFor(3, [0.75, 2.5])).toEqual({
			tins: [{ litres: 0.75, count: 4 }],
			litres: 3,
			leftOver: 0
		});
		expect(tinsFor(3.2, [0.75, 2.5])).toEqual({
			tins: [
				{ litres: 2.5, count: 1 },
				{ litres: 0.75, count: 1 }
			],
			litres: 3.25,
			leftOver: expect.closeTo(0.05, 9)
		});
	});

	test('two ways to the same total: the one with fewer tins', () => {
		expect(tinsFor(5, [1, 2.5, 5])?.tins).toEqual([{ litres: 5, count: 1 }]);
	});

	test('a need of exactly one tin is one tin, whatever the rounding', () => {
		expect(tinsFor(0.1 + 0.2, [0.3])).toMatchObject({ tins: [{ litres: 0.3, count: 1 }] });
		expect(tinsFor(0.75 * (1 + 1e-12), [0.75])?.litres).toBe(0.75);
	});

	test('sizes that share no measure', () => {
		expect(tinsFor(0.6, [0.29, 0.375])).toEqual({
			tins: [
				{ litres: 0.375, count: 1 },
				{ litres: 0.29, count: 1 }
			],
			litres: 0.665,
			leftOver: expect.closeTo(0.065, 9)
		});
	});

	test('nothing needed is nothing bought', () => {
		expect(tinsFor(0, [0.75])).toEqual({ tins: [], litres: 0, leftOver: 0 });
	});

	test('without sizes there is no answer', () => {
		expect(tinsFor(3, [])).toBeNull();
		expect(tinsFor(NaN, [0.75])).toBeNull();
	});

	test('a need of very many tins is answered in the largest', () => {
		const plan = tinsFor(2_000_000, [0.001, 5]);
		expect(plan?.litres).toBeGreaterThanOrEqual(2_000_000);
		expect(plan?.leftOver).toBeLessThan(5);
	});

	test('no other choice leaves less, nor as little in fewer tins', () => {
		const sizes = fc.uniqueArray(fc.integer({ min: 1, max: 8 }), { minLength: 1, maxLength: 3 });
		fc.assert(
			fc.property(fc.integer({ min: 0, max: 40 }), sizes, (quarters, quarterSizes) => {
				const plan = tinsFor(
					quarters / 4,
					quarterSizes.map((size) => size / 4)
				);
				if (plan === null) throw new Error('there are sizes');
				let best: [number, number] = [Infinity, Infinity];
				const [a, b = 0, c = 0] = quarterSizes;
				const most = (size: number): number => (size === 0 ? 0 : Math.ceil(quarters / size));
				for (let i = 0; i <= most(a); i++)
					for (let j = 0; j <= most(b); j++)
						for (let k = 0; k <= most(c); k++) {
							const total = i * a + j * b + k * c;
							const tins = i + j + k;
							if (total < quarters) continue;
							if (total < best[0] || (total === best[0] && tins < best[1])) best = [total, tins];
						}
				expect(plan.litres * 4).toBeCloseTo(best[0], 9);
				expect(plan.tins.reduce((sum, tin) => sum + tin.count, 0)).toBe(best[1]);
				expect(plan.tins.reduce((sum, { litres, count }) => sum + litres * count, 0)).toBeCloseTo(
					plan.litres,
					9
				);
				expect(plan.leftOver).toBeCloseTo(plan.litres - quarters / 4, 9);
			}),
			{ numRuns: 300 }
		);
	});
});
