import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: silicone foul-release finish over its tie coat.
 *
 * Times, limits and film are generic and plausible; eight hours without rain or dew at 20 °C
 * likewise. No usual limit to the time ashore: keep it covered, clean and unsanded.
 */
export const siliconeFinish: Sheet = {
	name: 'Silicone foul-release finish (sample)',
	type: 'siliconeFinish',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 9 },
			{ name: 'curing agent', share: 1 }
		],
		potLitres: 1
	},
	film: { solids: 72, dryFilm: 150, wetFilm: 208, spreadRate: 4.8, coats: { min: 1, max: 1 } },
	tinLitres: [0.75, 2.5],
	hazards: ['solvent'],
	limits: {
		...DRY_WORK,
		spread: { min: 3, untilDry: true },
		airTemperature: { min: 5, max: 35 },
		surfaceTemperature: { min: 5, max: 35 },
		relativeHumidity: { min: 30, max: 85 }
	},
	times: {
		potLife: rowsFrom(5, 1, 150, 120, 90, 60, 45, 35, 25),
		touchDry: rowsFrom(5, 1, 300, 210, 150, 120, 90, 60, 50),
		keepDry: rowsFrom(5, HOUR, 20, 14, 10, 8, 6, 4, 3.5),
		launchMin: rowsFrom(5, HOUR, 72, 48, 40, 30, 22, 17, 12),
		launchMax: null
	},
	whenMaximumPassed: { do: 'freshTieCoat' }
};
