import { POSITION_ROUNDING, within, type Chain, type Gap } from './chain';

/**
 * Best way through a chain, exactly, in one sweep per step.
 *
 * What a start of one step allows the next are windows that move forward only, so the best
 * predecessor of every start is a sliding-window maximum: O(steps × starts). Where a gap reaches
 * over a step (a coat, a wash, the next coat) the sweep carries the bounds still open along with
 * each way in and drops those that another way in beats on every count.
 */
export interface Objective {
	/** Value of each start of each step. */
	readonly values: readonly Float64Array[];
	/** How the values of a way add up: their sum, or the least of them. */
	readonly combine: 'sum' | 'least';
	/** 1 where a start may be used; null: all. */
	readonly allowed: readonly (Uint8Array | null)[];
}

/** A way through a chain: the start taken at each step. */
export interface Way {
	readonly value: number;
	readonly starts: Int32Array;
}

/**
 * Ways into the starts of one step. With `bounds` null there is one per start, at the start's own
 * index; unreachable ones have value −Infinity.
 */
interface Layer {
	readonly start: ArrayLike<number>;
	readonly value: ArrayLike<number>;
	/** Index in the layer before. */
	readonly parent: ArrayLike<number>;
	/** Steps to come that are bounded from before or at this one, and per way [earliest, latest] of each. */
	readonly targets: readonly number[];
	readonly bounds: readonly Float64Array[] | null;
}

/** The gaps from one step to another as one. */
function joined(gaps: readonly Gap[], from: number, to: number): Gap | null {
	const here = gaps.filter((gap) => gap.from === from && gap.to === to);
	if (here.length <= 1) return here[0] ?? null;
	const earliest = here[0].earliest.slice();
	const latest = here[0].latest.slice();
	for (const gap of here.slice(1)) {
		for (let k = 0; k < earliest.length; k++) {
			if (gap.earliest[k] > earliest[k]) earliest[k] = gap.earliest[k];
			if (gap.latest[k] < latest[k]) latest[k] = gap.latest[k];
		}
	}
	return { from, to, earliest, latest };
}

const reachesOver = (gaps: readonly Gap[], step: number): boolean =>
	gaps.some((gap) => gap.from < step && gap.to > step);

function firstLayer(chain: Chain, objective: Objective): Layer {
	const count = chain.steps[0].start.length;
	const allowed = objective.allowed[0];
	const start = new Int32Array(count);
	const value = new Float64Array(count);
	for (let k = 0; k < count; k++) {
		start[k] = k;
		value[k] = allowed === null || allowed[k] === 1 ? objective.values[0][k] : -Infinity;
	}
	return {
		start,
		value,
		parent: new Int32Array(count).fill(-1),
		targets: [1],
		bounds: null
	};
}

/** The step from one layer to the next where both have one way per start: a sliding window. */
function slide(chain: Chain, objective: Objective, step: number, before: Layer): Layer {
	const gap = joined(chain.gaps, step - 1, step);
	const { start } = chain.steps[step];
	const values = objective.values[step];
	const allowed = objective.allowed[step];
	const earlier = before.value.length;
	const value = new Float64Array(start.length).fill(-Infinity);
	const parent = new Int32Array(start.length).fill(-1);
	// Starts of the step before in the window, their values falling; the head is the best.
	const queue = new Int32Array(earlier);
	let head = 0;
	let tail = 0;
	let next = 0;
	for (let k = 0; k < start.length; k++) {
		const position = start[k];
		for (; next < earlier; next++) {
			const opens = gap === null ? -Infinity : gap.earliest[next];
			if (before.value[next] === -Infinity || opens === Infinity) continue;
			if (opens > position + POSITION_ROUNDING) break;
			while (tail > head && before.value[queue[tail - 1]] < before.value[next]) tail--;
			queue[tail++] = next;
		}
		if (gap !== null)
			while (head < tail && gap.latest[queue[head]] < position - POSITION_ROUNDING) head++;
		if (head === tail || (allowed !== null && allowed[k] === 0)) continue;
		const best = queue[head];
		value[k] = combined(objective, before.value[best], values[k]);
		parent[k] = best;
	}
	return { start: before.start, value, parent, targets: [step + 1], bounds: null };
}

function combined({ combine }: Objective, before: number, here: number): number {
	return combine === 'sum' ? before + here : Math.min(before, here);
}

const NO_BOUNDS = new Float64Array(0);

/** A way in, while a layer with open bounds is made. */
interface WayIn {
	readonly start: number;
	readonly value: number;
	readonly parent: number;
	readonly bounds: Float64Array;
}

/** Whether one way in is no worse than another on every bound still open. */
function noTighter(a: Float64Array, b: Float64Array): boolean {
	for (let i = 0; i < a.length; i += 2) if (a[i] > b[i] || a[i + 1] < b[i + 1]) return false;
	return true;
}

