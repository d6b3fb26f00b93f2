import type { Limiter, Method, ShelterName } from '../../vocabulary';

/** What would open a shut run, in order of trouble. */
export const REMEDY_CODES = ['wait', 'dry', 'method', 'shelter'] as const;
export type RemedyCode = (typeof REMEDY_CODES)[number];

/**
 * One way to open a shut run of a step. Instants in UTC epoch seconds. A gain of nothing is an
 * answer too: what was tried and would not help. Of a launch that keeps to slots, only runs that
 * shut one are told, and only what makes one workable is a gain.
 */
export interface Remedy {
	readonly code: RemedyCode;
	/** The shut run, and what shuts it. */
	readonly from: number;
	readonly to: number;
	readonly limiter: Limiter;
	/** Minutes that would be workable: of the run, or for `wait` and `dry` of the stretch after it. */
	readonly gainMinutes: number;
	/** The first and the end of the last of them; null with no gain. */
	readonly opensFrom: number | null;
	readonly opensTo: number | null;
	readonly shelter: ShelterName | null;
	readonly method: Method | null;
	/** Rests on the usual wind limits of the method, for want of the sheet's. */
	readonly isAssumed: boolean;
}
