/** Angles of a compass drawn with north up: degrees from north, clockwise, 0 to under 360. */

export interface Sector {
	readonly from: number;
	readonly to: number;
}

/** An angle brought to 0 … 359. */
export const turned = (degrees: number): number => ((degrees % 360) + 360) % 360;

/** How far it is from one angle to another clockwise, over 0 and at most 360. */
export const sweep = ({ from, to }: Sector): number => turned(to - from) || 360;

/** A point of the compass at a radius, the centre at 0, y downwards. */
export function pointAt(degrees: number, radius: number): { x: number; y: number } {
	const angle = (degrees * Math.PI) / 180;
	const near = (value: number): number => Math.round(value * 100) / 100 || 0;
	return { x: near(radius * Math.sin(angle)), y: near(-radius * Math.cos(angle)) };
}

/** The angle of a point, whole degrees; the centre looks north. */
export const angleOf = (x: number, y: number): number =>
	turned(Math.round((Math.atan2(x, 0 - y) * 180) / Math.PI));

/** The outline of a sector between two radii, as an SVG path. */
export function sectorPath(sector: Sector, inner: number, outer: number): string {
	const size = sweep(sector);
	// A whole circle's arc would begin where it ends and be none: it is drawn as two.
	if (size === 360) return ring(outer, 1) + ring(inner, 0);
	const [a, b] = [pointAt(sector.from, outer), pointAt(sector.to, outer)];
	const [c, d] = [pointAt(sector.to, inner), pointAt(sector.from, inner)];
	const large = size > 180 ? 1 : 0;
	return `M${a.x} ${a.y}A${outer} ${outer} 0 ${large} 1 ${b.x} ${b.y}L${c.x} ${c.y}A${inner} ${inner} 0 ${large} 0 ${d.x} ${d.y}Z`;
}

const ring = (radius: number, way: 0 | 1): string =>
	`M0 ${-radius}A${radius} ${radius} 0 0 ${way} 0 ${radius}A${radius} ${radius} 0 0 ${way} 0 ${-radius}Z`;

const POINTS = [
	'north',
	'north-east',
	'east',
	'south-east',
	'south',
	'south-west',
	'west',
	'north-west'
];

/** The nearest of the eight points, in words. */
export const pointWords = (degrees: number): string => POINTS[Math.round(turned(degrees) / 45) % 8];

/** Moves one end of a sector; it never comes to lie on the other. */
export function withEnd(sector: Sector, end: 'from' | 'to', degrees: number): Sector {
	const at = turned(degrees);
	const other = turned(end === 'from' ? sector.to : sector.from);
	return at === other ? sector : { ...sector, [end]: at };
}
