import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: one-part varnish, the first coat thinned by a quarter to a
 * half.
 *
 * Times and film are generic and plausible; 10–27 °C in the air and no wind follow published advice
 * on varnishing. Published sheets go down to 65 % of humidity; 80 % here is generic. Dry to sand is
 * the overcoat minimum; wet sanding with P320–400 common practice.
 */
export const varnish: Sheet = {
	name: 'Varnish, one-part (sample)',
	type: 'varnish',
	sample: true,
	mix: { by: 'volume', parts: [{ name: 'varnish', share: 1 }] },
	film: { solids: 47, dryFilm: 32, wetFilm: 68, spreadRate: 14.5, coats: { min: 5, max: 8 } },
	tinLitres: [0.375, 0.75, 2.5],
	thinner: { percent: { max: 50 } },
	hazards: ['oilyRags', 'solvent'],
	substrates: ['timber'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 10, max: 27 },
		surfaceTemperature: { min: 10, max: 32 },
		relativeHumidity: { max: 80 },
		noDirectSun: true
	},
	times: {
		touchDry: rowsFrom(10, HOUR, 8.5, 6.5, 5, 4, 3, 2.5),
		keepDry: rowsFrom(10, HOUR, 13, 10, 8, 6.5, 5, 4),
		dryToSand: rowsFrom(10, HOUR, 33, 27, 22, 18, 15, 12),
		overcoatMin: rowsFrom(10, HOUR, 33, 27, 22, 18, 15, 12),
		overcoatMax: rowsFrom(10, HOUR, 72, 66, 60, 54, 48, 46)
	},
	whenMaximumPassed: { do: 'abrade', grit: { from: 320, to: 400 }, wet: true }
};
