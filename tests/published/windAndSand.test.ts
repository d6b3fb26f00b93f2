import { describe } from 'vitest';
import {
	frictionVelocity,
	moistureFactor,
	thresholdFrictionVelocity,
	windOfFrictionVelocity
} from '../../src/lib/engine/met/sand';
import { meanAtHeight } from '../../src/lib/engine/met/wind';
import { everyCase, has, near, num, type Ruling } from './cases';

/** Air of the sources' rows, kg/m³. */
const AIR = 1.23;
const VON_KARMAN = 0.4;

describe('wind with height and sand', () => {
	everyCase('08-wind-sand.json', 19, (it): Ruling => {
		const { inputs, expected } = it;
		if (inputs.exponent !== undefined)
			return 'a power law: the engine uses the logarithmic profile';
		if (has(inputs, 'u_ms') && inputs.z1_m === 10)
			return () =>
				// FAO-56's own profile is the log law over clipped grass, roughness 0.0148 m.
				near(
					meanAtHeight(num(inputs, 'u_ms'), 0.0148, num(inputs, 'z2_m')),
					num(expected, 'u2_ms'),
					0.05,
					it
				);
		if (has(inputs, 'u10_ms', 'z0_m'))
			return () => {
				const [wind, roughness] = [num(inputs, 'u10_ms'), num(inputs, 'z0_m')];
				near(meanAtHeight(wind, roughness, 2), num(expected, 'u2_ms'), 1e-4, it);
				near((VON_KARMAN * wind) / Math.log(10 / roughness), num(expected, 'ustar_ms'), 1e-5, it);
			};
		if (has(expected, 'ustar_t_fluid_ms'))
			return () => {
				const threshold = thresholdFrictionVelocity({
					grainDiameter: num(inputs, 'diameter_um') / 1000,
					airDensity: AIR,
					moisturePercent: 0,
					clayPercent: 0
				});
				near(threshold, num(expected, 'ustar_t_fluid_ms'), 1e-4, it);
				near(windOfFrictionVelocity(threshold), num(expected, 'u10_fluid_ms_z0_1e4'), 3e-3, it);
				near(frictionVelocity(num(expected, 'u10_fluid_ms_z0_1e4')), threshold, 1e-4, it);
			};
		if (has(expected, 'threshold_factor') && has(inputs, 'clay_pct'))
			return () =>
				near(
					moistureFactor(num(inputs, 'gravimetric_moisture_pct'), num(inputs, 'clay_pct')),
					num(expected, 'threshold_factor'),
					1e-4,
					it
				);
		if (expected.observed_threshold === '10-20 mph (4.5-8.9 m/s)')
			return () => {
				const threshold = windOfFrictionVelocity(
					thresholdFrictionVelocity({
						grainDiameter: 0.25,
						airDensity: AIR,
						moisturePercent: 0,
						clayPercent: 0
					})
				);
				near(threshold, 6.7, 2.2, it);
			};
		if (has(inputs, 'A_N') || has(inputs, 'rho_a'))
			return 'another threshold than Bagnold’s (Shao and Lu; Iversen and White)';
		if (expected.observed_threshold !== undefined)
			return 'an observed range of another ground, height not stated';
		if (has(expected, 'ratio')) return 'heights far above any yard';
		return 'a finding or a default in words, with no number the engine computes';
	});
});
