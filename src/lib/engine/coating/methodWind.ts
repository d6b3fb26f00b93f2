import { z } from 'zod';
import { METHODS } from '../vocabulary';
import type { Limits } from './limits';
import { COATINGS, type CoatingType } from './sheet/coatingTypes';

/** The methods that lay a coating, `none` left out. */
export const layingMethodSchema = z.enum(METHODS).exclude(['none']);
export type LayingMethod = z.infer<typeof layingMethodSchema>;

/** Wind at work height, m/s: a mean to be careful from, and the mean and gust to stop at. */
export interface WindLimits {
	readonly caution: number;
	readonly stop: number;
	readonly gust: number;
}

/**
 * Default wind limits of each method, m/s at 2 m. No standard gives one legal figure.
 *
 * Sources: air spray's mean is the 10 mph spray cut-off of general painting advice, also where
 * UFGS 07570 asks for wind screens; airless's is the usual industrial 15 mph; roll and tip's the
 * upper 5–10 mph of general advice for a gloss finish. Cautions, gusts and the other rows are
 * common practice.
 */
export const METHOD_WIND_LIMITS: Readonly<Record<LayingMethod, WindLimits>> = {
	brush: { caution: 6, stop: 9, gust: 12 },
	roller: { caution: 6, stop: 9, gust: 12 },
	rollAndTip: { caution: 3, stop: 5.5, gust: 8 },
	hvlp: { caution: 3, stop: 5, gust: 7 },
	airSpray: { caution: 2.5, stop: 4.5, gust: 6 },
	airless: { caution: 3.5, stop: 6.7, gust: 9 }
};

/**
 * What the coating itself allows, m/s at 2 m, whatever lays it: a gloss shows every speck, dust on
 * a silicone costs its adhesion, varnish is not for wind. Common practice.
 */
const BY_SURFACE: Partial<Record<(typeof COATINGS)[CoatingType]['surface'], WindLimits>> = {
	gloss: { caution: 3, stop: 5.5, gust: 8 },
	varnish: { caution: 2.5, stop: 4, gust: 6 },
	silicone: { caution: 3, stop: 5, gust: 7 },
	thick: { caution: 6, stop: 10, gust: 13 }
};

/**
 * Default wind limits for a coating laid by a method: the stricter of the two, figure by figure.
 *
 * @returns null where neither states any
 */
export function defaultWind(
	method: LayingMethod | 'none',
	coating: CoatingType | null
): WindLimits | null {
	const ofMethod = method === 'none' ? undefined : METHOD_WIND_LIMITS[method];
	const ofCoating = coating === null ? undefined : BY_SURFACE[COATINGS[coating].surface];
	if (ofMethod === undefined || ofCoating === undefined) return ofMethod ?? ofCoating ?? null;
	return {
		caution: Math.min(ofMethod.caution, ofCoating.caution),
		stop: Math.min(ofMethod.stop, ofCoating.stop),
		gust: Math.min(ofMethod.gust, ofCoating.gust)
	};
}

/** Stops of a method as a step's limits. */
export function windStops({ stop, gust }: WindLimits): Pick<Limits, 'wind' | 'gust'> {
	return { wind: { max: stop }, gust: { max: gust } };
}
