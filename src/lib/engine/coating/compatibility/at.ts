import type { CoatingChain, CoatingFace, CoatingStep } from './chain';
import type { Found } from './surfaceBefore';
import type { CompatibilityWarning } from './warnings';

/** A step at a face, as a rule looks at it. */
export interface At {
	readonly chain: CoatingChain;
	readonly step: CoatingStep;
	readonly face: CoatingFace;
	readonly found: Found;
	/** Where a warning stands. */
	readonly place: { readonly step: number; readonly face: number };
}

/** What a group of rules has to say of a step at a face. */
export type Look = (at: At) => readonly (CompatibilityWarning | null)[];
