import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: clear silicone foul-release for propeller and shaft, over
 * its etch primer.
 *
 * Temperatures, humidity and dryness are those of published running-gear instructions; times are
 * generic and plausible. No pigment, no biocide, and no usual limit to the time ashore.
 */
export const runningGearSilicone: Sheet = {
	name: 'Foul-release for running gear, clear silicone (sample)',
	type: 'siliconeFinish',
	sample: true,
	film: { coats: { min: 1, max: 1 } },
	tinLitres: [0.25, 0.5],
	hazards: ['solvent'],
	substrates: ['bronze', 'casting', 'aluminium', 'steel', 'iron'],
	limits: {
		...DRY_WORK,
		spread: { min: 3, untilDry: true },
		airTemperature: { min: 16, max: 32 },
		surfaceTemperature: { min: 16, max: 35 },
		relativeHumidity: { min: 30, max: 85 }
	},
	times: {
		touchDry: rowsFrom(15, 1, 120, 90, 60, 55, 40),
		keepDry: rowsFrom(15, HOUR, 10, 8, 6, 4.5, 3.5),
		launchMin: rowsFrom(15, HOUR, 12, 9, 7, 5.5, 4),
		launchMax: null
	},
	whenMaximumPassed: { do: 'freshTieCoat' }
};
