import type { Method } from '../../vocabulary';
import type { Sheet } from '../sheet/sheet';

/**
 * Paint that does not end up on the boat, % by method. Source: published loss factors (brush and
 * roller 10–15, airless 30, conventional spray up to 50; wind takes 5–30 of its own), the worse end
 * where there is a range; HVLP as airless and `none` (a bead, a laminate) common practice.
 */
export const METHOD_LOSS: Readonly<Record<Method, number>> = {
	brush: 15,
	roller: 15,
	rollAndTip: 15,
	hvlp: 30,
	airSpray: 50,
	airless: 30,
	none: 10
};

export interface Loss {
	readonly percent: number;
	readonly from: 'given' | 'sheet' | 'default';
}

/** The loss to reckon with: what was given, else the sheet's for the method, else the usual. */
export function lossOf(sheet: Sheet, method: Method, given: number | undefined): Loss {
	if (given !== undefined) return { percent: given, from: 'given' };
	const stated = method === 'none' ? undefined : sheet.film?.loss?.[method];
	return stated === undefined
		? { percent: METHOD_LOSS[method], from: 'default' }
		: { percent: stated, from: 'sheet' };
}
