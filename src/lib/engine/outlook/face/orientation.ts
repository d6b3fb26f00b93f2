/** The sides of a boat that get coated. */
export const FACE_NAMES = [
	'topsides',
	'bottom',
	'transom',
	'deck',
	'coachroof',
	'keel',
	'rudder',
	'driveLeg',
	'propeller'
] as const;
export type FaceName = (typeof FACE_NAMES)[number];

/**
 * How the faces of a boat look: tilt (0 up, 90 upright, 180 down) and bearing from the bow,
 * clockwise, in degrees; null for faces that look up. Usual hull forms (default, no source); a
 * person edits them per boat.
 */
export const FACE_ORIENTATIONS = {
	topsides: { tilt: 95, bearing: { port: 270, starboard: 90, both: 90 }, bothSides: false },
	bottom: { tilt: 125, bearing: { port: 270, starboard: 90, both: 90 }, bothSides: false },
	transom: { tilt: 90, bearing: { port: 180, starboard: 180, both: 180 }, bothSides: false },
	deck: { tilt: 0, bearing: null, bothSides: false },
	coachroof: { tilt: 0, bearing: null, bothSides: false },
	keel: { tilt: 90, bearing: { port: 270, starboard: 90, both: 90 }, bothSides: true },
	rudder: { tilt: 90, bearing: { port: 270, starboard: 90, both: 90 }, bothSides: true },
	driveLeg: { tilt: 90, bearing: { port: 270, starboard: 90, both: 90 }, bothSides: true },
	propeller: { tilt: 90, bearing: { port: 180, starboard: 180, both: 180 }, bothSides: true }
} as const satisfies Record<FaceName, object>;

/** Where a face looks, degrees from north clockwise, on a boat whose bow points at `heading`. */
export function faceAzimuth(heading: number, bearing: number | null): number {
	return bearing === null ? 0 : (((heading + bearing) % 360) + 360) % 360;
}
