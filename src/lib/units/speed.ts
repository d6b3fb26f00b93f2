/** Speeds at the edge. Inside everything is m/s. */
export const SPEED_UNITS = ['m/s', 'kn', 'km/h', 'mph'] as const;
export type SpeedUnit = (typeof SPEED_UNITS)[number];

/**
 * m/s in one of the unit, exact by definition: the international nautical mile is 1852 m,
 * the international mile 1609.344 m (NIST SP 811, Appendix B).
 */
const METRES_PER_SECOND: Record<SpeedUnit, number> = {
	'm/s': 1,
	kn: 1852 / 3600,
	'km/h': 1000 / 3600,
	mph: 0.44704
};

/** A speed in m/s, in the unit. */
export function toSpeed(metresPerSecond: number, unit: SpeedUnit): number {
	return metresPerSecond / METRES_PER_SECOND[unit];
}

/** A speed in the unit, in m/s. */
export function fromSpeed(value: number, unit: SpeedUnit): number {
	return value * METRES_PER_SECOND[unit];
}
