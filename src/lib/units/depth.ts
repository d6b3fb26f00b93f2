/** Depths of water at the edge: rain and film. Inside everything is mm. */
export const DEPTH_UNITS = ['mm', 'in'] as const;
export type DepthUnit = (typeof DEPTH_UNITS)[number];

/** Exact by definition of the international inch (NIST SP 811, Appendix B). */
const MILLIMETRES_PER_INCH = 25.4;

/** A depth in mm, in the unit. */
export function toDepth(millimetres: number, unit: DepthUnit): number {
	return unit === 'in' ? millimetres / MILLIMETRES_PER_INCH : millimetres;
}

/** A depth in the unit, in mm. */
export function fromDepth(value: number, unit: DepthUnit): number {
	return unit === 'in' ? value * MILLIMETRES_PER_INCH : value;
}
