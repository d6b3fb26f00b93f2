import type { Chain } from './chain';
import { heaviestWay } from './heaviest';
import { domainsOf, earliestWay } from './lattice';

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

function ranked(chain: Chain, starts: Int32Array): RankedWay {
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

/**
 * Of the ways that a search finds under a bound on readiness, the one ready first. Readiness grows
 * with every start but where its clock runs into unknown weather, so the way of earliest starts has
 * it nearly always; else the search is over the bound.
 */
function readyFirst(
	chain: Chain,
	readyBy: number,
	find: (readyBy: number) => RankedWay | null
): RankedWay | null {
	const first = find(readyBy);
	if (first === null || isRising(chain)) return first;
	const instants = [...new Set(chain.steps.flatMap((step) => [...step.ready]))]
		.filter((it) => it < first.ready)
		.sort((a, b) => a - b);
	let found = first;
	let low = 0;
	let high = instants.length;
	while (low < high) {
		const middle = (low + high) >> 1;
		const way = find(instants[middle]);
		if (way !== null) {
			found = way;
			high = middle;
		} else low = middle + 1;
	}
	return found;
}

const isRising = ({ steps }: Chain): boolean =>
	steps.every(({ ready }) => ready.every((it, k) => k === 0 || it >= ready[k - 1]));

/** The way of earliest starts with at least so much room, ready by a position. */
function earliest(
	chain: Chain,
	least: number,
	readyBy: number,
	bounds: PlanBounds
): RankedWay | null {
	const domains = domainsOf(chain, masks(chain, least, readyBy, bounds));
	const { places } = earliestWay(chain, domains);
	return places === null
		? null
		: ranked(
				chain,
				places.map((place, step) => domains[step][place])
			);
}

/** The first step of a chain that no way reaches; null where one goes through. */
export function firstOutOfReach(chain: Chain, bounds: PlanBounds = {}): number | null {
	const allowed = masks(chain, -Infinity, bounds.readyBy ?? Infinity, bounds);
	return earliestWay(chain, domainsOf(chain, allowed)).outOfReach;
}

/** Launch-ready soonest, then the earliest starts from the last step backwards. Null: no way. */
export function soonest(chain: Chain, bounds: PlanBounds = {}): RankedWay | null {
	return readyFirst(chain, bounds.readyBy ?? Infinity, (by) =>
		earliest(chain, -Infinity, by, bounds)
	);
}

/** The most room that a way has at its least; null without a way. */
function mostRoom(chain: Chain, readyBy: number, bounds: PlanBounds): number | null {
	let best = earliest(chain, -Infinity, readyBy, bounds);
	if (best === null) return null;
	const rooms = [...new Set(chain.steps.flatMap(({ room }) => [...room]))].sort((a, b) => a - b);
	let low = rooms.indexOf(best.room);
	let high = rooms.length - 1;
	while (low < high) {
		const middle = (low + high + 1) >> 1;
		const way = earliest(chain, rooms[middle], readyBy, bounds);
		if (way === null) high = middle - 1;
		else {
			best = way;
			low = Math.max(middle, rooms.indexOf(way.room));
		}
	}
	return best.room;
}

/** Largest least room, then the largest sum of scores, then soonest. Null: no way. */
export function surest(chain: Chain, bounds: PlanBounds = {}): RankedWay | null {
	const readyBy = bounds.readyBy ?? Infinity;
	const room = mostRoom(chain, readyBy, bounds);
	if (room === null) return null;
	const heaviest = (by: number): RankedWay | null => {
		const starts = heaviestWay(chain, domainsOf(chain, masks(chain, room, by, bounds)));
		return starts === null ? null : ranked(chain, starts);
	};
	const best = heaviest(readyBy);
	return readyFirst(chain, readyBy, (by) => {
		const way = by === readyBy ? best : heaviest(by);
		return way !== null && way.score === best?.score ? way : null;
	});
}
