import type { Sheet } from '../../sheet/sheet';
import { HOUR, DAY, rowsFrom } from '../rows';

/**
 * Sample, to be checked against the tin: one-part polyurethane sealant, a 9 mm bead at 50 % of
 * humidity. It cures on the moisture of the air, so it has a least humidity.
 *
 * Skin and cure are generic and plausible, near published sheets (tack-free in one to two hours,
 * over 3 mm a day at 20 °C and 50 %). Limits are common practice; the cartridge of 0.29 L too.
 */
export const polyurethaneSealant: Sheet = {
	name: 'Polyurethane sealant (sample)',
	type: 'polyurethaneSealant',
	sample: true,
	tinLitres: [0.29],
	hazards: ['isocyanate'],
	limits: {
		rainFree: true,
		drySurface: true,
		daylight: true,
		airTemperature: { min: 5, max: 35 },
		surfaceTemperature: { min: 5, max: 38 },
		relativeHumidity: { min: 30, max: 85 },
		curing: { min: 2 }
	},
	times: {
		touchDry: rowsFrom(5, 1, 150, 120, 90, 60, 55, 45, 35),
		dryToSand: rowsFrom(5, HOUR, 48, 42, 33, 26, 21, 16, 13),
		launchMin: rowsFrom(5, DAY, 9, 7.5, 6, 5, 4, 3.5, 2.5)
	}
};
