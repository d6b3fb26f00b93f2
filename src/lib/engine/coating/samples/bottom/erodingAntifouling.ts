import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: self-eroding copper antifouling of one season.
 *
 * Times, limits and film are generic and plausible; three to four hours without rain at 20 °C
 * likewise. Sixty days ashore is the generous end of what single-season paints are given (two
 * weeks for some).
 */
export const erodingAntifouling: Sheet = {
	name: 'Self-eroding antifouling (sample)',
	type: 'erodingAntifouling',
	sample: true,
	mix: { by: 'volume', parts: [{ name: 'paint', share: 1 }] },
	film: { solids: 47, dryFilm: 45, wetFilm: 95, spreadRate: 10.5, coats: { min: 2, max: 3 } },
	tinLitres: [0.75, 2.5, 5],
	thinner: { percent: { max: 5 } },
	hazards: ['biocide', 'solvent'],
	substrates: ['grp', 'coredGrp', 'steel', 'iron', 'lead', 'timber'],
	contains: ['cuprousOxide'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 5, max: 35 },
		surfaceTemperature: { min: 5, max: 38 },
		relativeHumidity: { max: 85 }
	},
	times: {
		touchDry: rowsFrom(5, 1, 120, 90, 65, 60, 50, 40, 35),
		keepDry: rowsFrom(5, HOUR, 7, 5.5, 4.5, 3.5, 2.6, 2.3, 1.75),
		overcoatMin: rowsFrom(5, HOUR, 12, 9.5, 7.5, 6, 4.5, 4, 3),
		overcoatMax: null,
		launchMin: rowsFrom(5, HOUR, 24, 19, 15, 12, 9.5, 7.5, 6),
		launchMax: 60 * DAY
	}
};
