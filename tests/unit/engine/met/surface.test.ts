import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	frostPointFromVapourPressure,
	saturationPressureOverWater,
	vapourDensity
} from '../../../../src/lib/engine/met/humidity';
import { STEFAN_BOLTZMANN } from '../../../../src/lib/engine/met/longwave';
import { MATERIAL_DEFAULTS } from '../../../../src/lib/engine/met/materials';
import {
	convection,
	heatBalance,
	saturationDensity,
	vapourTransfer,
	type SurfaceBody,
	type SurfaceDrive
} from '../../../../src/lib/engine/met/surface';
import { runSurface } from '../../../../src/lib/engine/met/surfaceRun';

const KELVIN = 273.15;
const BODY: SurfaceBody = {
	heatCapacity: 14_000,
	nodes: 1,
	conductance: 0,
	solarAbsorptance: 0.4,
	emissivity: 0.9,
	insideU: 3,
	runOffDepth: 0.1
};

interface Air {
	temperature: number;
	dewPoint: number;
	wind: number;
	/** W/m² the sky falls short of the air's own radiation. */
	skyDeficit: number;
	rain: number;
}
const CALM_CLEAR: Air = { temperature: 10, dewPoint: 9, wind: 0.3, skyDeficit: 90, rain: 0 };

function driveOf(hours: readonly Air[]): SurfaceDrive {
	const series = (value: (air: Air) => number): Float64Array => Float64Array.from(hours, value);
	return {
		airTemperature: series((it) => it.temperature),
		vapourDensity: series((it) =>
			vapourDensity(saturationPressureOverWater(it.dewPoint), it.temperature)
		),
		condensationPoint: series((it) =>
			it.dewPoint < 0
				? frostPointFromVapourPressure(saturationPressureOverWater(it.dewPoint))
				: it.dewPoint
		),
		heatTransfer: series((it) => convection(it.wind)),
		vapourTransfer: series((it) => vapourTransfer(convection(it.wind), it.temperature, 1013)),
		longwave: series((it) => STEFAN_BOLTZMANN * (it.temperature + KELVIN) ** 4 - it.skyDeficit),
		insideTemperature: series((it) => it.temperature),
		rain: series((it) => it.rain)
	};
}

function run(hours: readonly Air[], light = 0, body = BODY) {
	const temperature = new Float64Array(hours.length);
	const film = new Float64Array(hours.length);
	const starts = runSurface(
		driveOf(hours),
		new Float64Array(hours.length).fill(light),
		body,
		temperature,
		film
	);
	return { temperature, film, starts };
}
const steady = (air: Partial<Air>, slots = 48): Air[] =>
	Array.from({ length: slots }, () => ({ ...CALM_CLEAR, ...air }));

const anyAir = fc.record({
	temperature: fc.double({ min: -25, max: 45, noNaN: true }),
	dewPoint: fc.double({ min: -30, max: 25, noNaN: true }),
	wind: fc.double({ min: 0, max: 20, noNaN: true }),
	skyDeficit: fc.double({ min: -20, max: 150, noNaN: true }),
	rain: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 5, noNaN: true }))
});

