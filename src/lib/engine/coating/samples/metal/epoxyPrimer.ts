import type { Following, Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

const UNDER_ANTIFOULING: Following = {
	overcoatMin: rowsFrom(10, HOUR, 8, 5.5, 4, 3, 2, 1.5),
	// While a thumb-print still holds.
	overcoatMax: rowsFrom(10, HOUR, 14, 10, 7, 5, 3.5, 2.5),
	whenMaximumPassed: { do: 'tackCoat', wetFilm: { from: 25, to: 50 }, waitMinutes: 240 }
};

/**
 * Sample, to be checked against the tin: two-part epoxy primer, polyamide type, standard hardener.
 *
 * Times, limits and film are generic and plausible, their shape checked against published notes
 * on navy epoxy-polyamide. The tack coat (25–50 µm wet, about 4 h, washed first where seven days
 * have passed) is that of NAVFAC MO-124. The longest dry time is common practice.
 */
export const epoxyPrimer: Sheet = {
	name: 'Epoxy primer, two-part (sample)',
	type: 'epoxyPrimer',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 4 },
			{ name: 'hardener', share: 1 }
		],
		potLitres: 1
	},
	film: { solids: 50, dryFilm: 55, wetFilm: 110, spreadRate: 9, coats: { min: 1, max: 2 } },
	tinLitres: [0.75, 2.5],
	thinner: { percent: { max: 10 } },
	hazards: ['epoxy', 'solvent'],
	substrates: ['steel', 'iron', 'lead', 'bronze', 'grp', 'coredGrp', 'timber'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 10, max: 35 },
		surfaceTemperature: { min: 10, max: 38 },
		relativeHumidity: { max: 85 },
		curing: { min: 8 }
	},
	times: {
		potLife: rowsFrom(10, HOUR, 8, 5.5, 4, 3, 2, 1.5),
		induction: rowsFrom(10, 1, 60, 30, 15, 15, 5, 5),
		touchDry: rowsFrom(10, HOUR, 8, 5.5, 4, 3, 2, 1.5),
		keepDry: rowsFrom(10, HOUR, 16, 11, 8, 5.5, 4, 3),
		dryToSand: rowsFrom(10, HOUR, 40, 28, 20, 14, 10, 7),
		overcoatMin: rowsFrom(10, HOUR, 16, 11, 8, 5.5, 4, 3),
		overcoatMax: rowsFrom(10, DAY, 11, 9, 7, 5.5, 4.5, 3.5)
	},
	following: {
		erodingAntifouling: UNDER_ANTIFOULING,
		hardAntifouling: UNDER_ANTIFOULING,
		siliconeTieCoat: {
			overcoatMin: rowsFrom(10, HOUR, 10, 7, 5, 3.5, 2.5, 2),
			overcoatMax: rowsFrom(10, HOUR, 96, 84, 72, 60, 48, 43)
		},
		polyurethaneTopcoat: {
			overcoatMin: rowsFrom(10, HOUR, 24, 17, 12, 8.5, 6, 4),
			overcoatMax: rowsFrom(10, HOUR, 120, 96, 72, 60, 45, 36),
			whenMaximumPassed: { do: 'abrade', grit: { from: 220, to: 320 } }
		}
	},
	whenMaximumPassed: {
		do: 'tackCoat',
		wash: 'detergent',
		wetFilm: { from: 25, to: 50 },
		waitMinutes: 240
	}
};
