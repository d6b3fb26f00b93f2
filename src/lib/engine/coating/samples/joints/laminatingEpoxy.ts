import type { Sheet } from '../../sheet/sheet';
import { DRY_WORK } from '../conditions';
import { DAY, HOUR, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: laminating epoxy with a slow hardener, thin laminate, half
 * a litre at a time.
 *
 * Pot life, the next layer and strength are generic and plausible. Dry time is the common practice
 * of keeping a laminate dry until it is hard (6–12 h), touch dry a generic part of it. Densities of
 * resin and hardener are from memory. Blush is washed off before it is sanded.
 */
export const laminatingEpoxy: Sheet = {
	name: 'Laminating epoxy, slow hardener (sample)',
	type: 'laminatingEpoxy',
	sample: true,
	mix: {
		by: 'mass',
		parts: [
			{ name: 'resin', share: 100, density: 1.15 },
			{ name: 'hardener', share: 30, density: 1 }
		],
		potLitres: 0.5
	},
	tinLitres: [1, 5],
	hazards: ['epoxy'],
	substrates: ['grp', 'coredGrp', 'timber'],
	limits: {
		...DRY_WORK,
		airTemperature: { min: 15, max: 30 },
		surfaceTemperature: { min: 15, max: 35 },
		relativeHumidity: { max: 80 },
		noDirectSun: true,
		curing: { min: 12 }
	},
	times: {
		potLife: rowsFrom(15, 1, 50, 35, 25, 20, 10),
		touchDry: rowsFrom(15, HOUR, 8.5, 6, 4.5, 3, 2),
		keepDry: rowsFrom(15, HOUR, 17, 12, 8.5, 6, 4.5),
		dryToSand: rowsFrom(15, HOUR, 25, 18, 13, 9, 6.5),
		overcoatMin: rowsFrom(15, HOUR, 3.5, 2.5, 2, 1, 55 / 60),
		overcoatMax: rowsFrom(15, HOUR, 33, 24, 17, 13, 9),
		launchMin: rowsFrom(15, DAY, 7, 5, 3.5, 2.5, 46 / 24)
	},
	whenMaximumPassed: { do: 'washAndAbrade', wash: 'freshWater', grit: { from: 80, to: 80 } }
};