/** Keeps a way in unless an earlier one beats it; drops those it beats. */
function keep(ways: WayIn[], way: WayIn): void {
	if (ways.some((it) => it.value >= way.value && noTighter(it.bounds, way.bounds))) return;
	let kept = 0;
	for (const it of ways)
		if (!(way.value > it.value && noTighter(way.bounds, it.bounds))) ways[kept++] = it;
	ways.length = kept;
	ways.push(way);
}

/** The step from one layer to the next where bounds reach over one of them: every pair is tried. */
function scan(chain: Chain, objective: Objective, step: number, before: Layer): Layer {
	const { start, finish } = chain.steps[step];
	const allowed = objective.allowed[step];
	const into = joined(chain.gaps, step - 1, step);
	const isOpen = reachesOver(chain.gaps, step);
	const targets = chain.steps
		.map((_, t) => t)
		.filter((t) => t > step && chain.gaps.some((gap) => gap.from <= step && gap.to === t));
	const own = targets.map((t) => joined(chain.gaps, step, t));
	const here = before.targets.indexOf(step);
	const carried = targets.map((t) => before.targets.indexOf(t));
	// What the step before asks of later ones, where its layer carries no bounds yet.
	const past = targets.map((t) => joined(chain.gaps, step - 1, t));
	const result: WayIn[] = [];
	const earlier = chain.steps[step - 1].start;
	for (let k = 0; k < start.length; k++) {
		if (allowed !== null && allowed[k] === 0) continue;
		const ways: WayIn[] = [];
		for (let way = 0; way < before.value.length; way++) {
			if (before.value[way] === -Infinity) continue;
			const from = before.bounds === null ? way : before.start[way];
			// Work in order: nothing that starts later comes before.
			if (into !== null && earlier[from] > start[k] + POSITION_ROUNDING) break;
			const bounds = before.bounds?.[way];
			const opens = bounds === undefined ? (into?.earliest[from] ?? -Infinity) : bounds[2 * here];
			const closes = bounds === undefined ? (into?.latest[from] ?? Infinity) : bounds[2 * here + 1];
			if (!within(start[k], opens, closes)) continue;
			const value = combined(objective, before.value[way], objective.values[step][k]);
			if (!isOpen) {
				// Nothing stays open: the best way in, the first of equal ones.
				if (ways.length === 0 || value > ways[0].value)
					ways[0] = { start: k, value, parent: way, bounds: NO_BOUNDS };
				continue;
			}
			const open = new Float64Array(2 * targets.length);
			for (let t = 0; t < targets.length; t++) {
				const at = carried[t];
				let since = -Infinity;
				let until = Infinity;
				if (bounds === undefined) {
					since = past[t]?.earliest[from] ?? -Infinity;
					until = past[t]?.latest[from] ?? Infinity;
				} else if (at >= 0) {
					since = bounds[2 * at];
					until = bounds[2 * at + 1];
				}
				// A bound that the work itself outlasts is no tighter than the work.
				open[2 * t] = Math.max(since, own[t]?.earliest[k] ?? -Infinity, finish[k]);
				open[2 * t + 1] = Math.min(until, own[t]?.latest[k] ?? Infinity);
			}
			keep(ways, { start: k, value, parent: way, bounds: open });
		}
		result.push(...ways);
	}
	if (isOpen)
		return {
			start: result.map((way) => way.start),
			value: result.map((way) => way.value),
			parent: result.map((way) => way.parent),
			targets,
			bounds: result.map((way) => way.bounds)
		};
	const value = new Float64Array(start.length).fill(-Infinity);
	const parent = new Int32Array(start.length).fill(-1);
	for (const way of result) {
		value[way.start] = way.value;
		parent[way.start] = way.parent;
	}
	return { start: before.start, value, parent, targets: [step + 1], bounds: null };
}

/**
 * The best way through a chain: the greatest value; of equal ones the earliest start of the last
 * step, then of the one before it, and so on. Null where there is none.
 */
export function sweep(chain: Chain, objective: Objective): Way | null {
	const { steps, gaps } = chain;
	const layers: Layer[] = [firstLayer(chain, objective)];
	for (let step = 1; step < steps.length; step++) {
		const before = layers[step - 1];
		const plain = before.bounds === null && !reachesOver(gaps, step);
		layers.push((plain ? slide : scan)(chain, objective, step, before));
	}
	const last = layers[layers.length - 1];
	let best = -1;
	for (let way = 0; way < last.value.length; way++)
		if (last.value[way] > (best < 0 ? -Infinity : last.value[best])) best = way;
	if (best < 0) return null;
	const starts = new Int32Array(steps.length);
	let way = best;
	for (let step = steps.length - 1; step >= 0; step--) {
		const layer = layers[step];
		starts[step] = layer.bounds === null ? way : layer.start[way];
		way = layer.parent[way];
	}
	return { value: last.value[best], starts };
}
