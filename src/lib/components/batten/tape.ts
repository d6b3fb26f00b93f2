/** How far each tooth of a torn end stands out, in amplitudes: irregular, and always the same. */
const TEETH = [-0.7, 0.9, -1, 0.5, -0.4, 1, -0.8, 0.6, -1, 0.8];

function tornEnd(x: number, top: number, bottom: number, torn: Torn, first: number): string[] {
	const count = Math.max(2, Math.round((bottom - top) / torn.step));
	return Array.from({ length: count + 1 }, (_, i) => {
		const out = TEETH[(first + i) % TEETH.length] * torn.amplitude;
		const y = top + ((bottom - top) * i) / count;
		return `${(x + out).toFixed(1)} ${y.toFixed(1)}`;
	});
}

interface Torn {
	readonly amplitude: number;
	readonly step: number;
}

/**
 * Outline of a length of tape from `left` to `right`, torn at both ends.
 * @param seed where in the row of teeth to begin, so that no two ends are alike
 */
export function tapePath(
	left: number,
	right: number,
	top: number,
	bottom: number,
	torn: Torn,
	seed: number
): string {
	// A length narrower than its own teeth would cross itself.
	const amplitude = Math.min(torn.amplitude, (right - left) / 3);
	const teeth = { amplitude, step: torn.step };
	const start = tornEnd(left, top, bottom, teeth, seed);
	const end = tornEnd(right, top, bottom, teeth, seed + 3).reverse();
	return `M${[...start, ...end].join('L')}Z`;
}
