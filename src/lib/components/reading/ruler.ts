import type { LimitReadingRow } from '$lib/api/reading';

/** The ruler of room, px: the limit at a sixth, then one tick for one usual error. */
export const RULER = { width: 104, height: 16, limit: 104 / 6, tick: 21, ticks: 4 } as const;

/** A scaled room is capped at this many usual errors: what reaches it may be more. */
const CAPPED_AT = 3;

export type RulerFill =
	/** Inside, with this many px of tape or paint after the limit. */
	| { kind: 'taped' | 'painted'; length: number }
	/** Inside by more than the ruler shows. */
	| { kind: 'runsOff' }
	/** Outside, by this many px before the limit. */
	| { kind: 'bare'; length: number }
	| { kind: 'unknown' };

/** Room in usual errors: uncapped where the error is known; null where nothing is. */
function inErrors(row: LimitReadingRow): number | null {
	if (row.room !== null && row.usualError !== null && row.usualError > 0) {
		return row.room / row.usualError;
	}
	if (row.scaledRoom === null) return null;
	return row.scaledRoom >= CAPPED_AT ? Infinity : row.scaledRoom;
}

/** What is laid on the ruler for one limit. */
export function rulerFill(row: LimitReadingRow): RulerFill {
	const errors = inErrors(row);
	if (errors === null) {
		// In or out has no distance; without a value nothing is known.
		if (row.side !== 'in') return { kind: 'unknown' };
		return row.holds ? { kind: 'runsOff' } : { kind: 'bare', length: RULER.limit };
	}
	if (errors < 0) return { kind: 'bare', length: Math.min(RULER.limit, -errors * RULER.tick) };
	if (errors > RULER.ticks) return { kind: 'runsOff' };
	return { kind: errors < 1 ? 'taped' : 'painted', length: errors * RULER.tick };
}
