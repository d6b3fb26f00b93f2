/**
 * The heaviest closed set of nodes: with a node, all that it asks for. Source: Picard 1976, by
 * maximum flow from nodes that add to those that take away, along what they ask for.
 */
export interface Closure {
	/** What each node adds; whole numbers. */
	readonly weights: Float64Array;
	/** Per edge: a node, and one that it asks for. */
	readonly from: readonly number[];
	readonly to: readonly number[];
}

/** Edges of each node in one array: edge 2e as given, 2e + 1 its way back. */
function adjacency({ weights, from, to }: Closure): { first: Int32Array; edges: Int32Array } {
	const count = weights.length;
	const first = new Int32Array(count + 1);
	for (const node of from) first[node + 1]++;
	for (const node of to) first[node + 1]++;
	for (let node = 0; node < count; node++) first[node + 1] += first[node];
	const at = first.slice();
	const edges = new Int32Array(2 * from.length);
	for (let e = 0; e < from.length; e++) {
		edges[at[from[e]]++] = 2 * e;
		edges[at[to[e]]++] = 2 * e + 1;
	}
	return { first, edges };
}

/** 1 for the nodes of the least of the heaviest closed sets. */
export function heaviestClosure(closure: Closure): Uint8Array {
	const { weights, from, to } = closure;
	const { first, edges } = adjacency(closure);
	// What is not yet carried away, and what can still be taken up (negative).
	const left = weights.slice();
	const flow = new Float64Array(from.length);
	const kept = new Uint8Array(weights.length);
	const seen = new Int32Array(weights.length).fill(-1);
	const cameBy = new Int32Array(weights.length);
	const queue = new Int32Array(weights.length);
	let search = 0;
	/** The nearest node from one on that can take up some of its weight; −1 where none can. */
	const nearest = (source: number): { sink: number; reached: number } => {
		search++;
		let tail = 0;
		queue[tail++] = source;
		seen[source] = search;
		for (let head = 0; head < tail; head++) {
			const node = queue[head];
			if (left[node] < 0) return { sink: node, reached: tail };
			for (let i = first[node]; i < first[node + 1]; i++) {
				const edge = edges[i];
				const isBack = (edge & 1) === 1;
				const other = isBack ? from[edge >> 1] : to[edge >> 1];
				if (seen[other] === search || kept[other] === 1) continue;
				if (isBack && flow[edge >> 1] === 0) continue;
				seen[other] = search;
				cameBy[other] = edge;
				queue[tail++] = other;
			}
		}
		return { sink: -1, reached: tail };
	};
	const carry = (source: number, sink: number): void => {
		let amount = Math.min(left[source], -left[sink]);
		const step = (node: number): number =>
			(cameBy[node] & 1) === 1 ? to[cameBy[node] >> 1] : from[cameBy[node] >> 1];
		for (let node = sink; node !== source; node = step(node))
			if ((cameBy[node] & 1) === 1) amount = Math.min(amount, flow[cameBy[node] >> 1]);
		for (let node = sink; node !== source; node = step(node))
			flow[cameBy[node] >> 1] += (cameBy[node] & 1) === 1 ? -amount : amount;
		left[source] -= amount;
		left[sink] += amount;
	};
	for (let source = 0; source < weights.length; source++) {
		while (left[source] > 0) {
			const { sink, reached } = nearest(source);
			if (sink >= 0) {
				carry(source, sink);
				continue;
			}
			// Nothing it asks for can take its weight up, now or later: all of that belongs to the set.
			for (let i = 0; i < reached; i++) kept[queue[i]] = 1;
			break;
		}
	}
	return kept;
}
