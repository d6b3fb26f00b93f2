import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: hard, contact-leaching copper antifouling.
 *
 * Times, limits and film are generic and plausible. Sixty days to launch, then a scuff with P220,
 * is what a boating magazine reports of one maker's line.
 */
export const hardAntifouling: Sheet = {
	name: 'Hard antifouling (sample)',
	type: 'hardAntifouling',
	sample: true,
	mix: { by: 'volume', parts: [{ name: 'paint', share: 1 }] },
	film: { solids: 52, dryFilm: 48, wetFilm: 92, spreadRate: 10.8, coats: { min: 2, max: 2 } },
	tinLitres: [0.75, 2.5, 5],
	thinner: { percent: { max: 10 } },
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
		touchDry: rowsFrom(5, 1, 180, 130, 115, 90, 65, 60, 50),
		keepDry: rowsFrom(5, HOUR, 8, 6.5, 5, 4, 3.25, 2.5, 2),
		overcoatMin: rowsFrom(5, HOUR, 16, 13, 10, 8, 6.5, 5, 4),
		overcoatMax: null,
		launchMin: rowsFrom(5, HOUR, 32, 26, 20, 16, 13, 10, 8),
		launchMax: 60 * DAY
	},
	whenMaximumPassed: { do: 'abrade', grit: { from: 220, to: 220 } }
};
