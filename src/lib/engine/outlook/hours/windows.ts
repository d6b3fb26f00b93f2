/**
 * Sliding windows over slots: for every slot i the window [from(i), end[i]), both ends rising.
 * A NaN inside a window makes its result NaN.
 */

/** Least value in each window; +Infinity for an empty one. `out[i]` belongs to window i. */
export function windowMinima(
	values: Float64Array,
	offset: number,
	ends: Int32Array,
	out: Float64Array,
	at: Int32Array
): void {
	const count = values.length;
	// Indices of a rising run of candidates; the head is the least of the window.
	const queue = new Int32Array(count + 1);
	let head = 0;
	let tail = 0;
	let next = 0;
	let unknown = 0;
	let dropped = 0;
	for (let i = 0; i < out.length; i++) {
		const from = Math.min(i + offset, count);
		const end = Math.min(ends[i], count);
		for (; next < end; next++) {
			const value = values[next];
			if (value !== value) {
				unknown++;
				continue;
			}
			while (tail > head && values[queue[tail - 1]] > value) tail--;
			queue[tail++] = next;
		}
		for (; dropped < from; dropped++) {
			if (dropped < next && values[dropped] !== values[dropped]) unknown--;
			if (head < tail && queue[head] === dropped) head++;
		}
		// An empty window behind `next` holds nothing yet; skip what it will never hold.
		if (next < from) next = from;
		if (end <= from) {
			out[i] = Infinity;
			at[i] = i;
		} else if (unknown > 0) {
			out[i] = NaN;
			at[i] = from;
		} else {
			out[i] = values[queue[head]];
			at[i] = queue[head];
		}
	}
}
