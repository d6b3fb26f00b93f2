/**
 * A chain of steps, each with the starts it may take, and what the place of one asks of a later
 * one. Positions are slots from the grid's start; fractions are parts of a slot.
 */
export interface Chain {
	readonly steps: readonly Candidates[];
	readonly gaps: readonly Gap[];
}

/** Starts that a step may take, in rising order; all arrays have one entry per start. */
export interface Candidates {
	readonly start: Float64Array;
	/** Exact end of the work. */
	readonly finish: Float64Array;
	/** Least scaled room over the slots worked; +Infinity for a step that is fixed. */
	readonly room: Float64Array;
	/** Whole-number score of the share of members in which it can go on; 0 for a step that is fixed. */
	readonly score: Float64Array;
	/** Slot position from which the boat may be launched as far as this step goes; rising. */
	readonly ready: Float64Array;
}

/**
 * Between when a later step must start, per start of an earlier one. Both rise with the start: a
 * coat laid later is through later. +Infinity in `earliest`: no later step can follow; in
 * `latest`: no limit.
 */
export interface Gap {
	readonly from: number;
	readonly to: number;
	readonly earliest: Float64Array;
	readonly latest: Float64Array;
	/** The maximum of a recoat window: what abrading in between would clear. */
	readonly isMaximum?: boolean;
}

/** Rounding of exact positions, in slots: under a millisecond. */
export const POSITION_ROUNDING = 1e-6;

/** Where the start of a step lies between the bounds of a gap. */
export function within(position: number, earliest: number, latest: number): boolean {
	return earliest <= position + POSITION_ROUNDING && latest >= position - POSITION_ROUNDING;
}
