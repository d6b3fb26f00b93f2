import fc from 'fast-check';
import type { Candidates, Chain, Gap } from '../../../../../src/lib/engine/outlook/plan/chain';

/** Small random chains: windows that move forward only, ties in every number, gaps over steps. */
const SLOTS = 14;

const rising = (values: number[]): Float64Array => Float64Array.from(values).sort();

const candidates = (duration: number, isFixed: boolean): fc.Arbitrary<Candidates> =>
	fc
		.record({
			starts: fc.uniqueArray(fc.integer({ min: 0, max: SLOTS }), {
				minLength: isFixed ? 1 : 0,
				maxLength: isFixed ? 1 : 7
			}),
			rooms: fc.array(fc.integer({ min: 0, max: 4 }), { minLength: 7, maxLength: 7 }),
			scores: fc.array(fc.integer({ min: -4, max: 0 }), { minLength: 7, maxLength: 7 }),
			waits: fc.array(fc.integer({ min: 0, max: 12 }), { minLength: 7, maxLength: 7 })
		})
		.map(({ starts, rooms, scores, waits }) => {
			const start = rising(starts);
			const finish = start.map((it) => it + duration);
			let ready = -Infinity;
			return {
				start,
				finish,
				room: isFixed ? start.map(() => Infinity) : start.map((_, k) => rooms[k] / 2),
				score: isFixed ? start.map(() => 0) : start.map((_, k) => scores[k]),
				ready: finish.map((it, k) => (ready = Math.max(ready, it + waits[k])))
			};
		});

const gap = (steps: readonly Candidates[], from: number, to: number, hasEnd: boolean) =>
	fc
		.record({
			waits: fc.array(fc.integer({ min: 0, max: 4 }), { minLength: 7, maxLength: 7 }),
			widths: fc.array(fc.integer({ min: 0, max: 7 }), { minLength: 7, maxLength: 7 }),
			never: fc.integer({ min: 0, max: 9 })
		})
		.map(({ waits, widths, never }): Gap => {
			const { finish } = steps[from];
			let opens = -Infinity;
			let closes = -Infinity;
			const earliest = finish.map((it, k) => (opens = Math.max(opens, it + waits[k] / 2)));
			const latest = finish.map((it, k) => {
				closes = Math.max(closes, it + waits[k] / 2 + widths[k]);
				return hasEnd ? closes : Infinity;
			});
			// What runs into unknown weather can be followed by nothing.
			if (never < earliest.length) earliest[never] = Infinity;
			return { from, to, earliest, latest };
		});

/** Chains of up to `most` steps, some of them fixed, some gaps reaching over steps. */
export const chains = (most: number): fc.Arbitrary<Chain> =>
	fc
		.record({
			durations: fc.array(fc.integer({ min: 1, max: 3 }), { minLength: 1, maxLength: most }),
			fixed: fc.array(fc.integer({ min: 0, max: 5 }), { minLength: most, maxLength: most })
		})
		.chain(({ durations, fixed }) =>
			fc.tuple(...durations.map((duration, i) => candidates(duration, fixed[i] === 0)))
		)
		.chain((steps) => {
			const pairs: { from: number; to: number }[] = [];
			for (let from = 0; from < steps.length; from++)
				for (let to = from + 1; to < steps.length; to++) pairs.push({ from, to });
			return fc
				.tuple(
					...pairs.map(({ from, to }) =>
						to === from + 1
							? fc.tuple(gap(steps, from, to, false), fc.option(gap(steps, from, to, true)))
							: fc.tuple(
									fc.option(gap(steps, from, to, true), { freq: 2 }),
									fc.constant<Gap | null>(null)
								)
					)
				)
				.map((gaps): Chain => ({ steps, gaps: gaps.flat().filter((it) => it !== null) }));
		});
