/** A fixed scramble of whole numbers into [0, 1): the same seed always makes the same weather. */
export function hash(...numbers: number[]): number {
	let h = 0x811c9dc5;
	for (const number of numbers) {
		h = Math.imul(h ^ (number | 0), 0x01000193);
		h ^= h >>> 15;
		h = Math.imul(h, 0x2c1b3c6d);
		h ^= h >>> 13;
	}
	h = Math.imul(h, 0x297a2d39);
	return ((h ^ (h >>> 16)) >>> 0) / 2 ** 32;
}

/** Normal with mean 0 and deviation 1 (Box and Muller 1958), within ±4. */
export function normal(...numbers: number[]): number {
	const radius = Math.sqrt(-2 * Math.log(1 - hash(1, ...numbers)));
	return Math.max(-4, Math.min(4, radius * Math.cos(2 * Math.PI * hash(2, ...numbers))));
}

/**
 * Smooth noise along time: `normal` at every `period`, linear between.
 *
 * @param time - seconds
 * @param period - seconds
 */
export function smoothNoise(time: number, period: number, ...seed: number[]): number {
	const knot = Math.floor(time / period);
	const share = time / period - knot;
	return (1 - share) * normal(knot, ...seed) + share * normal(knot + 1, ...seed);
}
