import { within, type Chain } from '../../../../../src/lib/engine/outlook/plan/chain';
import type { RankedWay } from '../../../../../src/lib/engine/outlook/plan/objectives';

/** Every way through a chain, tried one by one, and the best of them by an order. */
export function everyWay(chain: Chain): RankedWay[] {
	const found: RankedWay[] = [];
	const starts = new Int32Array(chain.steps.length);
	const go = (step: number): void => {
		if (step === chain.steps.length) {
			const taken = Int32Array.from(starts);
			found.push({
				starts: taken,
				room: Math.min(...chain.steps.map((it, i) => it.room[taken[i]])),
				score: chain.steps.reduce((sum, it, i) => sum + it.score[taken[i]], 0),
				ready: Math.max(...chain.steps.map((it, i) => it.ready[taken[i]]))
			});
			return;
		}
		for (let k = 0; k < chain.steps[step].start.length; k++) {
			const holds = chain.gaps.every(
				({ from, to, earliest, latest }) =>
					to !== step ||
					within(chain.steps[step].start[k], earliest[starts[from]], latest[starts[from]])
			);
			if (!holds) continue;
			starts[step] = k;
			go(step + 1);
		}
	};
	go(0);
	return found;
}

/** Earlier starts from the last step backwards. */
export function backwards(a: RankedWay, b: RankedWay): number {
	for (let i = a.starts.length - 1; i >= 0; i--)
		if (a.starts[i] !== b.starts[i]) return a.starts[i] - b.starts[i];
	return 0;
}

export const bySoonest = (a: RankedWay, b: RankedWay): number =>
	a.ready - b.ready || backwards(a, b);

export const bySurest = (a: RankedWay, b: RankedWay): number =>
	(a.room === b.room ? 0 : b.room - a.room) || b.score - a.score || bySoonest(a, b);
