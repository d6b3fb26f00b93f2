import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: etch primer under the clear silicone of running gear.
 *
 * Its window is minutes: what follows goes on almost at once. Times and film are generic and
 * plausible; the dry film of 8–13 µm is the usual 0.3–0.5 mil of such primers, the temperatures
 * those of published running-gear instructions, the key on bare metal P60–80. Silent on pot life.
 */
export const etchPrimer: Sheet = {
	name: 'Etch primer for running gear (sample)',
	type: 'etchPrimer',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 1 },
			{ name: 'activator', share: 1 }
		]
	},
	film: { solids: 14, dryFilm: 10, wetFilm: 70, spreadRate: 14, coats: { min: 1, max: 1 } },
	tinLitres: [0.25],
	thinner: { percent: { max: 20 } },
	hazards: ['solvent'],
	substrates: ['bronze', 'casting', 'aluminium', 'steel', 'iron'],
	contains: ['strongSolvent'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 16, max: 32 },
		surfaceTemperature: { min: 16, max: 35 },
		relativeHumidity: { max: 85 }
	},
	times: {
		touchDry: rowsFrom(15, 1, 9, 7, 6, 5, 4),
		overcoatMin: rowsFrom(15, 1, 9, 7, 6, 5, 4),
		overcoatMax: rowsFrom(15, 1, 30, 25, 20, 15, 10)
	},
	whenMaximumPassed: { do: 'abrade', grit: { from: 60, to: 80 } }
};
