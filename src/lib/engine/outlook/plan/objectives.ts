import type { Chain } from './chain';
import { heaviestWay } from './heaviest';
import { domainsOf, earliestWay, roomierThan, type Allowed, type Domains } from './lattice';

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

const allowedBy = (bounds: PlanBounds, readyBy: number): Allowed => ({
	readyBy,
	starts: bounds.allowed ?? null
});

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

/** The starts taken at places in domains. */
const startsAt = (domains: Domains, places: Int32Array): Int32Array =>
	places.map((place, step) => domains[step][place]);

/** The first step of a chain that no way reaches; null where one goes through. */
export function firstOutOfReach(chain: Chain, bounds: PlanBounds = {}): number | null {
	const allowed = allowedBy(bounds, bounds.readyBy ?? Infinity);
	return earliestWay(chain, domainsOf(chain, allowed)).outOfReach;
}

/** Launch-ready soonest, then the earliest starts from the last step backwards. Null: no way. */
export function soonest(chain: Chain, bounds: PlanBounds = {}): RankedWay | null {
	return readyFirst(chain, bounds.readyBy ?? Infinity, (by) => {
		const domains = domainsOf(chain, allowedBy(bounds, by));
		const { places } = earliestWay(chain, domains);
		return places === null ? null : ranked(chain, startsAt(domains, places));
	});
}

/** The starts from which the way with the most room at its least is made, no other; null without a way. */
function roomiest(chain: Chain, all: Domains): Domains | null {
	const { places } = earliestWay(chain, all);
	if (places === null) return null;
	let low = ranked(chain, startsAt(all, places)).room;
	let best = roomierThan(chain, all, low);
	/** The room of a way with at least so much; null without one. */
	const tryFor = (least: number): number | null => {
		const domains = roomierThan(chain, all, least);
		const way = earliestWay(chain, domains);
		if (way.places === null) return null;
		best = domains;
		return ranked(chain, startsAt(domains, way.places)).room;
	};
	// No way has more than the step with the least to offer, and often one has as much.
	const high = mostOffered(chain, all);
	if (low === high || tryFor(high) !== null) return best;
	const rooms = roomsBetween(chain, all, low, high);
	let from = 0;
	let to = rooms.length;
	while (from < to) {
		const middle = (from + to) >> 1;
		const room = tryFor(rooms[middle]);
		if (room === null) to = middle;
		else {
			low = room;
			from = middle + 1;
			while (from < to && rooms[from] <= low) from++;
		}
	}
	return roomierThan(chain, all, low);
}

/** The rooms of starts strictly between two, rising. */
function roomsBetween({ steps }: Chain, domains: Domains, low: number, high: number): Float64Array {
	const rooms = new Float64Array(domains.reduce((sum, domain) => sum + domain.length, 0));
	let count = 0;
	domains.forEach((domain, step) => {
		const { room } = steps[step];
		for (const k of domain) if (room[k] > low && room[k] < high) rooms[count++] = room[k];
	});
	return rooms.subarray(0, count).sort();
}

/** The least, over the steps, of the most room that each has. */
function mostOffered({ steps }: Chain, domains: Domains): number {
	let least = Infinity;
	steps.forEach(({ room }, step) => {
		let most = -Infinity;
		for (const k of domains[step]) if (room[k] > most) most = room[k];
		if (most < least) least = most;
	});
	return least;
}

/** Largest least room, then the largest sum of scores, then soonest. Null: no way. */
export function surest(chain: Chain, bounds: PlanBounds = {}): RankedWay | null {
	const readyBy = bounds.readyBy ?? Infinity;
	const domains = roomiest(chain, domainsOf(chain, allowedBy(bounds, readyBy)));
	if (domains === null) return null;
	const heaviest = (by: number): RankedWay | null => {
		const inTime = domains.map((domain, step) =>
			by === readyBy ? domain : domain.filter((k) => chain.steps[step].ready[k] <= by)
		);
		const starts = heaviestWay(chain, inTime);
		return starts === null ? null : ranked(chain, starts);
	};
	const best = heaviest(readyBy);
	return readyFirst(chain, readyBy, (by) => {
		const way = by === readyBy ? best : heaviest(by);
		return way !== null && way.score === best?.score ? way : null;
	});
}

/** Whether a way keeps bounds; the best of all ways is then the best of those that do. */
export function keepsBounds(chain: Chain, way: RankedWay, bounds: PlanBounds): boolean {
	return (
		chain.steps.every(({ ready }, i) => ready[way.starts[i]] <= (bounds.readyBy ?? Infinity)) &&
		(bounds.allowed ?? []).every((allowed, i) => allowed === null || allowed[way.starts[i]] === 1)
	);
}
