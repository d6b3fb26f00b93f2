import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: one-part alkyd enamel for topsides.
 *
 * Times, limits and film are generic and plausible; no direct sun follows published help for such
 * enamels. Dry to sand is the overcoat minimum; wet sanding with P320–400 common practice.
 */
export const onePartEnamel: Sheet = {
	name: 'Enamel, one-part (sample)',
	type: 'onePartEnamel',
	sample: true,
	mix: { by: 'volume', parts: [{ name: 'paint', share: 1 }] },
	film: { solids: 50, dryFilm: 35, wetFilm: 70, spreadRate: 14, coats: { min: 2, max: 3 } },
	tinLitres: [0.75, 2.5],
	thinner: { percent: { max: 10 } },
	hazards: ['oilyRags', 'solvent'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 5, max: 30 },
		surfaceTemperature: { min: 5, max: 32 },
		relativeHumidity: { max: 85 },
		noDirectSun: true
	},
	times: {
		touchDry: rowsFrom(5, HOUR, 10, 8, 6.5, 5, 4, 3, 2.5),
		keepDry: rowsFrom(5, HOUR, 16, 13, 10, 8, 6.5, 5, 4),
		dryToSand: rowsFrom(5, HOUR, 33, 27, 22, 18, 15, 12, 10),
		overcoatMin: rowsFrom(5, HOUR, 33, 27, 22, 18, 15, 12, 10),
		overcoatMax: rowsFrom(5, HOUR, 96, 86, 80, 72, 64, 60, 57)
	},
	whenMaximumPassed: { do: 'abrade', grit: { from: 320, to: 400 }, wet: true }
};
