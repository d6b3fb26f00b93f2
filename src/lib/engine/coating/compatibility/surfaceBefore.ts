import { COATINGS } from '../sheet/coatingTypes';
import type { CoatingChain, CoatingFace, CoatingStep, Surface } from './chain';

/** What a step finds on one face. */
export interface Found {
	readonly surface: Surface;
	/** Minutes that the surface has stood as it is; null where not known. */
	readonly minutes: number | null;
	/** µm of epoxy under whatever is on top; null where a film is not known. */
	readonly barrierMicrons: number | null;
	/** Whether the surface has been washed, and degreased, since it was made or rubbed fresh. */
	readonly washed: boolean;
	readonly degreased: boolean;
}

export const isBaring = (step: CoatingStep): boolean => step.bares || step.kind === 'blast';

/** µm of epoxy that a step adds; null where its sheet does not state the film. */
function barrierOf({ sheet, coats, kind }: CoatingStep): number | null {
	if (kind !== 'coat' || sheet === null || COATINGS[sheet.type].cure !== 'epoxy') return 0;
	return sheet.film?.dryFilm === undefined ? null : sheet.film.dryFilm * coats;
}

const plus = (a: number | null, b: number | null): number | null =>
	a === null || b === null ? null : a + b;

const atFirst = (face: CoatingFace): Found => ({
	surface: face.surface,
	minutes: null,
	barrierMicrons: face.barrierMicrons,
	washed: false,
	degreased: false
});

/** The face as a step leaves it. */
function after(step: CoatingStep, found: Found): Found {
	const stands = { minutes: 0, washed: false, degreased: false };
	// Bare metal rubbed again is fresh metal.
	if (step.kind === 'abrade' && found.surface === 'bare') return { ...found, ...stands };
	if (isBaring(step)) return { ...stands, surface: 'bare', barrierMicrons: 0 };
	if (step.kind === 'coat' || step.kind === 'laminate')
		return {
			...stands,
			surface: step.sheet?.type ?? 'unknown',
			barrierMicrons: plus(found.barrierMicrons, barrierOf(step))
		};
	return {
		...found,
		washed: found.washed || step.kind === 'wash',
		degreased: found.degreased || step.kind === 'degrease',
		minutes: plus(found.minutes, step.durationMinutes)
	};
}

/** What each step of a chain finds on a face; null for steps that do not touch it. */
export function foundOnFace(chain: CoatingChain, face: number): (Found | null)[] {
	let found = atFirst(chain.faces[face]);
	return chain.steps.map((step) => {
		// Time passes on this face while another is worked on.
		found = { ...found, minutes: plus(found.minutes, step.minutesSince) };
		if (!step.faces.includes(face)) {
			found = { ...found, minutes: plus(found.minutes, step.durationMinutes) };
			return null;
		}
		const here = found;
		found = after(step, found);
		return here;
	});
}
