import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { backoff } from '../../../../src/lib/server/forecast/http/backoff';

describe('backoff', () => {
	it('doubles its upper end with each failure, up to five seconds', () => {
		expect([1, 2, 3, 4, 5, 9].map((failed) => backoff(failed, 1))).toEqual([
			500, 1_000, 2_000, 4_000, 5_000, 5_000
		]);
	});
	it('spreads over the whole range from nothing', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 1, max: 30 }),
				fc.double({ min: 0, max: 1, noNaN: true }),
				(n, r) => {
					expect(backoff(n, r)).toBeCloseTo(r * backoff(n, 1), 6);
				}
			)
		);
	});
});