describe('the heat balance', () => {
	test('the terms at a state that no longer changes add up to nothing', () => {
		const { temperature, film } = run(steady({ dewPoint: -10, wind: 2 }, 400), 300);
		const drive = driveOf(steady({ dewPoint: -10, wind: 2 }, 1));
		const at = (series: Float64Array): number => series[0];
		const balance = heatBalance(
			BODY,
			{
				airTemperature: at(drive.airTemperature),
				vapourDensity: at(drive.vapourDensity),
				heatTransfer: at(drive.heatTransfer),
				vapourTransfer: at(drive.vapourTransfer),
				longwave: at(drive.longwave),
				insideTemperature: at(drive.insideTemperature)
			},
			300,
			temperature[399],
			film[399]
		);
		const { shortwave, longwave, convection: air, inside, latent } = balance;
		expect(Math.abs(shortwave + longwave + air + inside + latent)).toBeLessThan(0.05);
	});

	test('heat stored over a run is what the terms brought, dry', () => {
		// One slot of three implicit steps: the balance at the new state times its time is the heat.
		const hours = steady({ dewPoint: -20, wind: 2, skyDeficit: 60 }, 8);
		const drive = driveOf(hours);
		const { temperature } = run(hours, 250);
		const mean = (temperature[6] + temperature[7]) / 2;
		const balance = heatBalance(
			BODY,
			{
				airTemperature: drive.airTemperature[6],
				vapourDensity: 0,
				heatTransfer: drive.heatTransfer[6],
				vapourTransfer: 0,
				longwave: drive.longwave[6],
				insideTemperature: drive.insideTemperature[6]
			},
			250,
			mean,
			0
		);
		const stored = BODY.heatCapacity * (temperature[7] - temperature[6]);
		const brought =
			(balance.shortwave + balance.longwave + balance.convection + balance.inside) * 900;
		expect(Math.abs(stored - brought)).toBeLessThan(0.25 * Math.abs(brought) + 500);
	});

	test('a clear calm night cools a face under the air and wets it', () => {
		const { temperature, film } = run(steady({}));
		expect(temperature[47]).toBeLessThan(CALM_CLEAR.temperature);
		expect(film[47]).toBeGreaterThan(0.01);
	});

	test('a cloudy night leaves it dry', () => {
		expect(run(steady({ skyDeficit: 5 })).film[47]).toBe(0);
	});

	test('the heat of condensation keeps the face near the dew point', () => {
		expect(run(steady({ dewPoint: 10 })).temperature[47]).toBeGreaterThan(
			run(steady({ dewPoint: -10 })).temperature[47]
		);
	});

	test('frost settles below freezing at the frost point, before the dew point is reached', () => {
		// Dew point −4.0 °C over water is a frost point of −3.5 °C over ice.
		const { temperature, film } = run(steady({ temperature: -2.2, dewPoint: -4, skyDeficit: 18 }));
		expect(temperature[47]).toBeGreaterThan(-4);
		expect(temperature[47]).toBeLessThan(-3.5);
		expect(film[47]).toBeGreaterThan(0);
	});

	test('rain fills the film to its run-off depth and the wind dries it', () => {
		const hours = [
			...steady({ rain: 1, wind: 4 }, 8),
			...steady({ dewPoint: 0, wind: 4, skyDeficit: 10 }, 60)
		];
		const { film } = run(hours);
		expect(film[8]).toBeCloseTo(BODY.runOffDepth, 2);
		expect(film[67]).toBe(0);
	});

	test('a missing rain is an unknown film in its slot, and what follows starts wet', () => {
		const hours = steady({ dewPoint: 0, wind: 1, skyDeficit: 10 }, 12);
		const { film } = run(hours.map((air, i) => (i === 5 ? { ...air, rain: NaN } : air)));
		expect(film[5]).toBeNaN();
		expect(film[6]).toBeCloseTo(BODY.runOffDepth, 6);
	});

	test('a gap in the air is a gap in the temperature, and the run starts again after it', () => {
		const hours = steady({}, 20).map((air, i) =>
			i === 7 || i === 8 ? { ...air, temperature: NaN } : air
		);
		const { temperature, starts } = run(hours);
		expect(temperature[7]).toBeNaN();
		expect(temperature[9]).not.toBeNaN();
		expect(starts).toEqual([0, 9]);
	});

	test('two nodes of timber warm faster in the first quarter-hour than one', () => {
		const { timber } = MATERIAL_DEFAULTS;
		const dark = { ...BODY, solarAbsorptance: 0.9 };
		const hours = steady({ dewPoint: -10, wind: 1 }, 200);
		const light = new Float64Array(200).fill(0).fill(800, 150);
		const rise = (body: SurfaceBody): number => {
			const temperature = new Float64Array(200);
			runSurface(driveOf(hours), light, body, temperature, new Float64Array(200));
			return temperature[151] - temperature[150];
		};
		const one = rise({ ...dark, heatCapacity: timber.heatCapacity });
		const two = rise({ ...dark, ...timber });
		expect(two - one).toBeGreaterThan(4);
	});

	test('the film is never negative nor over its run-off, whatever the weather', () => {
		fc.assert(
			fc.property(
				fc.array(anyAir, { minLength: 4, maxLength: 40 }),
				fc.double({ min: 0, max: 1100, noNaN: true }),
				(hours, light) => {
					const { film, temperature } = run(hours, light);
					for (let i = 0; i < film.length; i++) {
						expect(film[i]).toBeGreaterThanOrEqual(0);
						expect(film[i]).toBeLessThanOrEqual(BODY.runOffDepth);
						// Stable: within the air's range and what sun and sky can add to it.
						expect(Math.abs(temperature[i])).toBeLessThan(130);
					}
				}
			),
			{ numRuns: 200 }
		);
	});

	test('more absorptance never cools a sunlit face', () => {
		fc.assert(
			fc.property(fc.array(anyAir, { minLength: 8, maxLength: 24 }), (hours) => {
				const dry = hours.map((air) => ({ ...air, dewPoint: -30, rain: 0 }));
				const pale = run(dry, 500, { ...BODY, solarAbsorptance: 0.25 }).temperature;
				const dark = run(dry, 500, { ...BODY, solarAbsorptance: 0.9 }).temperature;
				pale.forEach((value, i) => expect(dark[i]).toBeGreaterThanOrEqual(value - 1e-9));
			}),
			{ numRuns: 60 }
		);
	});

	test('saturation density runs on over freezing with the step from water to ice', () => {
		expect(saturationDensity(0)).toBeCloseTo(0.00485, 4);
		expect(saturationDensity(-5)).toBeLessThan(saturationDensity(-4));
	});
});
