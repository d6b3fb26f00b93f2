import type { Following, Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

const UNDER_ANTIFOULING: Following = {
	overcoatMin: rowsFrom(10, HOUR, 8, 5.5, 4, 3, 2, 1.5),
	overcoatMax: rowsFrom(10, HOUR, 16, 11, 8, 5.5, 4, 3),
	whenMaximumPassed: { do: 'tackCoat', wetFilm: { from: 25, to: 50 }, waitMinutes: 240 }
};

/**
 * Sample, to be checked against the tin: epoxy barrier coat below the waterline, four to six coats
 * to 250–300 µm.
 *
 * Times, limits and film are generic and plausible; six hours without rain at 20 °C follows a
 * published answer on rained-on epoxy; the tack coat is that of NAVFAC MO-124.
 */
export const epoxyBarrier: Sheet = {
	name: 'Epoxy barrier coat (sample)',
	type: 'epoxyBarrier',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 3 },
			{ name: 'hardener', share: 1 }
		],
		potLitres: 1
	},
	film: { solids: 50, dryFilm: 55, wetFilm: 110, spreadRate: 9, coats: { min: 4, max: 6 } },
	tinLitres: [0.75, 2.5, 5],
	thinner: { percent: { max: 10 } },
	hazards: ['epoxy', 'solvent'],
	substrates: ['grp', 'coredGrp', 'steel', 'iron', 'lead', 'aluminium', 'casting', 'timber'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 10, max: 32 },
		surfaceTemperature: { min: 10, max: 35 },
		relativeHumidity: { max: 85 },
		curing: { min: 8 }
	},
	times: {
		potLife: rowsFrom(10, HOUR, 5, 3.5, 2.5, 2, 1, 55 / 60),
		touchDry: rowsFrom(10, HOUR, 7, 5, 3.5, 2.5, 2, 1),
		keepDry: rowsFrom(10, HOUR, 12, 8.5, 6, 4, 3, 2),
		overcoatMin: rowsFrom(10, HOUR, 12, 8.5, 6, 4, 3, 2),
		overcoatMax: rowsFrom(10, DAY, 8, 6.5, 5, 4, 3, 2.5),
		launchMin: rowsFrom(10, HOUR, 132, 96, 72, 48, 38, 27)
	},
	following: {
		erodingAntifouling: UNDER_ANTIFOULING,
		hardAntifouling: UNDER_ANTIFOULING,
		siliconeTieCoat: {
			overcoatMin: rowsFrom(10, HOUR, 10, 7, 5, 3.5, 2.5, 2),
			overcoatMax: rowsFrom(10, HOUR, 96, 84, 72, 60, 48, 43)
		}
	},
	whenMaximumPassed: {
		do: 'tackCoat',
		wash: 'detergent',
		wetFilm: { from: 25, to: 50 },
		waitMinutes: 240
	}
};
