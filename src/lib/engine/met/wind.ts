/** Wind at heights over ground. m/s, metres, degrees the wind comes from. */

/** Factor from the mean at `fromHeight` to the mean at `toHeight`: the logarithmic profile. */
export function logProfileFactor(roughness: number, toHeight: number, fromHeight = 10): number {
	if (toHeight <= roughness) return 0;
	return Math.log(toHeight / roughness) / Math.log(fromHeight / roughness);
}

/** Mean wind at a height from the mean at 10 m over ground of a roughness. */
export function meanAtHeight(mean10: number, roughness: number, height: number): number {
	return mean10 * logProfileFactor(roughness, height);
}

/** Gust at a height: the mean there plus the gust's excess at 10 m, which does not shrink. */
export function gustAtHeight(mean10: number, gust10: number, meanThere: number): number {
	return meanThere + (gust10 - mean10);
}

/**
 * Whether wind from a direction lies in a sector that runs clockwise from `from` to `to`.
 * A variable direction (negative) is in every sector.
 */
export function inSector(direction: number, from: number, to: number): boolean {
	if (direction < 0) return true;
	const width = (((to - from) % 360) + 360) % 360;
	const offset = (((direction - from) % 360) + 360) % 360;
	return width === 0 && to !== from ? true : offset <= width;
}
