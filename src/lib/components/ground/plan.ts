/** The ground seen from above. Metres from the plan's lower left corner; drawn with y downwards. */

export interface PlanStand {
	readonly id: string;
	readonly name: string;
	readonly x: number | null;
	readonly y: number | null;
}
export interface PlanBoat {
	readonly id: string;
	readonly name: string;
	readonly standId: string | null;
	/** Degrees from north, clockwise. */
	readonly heading: number;
}

/** A hull of ten metres seen from above, its bow up, metres round its middle. */
export const HULL = 'M0 -5C1.7 -2.6 1.8 1.2 1.35 4.8L-1.35 4.8C-1.8 1.2 -1.7 -2.6 0 -5Z';
/** Its keel blocks, and those of an empty stand. */
export const CHOCKS = 'M-1.8 -2.5H1.8M-1.8 2.5H1.8M0 -3.4V3.4';
/** How near a hull must be let go to a stand to be put on it, m. */
const CATCH = 8;

/** How far a thing that heads somewhere is turned on a plan whose upper edge looks at `bearing`. */
export const turnOnPlan = (heading: number, bearing: number): number =>
	(((heading - bearing) % 360) + 360) % 360;

const isDrawn = (stand: PlanStand): stand is PlanStand & { x: number; y: number } =>
	stand.x !== null && stand.y !== null;

/** Where stands are drawn: those not placed yet stand in a row along the lower edge. */
export function placed<Stand extends PlanStand>(
	stands: readonly Stand[]
): (Stand & { x: number; y: number; isPlaced: boolean })[] {
	let waiting = 0;
	return stands.map((stand) =>
		isDrawn(stand)
			? { ...stand, isPlaced: true }
			: { ...stand, x: 12 + waiting++ * 18, y: 6, isPlaced: false }
	);
}

/** The nearest stand to a point that no other boat is on, within reach; null without one. */
export function freeStandNear(
	at: { readonly x: number; readonly y: number },
	stands: readonly { readonly id: string; readonly x: number; readonly y: number }[],
	boats: readonly PlanBoat[],
	boatId: string
): string | null {
	const near = stands
		.filter(({ id }) => !boats.some((boat) => boat.standId === id && boat.id !== boatId))
		.map(({ id, x, y }) => ({ id, distance: Math.hypot(x - at.x, y - at.y) }))
		.filter(({ distance }) => distance <= CATCH)
		.sort((a, b) => a.distance - b.distance);
	return near[0]?.id ?? null;
}

/** The next stand that no other boat is on, in their order and round again; its own where there is none. */
export function nextFreeStand(
	standId: string | null,
	step: 1 | -1,
	stands: readonly PlanStand[],
	boats: readonly PlanBoat[],
	boatId: string
): string | null {
	const free = stands.filter(
		({ id }) => !boats.some((boat) => boat.standId === id && boat.id !== boatId)
	);
	if (free.length === 0) return standId;
	const at = free.findIndex(({ id }) => id === standId);
	const next = at === -1 ? (step === 1 ? 0 : free.length - 1) : at + step;
	return free[(next + free.length) % free.length].id;
}

/** A length for the scale bar: a tenth to a quarter of the plan, a round number, m. */
export function scaleLength(width: number): number {
	return [500, 200, 100, 50, 20, 10, 5, 2].find((length) => length <= width / 4) ?? 1;
}
