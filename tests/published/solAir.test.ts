import { describe, expect, test } from 'vitest';
import { STEFAN_BOLTZMANN } from '../../src/lib/engine/met/longwave';
import type { SurfaceBody, SurfaceDrive } from '../../src/lib/engine/met/surface';
import { runSurface } from '../../src/lib/engine/met/surfaceRun';
import { everyCase, has, near, num, type Ruling } from './cases';

const KELVIN = 273.15;
const SLOTS = 192;
const HEAVY_ENOUGH = 14_000;

/** Runs a dry face under steady weather until it no longer changes, °C. */
function steadyState(options: {
	air: number;
	shortwave: number;
	absorptance: number;
	emissivity: number;
	heatTransfer: number;
	longwave: number;
}): number {
	const steady = (value: number): Float64Array => new Float64Array(SLOTS).fill(value);
	const drive: SurfaceDrive = {
		airTemperature: steady(options.air),
		vapourDensity: steady(0),
		condensationPoint: steady(-60),
		heatTransfer: steady(options.heatTransfer),
		vapourTransfer: steady(0),
		longwave: steady(options.longwave),
		insideTemperature: steady(options.air),
		rain: steady(0)
	};
	const body: SurfaceBody = {
		heatCapacity: HEAVY_ENOUGH,
		nodes: 1,
		conductance: 0,
		solarAbsorptance: options.absorptance,
		emissivity: options.emissivity,
		insideU: 0,
		runOffDepth: 0.1
	};
	const temperature = new Float64Array(SLOTS);
	runSurface(drive, steady(options.shortwave), body, temperature, new Float64Array(SLOTS));
	return temperature[SLOTS - 1];
}

const blackBody = (celsius: number): number => STEFAN_BOLTZMANN * (celsius + KELVIN) ** 4;

describe('surface temperature in steady state', () => {
	everyCase('06-sol-air-temperature.json', 5, (it): Ruling => {
		const { inputs, expected } = it;
		if (has(inputs, 'to_c', 'absorptance', 'ho'))
			return () => {
				// ASHRAE's ho is convection and radiation together, so the run gets no long wave of its own.
				const value = steadyState({
					air: num(inputs, 'to_c'),
					shortwave: num(inputs, 'solar_wm2'),
					absorptance: num(inputs, 'absorptance'),
					emissivity: 0,
					heatTransfer: num(inputs, 'ho'),
					longwave: 0
				});
				near(value, num(expected, 'sol_air_c'), 0.05, it);
			};
		if (has(inputs, 'h_conv'))
			return () => {
				const air = num(inputs, 'air_c');
				const value = steadyState({
					air,
					shortwave: num(inputs, 'absorbed_solar_wm2'),
					absorptance: num(inputs, 'alpha'),
					emissivity: num(inputs, 'eps'),
					heatTransfer: num(inputs, 'h_conv'),
					longwave: num(inputs, 'sky_emissivity') * blackBody(air)
				});
				near(value, num(expected, 'surface_c'), 0.01, it);
			};
		if (it.status.includes('memory')) return 'partly from memory: not a ground for a check';
		return 'a convention or formula in words; the numbers it leads to are checked';
	});

	test('a face radiating linearly warms as the sol-air relation says', () => {
		// Sol-air with ho = h + 4εσT³ about the air's temperature: the difference is the curvature of
		// T⁴, under 0.4 K for a rise of 20 K.
		const air = 20;
		const [absorptance, emissivity, h, light] = [0.4, 0.9, 17, 600];
		const ho = h + 4 * emissivity * STEFAN_BOLTZMANN * (air + KELVIN) ** 3;
		const value = steadyState({
			air,
			shortwave: light,
			absorptance,
			emissivity,
			heatTransfer: h,
			longwave: blackBody(air)
		});
		expect(Math.abs(value - (air + (absorptance * light) / ho))).toBeLessThan(0.4);
	});
});
