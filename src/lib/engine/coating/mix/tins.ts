/** Tins of one size. */
export interface TinCount {
	readonly litres: number;
	readonly count: number;
}

export interface TinPlan {
	/** Largest first, none with a count of 0. */
	readonly tins: readonly TinCount[];
	readonly litres: number;
	readonly leftOver: number;
}

const MILLILITRES = 1000;
/** Cells of the search; over it the largest tins are taken off first. */
const MOST_CELLS = 100_000;

const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));

/** Fewest tins that make up each total exactly, and the last tin of each; 0 where none do. */
function fewest(sizes: readonly number[], most: number): { count: Int32Array; last: Int32Array } {
	const count = new Int32Array(most + 1).fill(-1);
	const last = new Int32Array(most + 1);
	count[0] = 0;
	for (let total = 1; total <= most; total++)
		for (const size of sizes) {
			const before = total - size;
			if (before < 0 || count[before] === -1) continue;
			if (count[total] !== -1 && count[total] <= count[before] + 1) continue;
			count[total] = count[before] + 1;
			last[total] = size;
		}
	return { count, last };
}

/**
 * The tins to buy for so many litres: the least paint left over, then the fewest tins. For a need
 * of very many tins the bulk is the largest size, which may leave a little more.
 *
 * @param sizes - litres in each size sold
 * @returns null without a size
 */
export function tinsFor(litres: number, sizes: readonly number[]): TinPlan | null {
	const millilitres = [...new Set(sizes.map((size) => Math.round(size * MILLILITRES)))]
		.filter((size) => size > 0)
		.sort((a, b) => b - a);
	if (millilitres.length === 0 || !Number.isFinite(litres)) return null;
	const unit = millilitres.reduce(gcd);
	const cells = millilitres.map((size) => size / unit);
	const smallest = cells[cells.length - 1];
	// Rounded to the microlitre first, so that a need of exactly one tin is one tin.
	const need = Math.max(0, Math.ceil(Math.round(litres * 1e6) / 1000 / unit - 1e-9));
	const bulk = Math.max(0, Math.ceil((need - MOST_CELLS) / cells[0]));
	const rest = Math.max(0, need - bulk * cells[0]);
	const { count, last } = fewest(cells, rest + smallest);
	let total = rest;
	while (count[total] === -1) total++;
	const counts = new Map<number, number>([[cells[0], bulk]]);
	for (let left = total; left > 0; left -= last[left])
		counts.set(last[left], (counts.get(last[left]) ?? 0) + 1);
	const litresOf = (cellCount: number): number => (cellCount * unit) / MILLILITRES;
	const bought = litresOf(total + bulk * cells[0]);
	return {
		tins: cells
			.map((size) => ({ litres: litresOf(size), count: counts.get(size) ?? 0 }))
			.filter((tin) => tin.count > 0),
		litres: bought,
		leftOver: Math.max(0, bought - litres)
	};
}
