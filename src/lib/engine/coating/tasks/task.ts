import type { Method, StepKind } from '../../vocabulary';
import type { Hazard } from '../hazards';
import type { Limits } from '../limits';
import type { Times } from '../times';

/** The usual rule for a kind of yard work, for a step that no sheet speaks for. */
export interface Task {
	readonly code: string;
	readonly kind: StepKind;
	readonly method: Method;
	readonly limits: Limits;
	/** Wind to be careful from, m/s at the limits' wind height, where one is usual. */
	readonly caution?: { readonly wind?: number; readonly gust?: number };
	readonly times?: Times;
	/** Done by the yard’s own people only. */
	readonly isYardOnly?: true;
	/** Hazards whose caution stands beside the work, worst first. */
	readonly hazards: readonly Hazard[];
	/** Where the numbers come from: a publication, or "common practice". */
	readonly source: string;
}

export const COMMON_PRACTICE = 'common practice';

/** Most wind, m/s: mean and gust. */
export const windMost = (wind: number, gust: number): Pick<Limits, 'wind' | 'gust'> => ({
	wind: { max: wind },
	gust: { max: gust }
});

/** The height of hoists, masts and ladders, m: their wind is read where the weather gives it. */
export const ALOFT = { windHeight: 10 } as const satisfies Limits;

export const DRY = { rainFree: true, drySurface: true } as const satisfies Limits;
