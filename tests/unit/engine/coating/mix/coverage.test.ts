import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	coverage,
	practicalSpread,
	thinnedSolids,
	wetFilmOf
} from '../../../../../src/lib/engine/coating/mix/coverage';

const solids = fc.double({ min: 5, max: 100, noNaN: true });
const films = fc.double({ min: 5, max: 500, noNaN: true });

describe('coverage', () => {
	test('50 % of solids at 50 µm dry covers 10 m² a litre', () => {
		expect(coverage(50, 50)).toBe(10);
	});

	test('a tie coat of 58 % at 90 µm covers 6.4 m² a litre', () => {
		expect(coverage(58, 90)).toBeCloseTo(6.4, 1);
	});

	test('a litre spread over its coverage is the wet film', () => {
		fc.assert(
			fc.property(solids, films, (percent, dry) => {
				expect(1000 / coverage(percent, dry)).toBeCloseTo(wetFilmOf(dry, percent), 6);
			})
		);
	});

	test('no paint without thinner dries thicker than it was wet', () => {
		fc.assert(
			fc.property(solids, films, (percent, dry) => {
				expect(wetFilmOf(dry, percent)).toBeGreaterThanOrEqual(dry * (1 - 1e-12));
			})
		);
	});
});

describe('thinning', () => {
	test('ten per cent of thinner takes 50 % of solids to 45.5', () => {
		expect(thinnedSolids(50, 10)).toBeCloseTo(45.4545, 4);
		expect(thinnedSolids(50, 0)).toBe(50);
	});

	test('never changes how far the paint itself goes', () => {
		fc.assert(
			fc.property(
				solids,
				films,
				fc.double({ min: 0, max: 100, noNaN: true }),
				(percent, dry, thinner) => {
					const thinnedLitres = 1 + thinner / 100;
					expect(coverage(thinnedSolids(percent, thinner), dry) * thinnedLitres).toBeCloseTo(
						coverage(percent, dry),
						6
					);
				}
			)
		);
	});
});

test('loss takes its share of the spread', () => {
	expect(practicalSpread(10, 30)).toBe(7);
	expect(practicalSpread(10, 0)).toBe(10);
});
