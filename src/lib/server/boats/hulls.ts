import { FACE_ORIENTATIONS, type FaceName, type Material } from '../../engine';
import type { FaceRow } from '../db/schema';

/** The usual boats, as a person names them before anything is measured. */

/** Solar absorptance and emissivity of the present coat (defaults, no source). */
export const COLOURS = {
	white: { solarAbsorptance: 0.25, emissivity: 0.9 },
	light: { solarAbsorptance: 0.4, emissivity: 0.9 },
	mid: { solarAbsorptance: 0.6, emissivity: 0.9 },
	dark: { solarAbsorptance: 0.9, emissivity: 0.9 },
	bareAluminium: { solarAbsorptance: 0.4, emissivity: 0.15 }
} as const satisfies Record<string, Pick<FaceRow, 'solarAbsorptance' | 'emissivity'>>;
export type Colour = keyof typeof COLOURS;

/** What a hull is built of, as a choice. */
export const HULLS = ['grp', 'steel', 'aluminium', 'timber'] as const satisfies Material[];
export type Hull = (typeof HULLS)[number];

/** The faces of a usual boat: which sides each has, and what it is made of where not of the hull. */
const USUAL_FACES: readonly {
	readonly name: FaceName;
	readonly sides: readonly FaceRow['side'][];
	readonly material?: Material;
	readonly finish: FaceRow['finish'];
}[] = [
	{ name: 'topsides', sides: ['port', 'starboard'], finish: 'gloss' },
	{ name: 'bottom', sides: ['port', 'starboard'], finish: 'matt' },
	{ name: 'transom', sides: ['both'], finish: 'gloss' },
	{ name: 'deck', sides: ['both'], material: 'coredGrp', finish: 'nonSkid' },
	{ name: 'coachroof', sides: ['both'], material: 'coredGrp', finish: 'gloss' },
	{ name: 'keel', sides: ['both'], material: 'iron', finish: 'matt' },
	{ name: 'rudder', sides: ['both'], finish: 'matt' },
	{ name: 'driveLeg', sides: ['both'], material: 'casting', finish: 'matt' },
	{ name: 'propeller', sides: ['both'], material: 'casting', finish: 'matt' }
];

/** The faces a new boat starts with; its people take away what it has not. Bottoms are dark. */
export function usualFaces(
	hull: Hull,
	colour: Colour
): Omit<FaceRow, 'id' | 'boatId' | 'yardId' | 'revision'>[] {
	return USUAL_FACES.flatMap(({ name, sides, material, finish }) => {
		const { tilt, bearing, bothSides } = FACE_ORIENTATIONS[name];
		const below = ['bottom', 'keel', 'rudder', 'driveLeg', 'propeller'].includes(name);
		// A deck of a metal or timber hull is of the hull.
		const of = material === 'coredGrp' && hull !== 'grp' ? hull : (material ?? hull);
		return sides.map((side) => ({
			name,
			side,
			tilt,
			bearing: bearing === null ? null : bearing[side],
			bothSides,
			material: of,
			finish,
			inside: null,
			area: null,
			...COLOURS[below ? 'dark' : colour]
		}));
	});
}
