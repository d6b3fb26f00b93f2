import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: two-part polyurethane topcoat.
 *
 * Times, limits and film are generic and plausible, their shape checked against a published
 * finish sheet and UFGS 09971's recoat windows. Dew or rain before it is dry costs the gloss. Dry
 * to sand is when tape holds (generic); P320–400 after the window is common practice.
 */
export const polyurethaneTopcoat: Sheet = {
	name: 'Polyurethane topcoat, two-part (sample)',
	type: 'polyurethaneTopcoat',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 2 },
			{ name: 'hardener', share: 1 }
		],
		potLitres: 1
	},
	film: { solids: 50, dryFilm: 45, wetFilm: 90, spreadRate: 11, coats: { min: 2, max: 3 } },
	tinLitres: [0.75, 2.25],
	thinner: { percent: { min: 5, max: 20 } },
	hazards: ['isocyanate', 'solvent'],
	contains: ['strongSolvent'],
	limits: {
		...DRY_WORK,
		spread: { min: 3, untilDry: true },
		airTemperature: { min: 10, max: 30 },
		surfaceTemperature: { min: 10, max: 35 },
		relativeHumidity: { max: 80 },
		curing: { min: 8 }
	},
	times: {
		potLife: rowsFrom(10, HOUR, 7, 5, 3.5, 2.5, 2, 1),
		dustFree: rowsFrom(10, 1, 150, 120, 90, 60, 55, 45),
		touchDry: rowsFrom(10, HOUR, 7, 5.5, 4, 3, 2, 1.5),
		keepDry: rowsFrom(10, HOUR, 15, 12, 9, 7, 5.5, 4),
		dryToSand: rowsFrom(10, HOUR, 34, 26, 20, 15, 12, 9),
		overcoatMin: rowsFrom(10, HOUR, 24, 18, 14, 11, 8, 6.5),
		overcoatMax: rowsFrom(10, HOUR, 72, 60, 48, 39, 32, 26),
		launchMin: rowsFrom(10, HOUR, 120, 96, 72, 60, 42, 32)
	},
	whenMaximumPassed: { do: 'abrade', grit: { from: 320, to: 400 } }
};
