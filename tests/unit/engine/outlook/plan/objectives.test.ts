import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Chain } from '../../../../../src/lib/engine/outlook/plan/chain';
import {
	soonest,
	surest,
	type RankedWay
} from '../../../../../src/lib/engine/outlook/plan/objectives';
import { bySoonest, bySurest, everyWay } from './bruteForce';
import { chains } from './chains';

const RUNS = { numRuns: 4_000 };

const told = (way: RankedWay | null) => (way === null ? null : { ...way, starts: [...way.starts] });
const bestOf = (chain: Chain, order: (a: RankedWay, b: RankedWay) => number, readyBy = Infinity) =>
	told(
		everyWay(chain)
			.filter((way) => way.ready <= readyBy)
			.sort(order)[0] ?? null
	);

describe('a plan is the best of every way through its chain', () => {
	test('soonest', () => {
		fc.assert(
			fc.property(chains(4), (chain) => {
				expect(told(soonest(chain))).toEqual(bestOf(chain, bySoonest));
			}),
			RUNS
		);
	});

	test('surest', () => {
		fc.assert(
			fc.property(chains(4), (chain) => {
				expect(told(surest(chain))).toEqual(bestOf(chain, bySurest));
			}),
			RUNS
		);
	});

	test('surest of those ready by a date', () => {
		fc.assert(
			fc.property(chains(4), fc.integer({ min: 4, max: 30 }), (chain, readyBy) => {
				expect(told(surest(chain, { readyBy }))).toEqual(bestOf(chain, bySurest, readyBy));
			}),
			RUNS
		);
	});

	test('chains of six steps, gaps over several of them', () => {
		fc.assert(
			fc.property(chains(6), (chain) => {
				expect(told(surest(chain))).toEqual(bestOf(chain, bySurest));
			}),
			{ numRuns: 400 }
		);
	});
});
