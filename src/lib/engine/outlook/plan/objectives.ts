import type { Chain } from './chain';
import { sweep, type Objective, type Way } from './sweep';

/** A way through a chain with what it is ranked by. */
export interface RankedWay {
	readonly starts: Int32Array;
	/** Least scaled room of the steps that are not fixed; +Infinity without one. */
	readonly room: number;
	/** Sum of the steps' scores. */
	readonly score: number;
	/** Slot position from which the boat may be launched at the latest. */
	readonly ready: number;
}

/** Bounds on a plan as a whole, slot positions. */
export interface PlanBounds {
	/** Launch-ready at the latest. */
	readonly readyBy?: number;
	/** Starts of a step that a chosen launch asks for or forbids, 1 where allowed; per step. */
	readonly allowed?: readonly (Uint8Array | null)[];
}

/** Earlier starts from the last step backwards. */
function backwards(a: RankedWay, b: RankedWay): number {
	for (let i = a.starts.length - 1; i >= 0; i--)
		if (a.starts[i] !== b.starts[i]) return a.starts[i] - b.starts[i];
	return 0;
}

/** Order of the soonest plan: launch-ready first, then the earlier starts from the last step backwards. */
export const bySoonest = (a: RankedWay, b: RankedWay): number =>
	(a.ready === b.ready ? 0 : a.ready - b.ready) || backwards(a, b);

/** Order of the surest plan: most room, then the greatest sum of scores, then the soonest. */
export const bySurest = (a: RankedWay, b: RankedWay): number =>
	(a.room === b.room ? 0 : b.room - a.room) || b.score - a.score || bySoonest(a, b);

function ranked(chain: Chain, { starts }: Way): RankedWay {
	let room = Infinity;
	let score = 0;
	let ready = -Infinity;
	chain.steps.forEach((step, i) => {
		room = Math.min(room, step.room[starts[i]]);
		score += step.score[starts[i]];
		ready = Math.max(ready, step.ready[starts[i]]);
	});
	return { starts, room, score, ready };
}

/** Masks of the starts with at least so much room, ready by a position, and allowed. */
function masks(chain: Chain, least: number, readyBy: number, bounds: PlanBounds): Uint8Array[] {
	return chain.steps.map(({ room, ready }, i) => {
		const allowed = bounds.allowed?.[i] ?? null;
		const mask = new Uint8Array(room.length);
		for (let k = 0; k < mask.length; k++)
			if (room[k] >= least && ready[k] <= readyBy && (allowed === null || allowed[k] === 1))
				mask[k] = 1;
		return mask;
	});
}

const NOTHING = (chain: Chain): Float64Array[] =>
	chain.steps.map((step) => new Float64Array(step.start.length));

/**
 * Of the ways of one value, the one launch-ready first, and of those the earliest from the last
 * step backwards. Readiness only grows with each start, so the search is over the bound on it.
 */
function soonestOf(
	chain: Chain,
	best: Way,
	readyBy: number,
	find: (readyBy: number) => Way | null
): Way {
	const ready = (way: Way): number => ranked(chain, way).ready;
	const last = chain.steps.length - 1;
	// The earliest last start of all is found already: no way is ready before that step is.
	const least = chain.steps[last].ready[best.starts[last]];
	let found = best;
	if (ready(found) <= least) return found;
	const instants = [
		...new Set(chain.steps.flatMap((step) => [...step.ready].filter((it) => it >= least)))
	].sort((a, b) => a - b);
	let low = 0;
	let high = instants.findIndex((it) => it >= Math.min(ready(found), readyBy));
	while (low < high) {
		const middle = (low + high) >> 1;
		const way = find(instants[middle]);
		if (way !== null && way.value === best.value) {
			found = way;
			high = middle;
		} else low = middle + 1;
	}
	// The bound that was met once more, for the earliest starts under it.
	return find(instants[high]) ?? found;
}

/** Launch-ready soonest, then the earliest starts from the last step backwards. Null: no way. */
export function soonest(chain: Chain, bounds: PlanBounds = {}): RankedWay | null {
	const values = NOTHING(chain);
	const readyBy = bounds.readyBy ?? Infinity;
	const find = (by: number): Way | null =>
		sweep(chain, { values, combine: 'sum', allowed: masks(chain, -Infinity, by, bounds) });
	const way = find(readyBy);
	return way === null ? null : ranked(chain, soonestOf(chain, way, readyBy, find));
}

/** Largest least room, then the largest sum of scores, then soonest. Null: no way. */
export function surest(chain: Chain, bounds: PlanBounds = {}): RankedWay | null {
	const readyBy = bounds.readyBy ?? Infinity;
	const roomiest: Objective = {
		values: chain.steps.map((step) => step.room),
		combine: 'least',
		allowed: masks(chain, -Infinity, readyBy, bounds)
	};
	const widest = sweep(chain, roomiest);
	if (widest === null) return null;
	const values = chain.steps.map((step) => step.score);
	const find = (by: number): Way | null =>
		sweep(chain, { values, combine: 'sum', allowed: masks(chain, widest.value, by, bounds) });
	const way = find(readyBy);
	return way === null ? null : ranked(chain, soonestOf(chain, way, readyBy, find));
}
