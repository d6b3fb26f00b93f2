/** A straight scale: values to px and back. */
export interface Linear {
	(value: number): number;
	readonly invert: (px: number) => number;
}

/**
 * The straight scale from a domain to px. Written out, because the scale library brings colour
 * parsing and number formats with it, a tenth of what a phone loads for the first screen.
 */
export function linear(domain: readonly [number, number], px: readonly [number, number]): Linear {
	const perValue = (px[1] - px[0]) / (domain[1] - domain[0]);
	return Object.assign((value: number) => px[0] + (value - domain[0]) * perValue, {
		invert: (at: number) => domain[0] + (at - px[0]) / perValue
	});
}
