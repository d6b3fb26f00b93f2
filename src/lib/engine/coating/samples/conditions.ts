import type { Limits } from '../limits';

/**
 * What nearly every sheet asks: dry weather on a dry, clean face, 3 K above the dew point (the
 * customary reading of ISO 8502-4), by daylight and without blowing sand (common practice).
 */
export const DRY_WORK: Limits = {
	rainFree: true,
	drySurface: true,
	daylight: true,
	sand: 'none',
	spread: { min: 3 }
};
