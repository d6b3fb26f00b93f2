import type { Run } from '$lib/api/hours';
import { SLOTS_PER_HOUR } from '$lib/time/slots';
import type { Span } from '../charts/axis';

/** The slots at which a run begins, in order, inside the window. */
function starts(runs: readonly Run[], window: Span): number[] {
	return runs.map((it) => Math.max(it.from, window.from)).filter((it) => it < window.to);
}

/**
 * Where a key leads on a batten: arrows walk the quarter-hours, with Shift the hours; Home and End
 * jump to the run before and the run after. Null for a key that means nothing here.
 */
export function walk(
	key: string,
	shift: boolean,
	slot: number,
	runs: readonly Run[],
	window: Span
): number | null {
	const step = shift ? SLOTS_PER_HOUR : 1;
	const within = (to: number) => Math.min(window.to - 1, Math.max(window.from, to));
	switch (key) {
		case 'ArrowRight':
		case 'ArrowUp':
			return within(slot + step);
		case 'ArrowLeft':
		case 'ArrowDown':
			return within(slot - step);
		case 'Home':
			return within(starts(runs, window).findLast((it) => it < slot) ?? window.from);
		case 'End':
			return within(starts(runs, window).find((it) => it > slot) ?? window.to - 1);
		default:
			return null;
	}
}
