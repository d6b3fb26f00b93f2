import type { Following, Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

const UNDER_ANTIFOULING: Following = {
	overcoatMin: rowsFrom(10, HOUR, 10, 7, 5, 3.5, 2.5, 2),
	overcoatMax: rowsFrom(10, HOUR, 20, 14, 10, 7, 5, 3.5),
	whenMaximumPassed: { do: 'tackCoat', wetFilm: { from: 25, to: 50 }, waitMinutes: 240 }
};

/**
 * Sample, to be checked against the tin: epoxy primer for aluminium, without zinc-rich pigment.
 *
 * Times, limits and film are generic and plausible; its antifouling is meant to be free of copper.
 * Touch dry is half of the overcoat minimum and dry time the same as that minimum (generic). Tack
 * coat as NAVFAC MO-124.
 */
export const aluminiumPrimer: Sheet = {
	name: 'Epoxy primer for aluminium, zinc-free (sample)',
	type: 'aluminiumPrimer',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 3 },
			{ name: 'hardener', share: 1 }
		],
		potLitres: 1
	},
	film: { solids: 52, dryFilm: 55, wetFilm: 106, spreadRate: 9.5, coats: { min: 2, max: 5 } },
	tinLitres: [0.75, 2],
	thinner: { percent: { max: 10 } },
	hazards: ['epoxy', 'solvent'],
	substrates: ['aluminium', 'casting'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 10, max: 32 },
		surfaceTemperature: { min: 10, max: 35 },
		relativeHumidity: { max: 80 },
		curing: { min: 10 }
	},
	times: {
		potLife: rowsFrom(10, HOUR, 8, 5.5, 4, 3, 2, 1.5),
		touchDry: rowsFrom(10, HOUR, 6, 4.25, 3, 2, 1.5, 1),
		keepDry: rowsFrom(10, HOUR, 12, 8.5, 6, 4, 3, 2),
		overcoatMin: rowsFrom(10, HOUR, 12, 8.5, 6, 4, 3, 2),
		overcoatMax: rowsFrom(10, DAY, 11, 9, 7, 5.5, 4.5, 3.5)
	},
	following: { erodingAntifouling: UNDER_ANTIFOULING, hardAntifouling: UNDER_ANTIFOULING },
	whenMaximumPassed: { do: 'abrade', grit: { from: 120, to: 180 } }
};
