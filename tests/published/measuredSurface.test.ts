import { describe, expect, test } from 'vitest';
import { saturationPressureOverWater, vapourDensity } from '../../src/lib/engine/met/humidity';
import { STEFAN_BOLTZMANN } from '../../src/lib/engine/met/longwave';
import {
	convection,
	vapourTransfer,
	type SurfaceBody,
	type SurfaceDrive
} from '../../src/lib/engine/met/surface';
import { runSurface } from '../../src/lib/engine/met/surfaceRun';
import { logProfileFactor } from '../../src/lib/engine/met/wind';
import { readFixture } from './cases';

/**
 * The heat balance against a measured surface: NOAA SURFRAD, San Luis Valley, 1 January 2016, level
 * open ground. Driven by the measured radiation, air and wind; the surface's temperature is that
 * of its measured upward long wave. The ground under it is the force-restore method (Bhumralkar
 * 1975, Deardorff 1978), which is this balance with a capacity C and a conductance ωC to the day's
 * mean; the soil's values are a handbook's dry loam, from memory, none fitted.
 */
const KELVIN = 273.15;
const SLOTS_PER_HOUR = 4;
const EMISSIVITY = 0.97;
/** The wind there is measured at 10 m over short grass and bare ground (common practice). */
const ROUGHNESS = 0.01;
/** Dry loam: conductivity W/mK, volumetric heat J/m³K. */
const CONDUCTIVITY = 0.5;
const VOLUMETRIC_HEAT = 1.4e6;
/** The earth's turn, 1/s. */
const OMEGA = (2 * Math.PI) / 86_400;

interface Hour {
	readonly air: number;
	readonly humidity: number;
	readonly wind: number;
	readonly pressure: number;
	readonly longwaveDown: number;
	readonly longwaveUp: number;
	readonly ghi: number;
	readonly reflected: number;
}

function hours(): Hour[] {
	const [head, ...lines] = readFixture('surfrad-slv16001-hourly.csv').trim().split('\n');
	const names = head.split(',');
	return lines.map((line) => {
		const cells = line.split(',');
		const value = (name: string): number => Number(cells[names.indexOf(name)]);
		return {
			air: value('temp_c'),
			humidity: value('rh_pct'),
			wind: value('wind_ms'),
			pressure: value('pressure_hpa'),
			longwaveDown: value('lw_down_wm2'),
			longwaveUp: value('lw_up_wm2'),
			ghi: Math.max(0, value('ghi_wm2')),
			reflected: Math.max(0, value('sw_up_wm2'))
		};
	});
}

/** Skin temperature of an upward long wave, what is reflected of the sky's taken off, °C. */
const skinOf = ({ longwaveUp, longwaveDown }: Hour): number =>
	((longwaveUp - (1 - EMISSIVITY) * longwaveDown) / (EMISSIVITY * STEFAN_BOLTZMANN)) ** 0.25 -
	KELVIN;

/**
 * How far the balance is from the measured skin, hour by hour, K.
 *
 * @param moisture - mm an hour that the ground gives up to evaporate while the sun is up
 */
function offBy(day: readonly Hour[], moisture: number): number[] {
	// Means of the hour, held over it.
	const slots = (value: (hour: Hour) => number): Float64Array =>
		Float64Array.from({ length: day.length * SLOTS_PER_HOUR }, (_, i) =>
			value(day[Math.floor(i / SLOTS_PER_HOUR)])
		);
	const toTwoMetres = logProfileFactor(ROUGHNESS, 2);
	const transfer = (hour: Hour): number => convection(hour.wind * toTwoMetres);
	const meanSkin = day.reduce((sum, hour) => sum + skinOf(hour), 0) / day.length;
	const drive: SurfaceDrive = {
		airTemperature: slots((hour) => hour.air),
		vapourDensity: slots((hour) =>
			vapourDensity((hour.humidity / 100) * saturationPressureOverWater(hour.air), hour.air)
		),
		// Frost on the ground is not what is asked here.
		condensationPoint: slots(() => -90),
		heatTransfer: slots(transfer),
		vapourTransfer: slots((hour) => vapourTransfer(transfer(hour), hour.air, hour.pressure)),
		longwave: slots((hour) => hour.longwaveDown),
		insideTemperature: slots(() => meanSkin),
		rain: slots((hour) => (isDay(hour) ? moisture / SLOTS_PER_HOUR : 0))
	};
	const capacity = Math.sqrt((CONDUCTIVITY * VOLUMETRIC_HEAT) / (2 * OMEGA));
	const body: SurfaceBody = {
		heatCapacity: capacity,
		nodes: 1,
		conductance: 0,
		solarAbsorptance: 1,
		emissivity: EMISSIVITY,
		insideU: OMEGA * capacity,
		runOffDepth: 0.5
	};
	const temperature = new Float64Array(drive.rain.length);
	// What is absorbed was measured: no absorptance is guessed.
	const absorbed = slots((hour) => hour.ghi - hour.reflected);
	runSurface(drive, absorbed, body, temperature, new Float64Array(temperature.length));
	return day.map((hour, i) => temperature[i * SLOTS_PER_HOUR + 2] - skinOf(hour));
}

const isDay = ({ ghi }: Hour): boolean => ghi > 20;
const bias = (off: readonly number[]): number => off.reduce((a, b) => a + b, 0) / off.length;
const rmse = (off: readonly number[]): number =>
	Math.sqrt(off.reduce((sum, it) => sum + it * it, 0) / off.length);

describe('a level surface on the measured day', () => {
	const day = hours();
	const dry = offBy(day, 0);
	const moist = offBy(day, 0.8);

	test('keeps within kelvins of its measured skin through the night', () => {
		const night = dry.filter((_, i) => !isDay(day[i]));
		process.stdout.write(
			`surface on the measured day, K: night bias ${bias(night).toFixed(1)} RMSE ${rmse(night).toFixed(1)}; whole day dry ${bias(dry).toFixed(1)} / ${rmse(dry).toFixed(1)}, moist ${bias(moist).toFixed(1)} / ${rmse(moist).toFixed(1)}\n`
		);
		expect(night.length).toBeGreaterThan(12);
		expect(rmse(night)).toBeLessThan(2.5);
	});

	test('and by day where the ground gives up moisture, as thawing ground does', () => {
		// Dry, the model's noon is 11 K too warm: the skin measured stops at 5 °C under the full sun. How
		// wet the ground was is not recorded, so this asks only for the order of magnitude.
		expect(rmse(moist)).toBeLessThan(3);
		expect(rmse(moist)).toBeLessThan(rmse(dry));
	});
});
