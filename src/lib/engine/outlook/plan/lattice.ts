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

/** The starts allowed, without those that no later step can follow. */
export function domainsOf({ steps, gaps }: Chain, allowed: readonly Uint8Array[]): Domains {
	return steps.map(({ start }, step) => {
		const bounds = gaps.filter((gap) => gap.from === step).map(({ earliest }) => earliest);
		const usable: number[] = [];
		for (let k = 0; k < start.length; k++)
			if (allowed[step][k] === 1 && bounds.every((earliest) => earliest[k] < Infinity))
				usable.push(k);
		return Int32Array.from(usable);
	});
}

/** The way that starts earliest at every step, as places in the domains; or the first step none reaches. */
export type EarliestWay =
	| { readonly places: Int32Array; readonly outOfReach: null }
	| { readonly places: null; readonly outOfReach: number };

export function earliestWay({ steps, gaps }: Chain, domains: Domains): EarliestWay {
	const places = new Int32Array(steps.length);
	for (let step = 0; step < steps.length; step++) {
		const here = gaps.filter((gap) => gap.to <= step);
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
