/** Where dust and overspray go over level ground. Metres, degrees from north clockwise. */

const RADIANS = Math.PI / 180;

/** A place in the yard: metres east and north of any origin. */
export interface Place {
	readonly east: number;
	readonly north: number;
}

/** What makes dust or spray, and how far it reaches downwind, m (defaults, no source; a yard edits them). */
export const PLUME_REACH = {
	sanding: 30,
	sandingWithExtraction: 10,
	spraying: 60,
	blasting: 100
} as const;
export type PlumeActivity = keyof typeof PLUME_REACH;

/** Half the width of a plume in a steady wind, degrees (default, no source). */
const HALF_WIDTH = 25;

/** Degrees between two directions, the shorter way round, 0 to 180. */
export function angleBetween(a: number, b: number): number {
	const turn = Math.abs(((((a - b) % 360) + 540) % 360) - 180);
	return turn;
}

/** Bearing and distance from one place to another; the bearing of a place to itself is 0. */
export function bearingTo(from: Place, to: Place): { bearing: number; distance: number } {
	const east = to.east - from.east;
	const north = to.north - from.north;
	return {
		bearing: (Math.atan2(east, north) / RADIANS + 360) % 360,
		distance: Math.hypot(east, north)
	};
}

/**
 * Circular standard deviation of directions, degrees: √(−2 ln R) with R the mean resultant length
 * (Mardia and Jupp 2000, §2.3.1). Directions that cancel out have no mean: 180. 0 for fewer than two.
 */
export function circularSpread(directions: readonly number[]): number {
	if (directions.length < 2) return 0;
	let sine = 0;
	let cosine = 0;
	for (const direction of directions) {
		sine += Math.sin(direction * RADIANS);
		cosine += Math.cos(direction * RADIANS);
	}
	const length = Math.min(1, Math.hypot(sine, cosine) / directions.length);
	if (length < 1e-12) return 180;
	return Math.min(180, Math.sqrt(-2 * Math.log(length)) / RADIANS);
}

/** The wind that carries a plume. */
export interface PlumeWind {
	/** Degrees it comes from; negative where variable, which carries it every way. */
	readonly direction: number;
	/** How far the direction may be off, degrees. */
	readonly spread: number;
}

/** Whether a plume from one place reaches another: near enough, and downwind within its width. */
export function plumeReaches(
	from: Place,
	to: Place,
	{ direction, spread }: PlumeWind,
	reach: number
): boolean {
	const { bearing, distance } = bearingTo(from, to);
	if (distance > reach) return false;
	if (distance === 0 || direction < 0) return true;
	return angleBetween(bearing, direction + 180) <= HALF_WIDTH + spread;
}
