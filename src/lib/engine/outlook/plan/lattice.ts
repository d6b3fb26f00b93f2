import { POSITION_ROUNDING, type Chain, type Gap } from './chain';

/**
 * Every gap of a chain rises with the start it counts from. Of two ways through the chain the
 * earlier starts, taken step by step, are therefore a way too, and so are the later ones: the ways
 * are a lattice, with one that starts earliest at every step and one that starts latest. Both are
 * found by moving starts one way only until every gap holds: as many moves at most as there are
 * starts.
 */

/** Starts of each step that may be used, as indices, rising. */
export type Domains = readonly Int32Array[];

/** Which starts a plan may take. */
export interface Allowed {
	/** Launch-ready at the latest, a slot position. */
	readonly readyBy: number;
	/** 1 where a start may be taken, per step; null: all. */
	readonly starts: readonly (Uint8Array | null)[] | null;
}

/** The starts allowed, without those that no later step can follow. */
export function domainsOf({ steps, gaps }: Chain, { readyBy, starts }: Allowed): Domains {
	return steps.map(({ start, ready }, step) => {
		const bounds = gaps.filter((gap) => gap.from === step);
		const mask = starts?.[step] ?? null;
		const usable = new Int32Array(start.length);
		let count = 0;
		for (let k = 0; k < start.length; k++) {
			if (!(ready[k] <= readyBy) || (mask !== null && mask[k] === 0)) continue;
			let isFollowed = true;
			for (const { earliest } of bounds) if (earliest[k] === Infinity) isFollowed = false;
			if (isFollowed) usable[count++] = k;
		}
		return usable.subarray(0, count);
	});
}

/** The starts of domains with at least so much room. */
export function roomierThan({ steps }: Chain, domains: Domains, least: number): Domains {
	return domains.map((domain, step) => {
		const { room } = steps[step];
		const usable = new Int32Array(domain.length);
		let count = 0;
		for (const k of domain) if (room[k] >= least) usable[count++] = k;
		return usable.subarray(0, count);
	});
}

/** The way that starts earliest at every step, as places in the domains; or the first step none reaches. */
export type EarliestWay =
	| { readonly places: Int32Array; readonly outOfReach: null }
	| { readonly places: null; readonly outOfReach: number };

export function earliestWay({ steps, gaps }: Chain, domains: Domains): EarliestWay {
	const places = new Int32Array(steps.length);
	const here: Gap[] = [];
	for (let step = 0; step < steps.length; step++) {
		for (const gap of gaps) if (gap.to === step) here.push(gap);
		if (domains[step].length === 0 || !raise(steps, here, domains, places))
			return { places: null, outOfReach: step };
	}
	return { places, outOfReach: null };
}

/** Moves places up until the gaps hold; false where a step runs out of starts. */
function raise(
	steps: Chain['steps'],
	gaps: readonly Gap[],
	domains: Domains,
	places: Int32Array
): boolean {
	for (let isMoving = true; isMoving;) {
		isMoving = false;
		for (const { from, to, earliest, latest } of gaps) {
			const { start } = steps[to];
			const before = domains[from];
			const after = domains[to];
			const opens = earliest[before[places[from]]] - POSITION_ROUNDING;
			while (start[after[places[to]]] < opens) {
				if (++places[to] === after.length) return false;
				isMoving = true;
			}
			const position = start[after[places[to]]] - POSITION_ROUNDING;
			while (latest[before[places[from]]] < position) {
				if (++places[from] === before.length) return false;
				isMoving = true;
			}
		}
	}
	return true;
}

/** The way that starts latest at every step, as places in the domains, of a chain that has one. */
export function latestWay({ steps, gaps }: Chain, domains: Domains): Int32Array {
	const places = Int32Array.from(domains, (domain) => domain.length - 1);
	for (let isMoving = true; isMoving;) {
		isMoving = false;
		for (const { from, to, earliest, latest } of gaps) {
			const { start } = steps[to];
			const before = domains[from];
			const after = domains[to];
			const closes = latest[before[places[from]]] + POSITION_ROUNDING;
			while (start[after[places[to]]] > closes) {
				places[to]--;
				isMoving = true;
			}
			const position = start[after[places[to]]] + POSITION_ROUNDING;
			while (earliest[before[places[from]]] > position) {
				places[from]--;
				isMoving = true;
			}
		}
	}
	return places;
}
