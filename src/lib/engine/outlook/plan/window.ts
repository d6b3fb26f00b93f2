import { POSITION_ROUNDING, within } from './chain';
import { linkBounds } from './gaps';
import { linksOf } from './links';
import type { PlanStep } from './planStep';

/** Slot positions between which a step may start, by what is already fixed before it. */
export interface StartWindow {
	readonly opens: number;
	/** +Infinity: no limit. */
	readonly closes: number;
	/** Indices of the fixed steps that open and close it; −1 for none. */
	readonly openedBy: number;
	readonly closedBy: number;
}

/**
 * The window of a step's start by the fixed steps before it (logged, taken or pinned): the recoat
 * window of the coat before, where that is on. That of a launch runs from the first to the last
 * launch slot in it. Null where nothing before it is fixed.
 */
export function startWindow(steps: readonly PlanStep[], to: number): StartWindow | null {
	let opens = -Infinity;
	let closes = Infinity;
	let openedBy = -1;
	let closedBy = -1;
	steps.slice(0, to).forEach(({ isFixed, candidates }, from) => {
		if (!isFixed || candidates.finish[0] <= opens) return;
		opens = candidates.finish[0];
		openedBy = from;
	});
	if (openedBy < 0) return null;
	for (const link of linksOf(steps)) {
		if (link.to !== to || !steps[link.from].isFixed) continue;
		const [bound] = linkBounds(link, steps[link.from], steps[to].duration);
		if (link.side === 'earliest' && bound > opens) {
			opens = bound;
			openedBy = link.from;
		}
		if (link.side === 'latest' && bound < closes) {
			closes = bound;
			closedBy = link.from;
		}
	}
	return { ...betweenSlots(opens, closes, steps[to].launchSlots), openedBy, closedBy };
}

/** A window drawn in to the launch slots inside it; as it is where none is. */
function betweenSlots(opens: number, closes: number, slots: Float64Array | null) {
	const inside = slots?.filter((slot) => within(slot, opens, closes)) ?? [];
	if (inside.length === 0) return { opens, closes };
	// Without a limit of its own a launch may wait for slots not yet stated.
	return {
		opens: inside[0],
		closes: closes === Infinity ? closes : inside[inside.length - 1]
	};
}

/** Whether a slot lies before the window of a step, inside it, or after its work must have begun. */
export function placeInWindow(
	{ opens, closes }: StartWindow,
	slot: number,
	duration: number
): 'early' | 'inside' | 'late' {
	if (slot < opens - POSITION_ROUNDING) return 'early';
	return slot >= closes + duration - POSITION_ROUNDING ? 'late' : 'inside';
}
