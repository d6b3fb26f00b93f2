import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: tie coat between epoxy and a silicone finish.
 *
 * Film, spread rate and humidity from 30 % follow a published tie-coat sheet; times are generic
 * and plausible, touch dry being half of the overcoat minimum and the dry time that minimum.
 */
export const siliconeTieCoat: Sheet = {
	name: 'Silicone tie coat (sample)',
	type: 'siliconeTieCoat',
	sample: true,
	mix: {
		by: 'volume',
		parts: [
			{ name: 'base', share: 4 },
			{ name: 'curing agent', share: 1 }
		],
		potLitres: 1
	},
	film: { solids: 58, dryFilm: 90, wetFilm: 150, spreadRate: 6.4, coats: { min: 1, max: 1 } },
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
		potLife: rowsFrom(5, 1, 180, 120, 90, 60, 55, 40, 30),
		touchDry: rowsFrom(5, HOUR, 6, 4.5, 3.25, 2.5, 1.75, 1.5, 1),
		keepDry: rowsFrom(5, HOUR, 12, 9, 6.5, 5, 3.5, 3, 2),
		overcoatMin: rowsFrom(5, HOUR, 12, 9, 6.5, 5, 3.5, 3, 2),
		overcoatMax: rowsFrom(5, DAY, 8.5, 7, 6, 5, 4, 3.5, 3)
	},
	whenMaximumPassed: { do: 'freshTieCoat' }
};
