import { describe, expect, test } from 'vitest';
import {
	saturationPressureOverWater,
	vapourPressureFromRelativeHumidity,
	dewPointFromVapourPressure
} from '../../src/lib/engine/met/humidity';
import {
	clearSkyEmissivityBerdahlMartin1984,
	clearSkyEmissivityBrutsaert1975,
	clearSkyEmissivityPrata1996,
	skyLongwave,
	STEFAN_BOLTZMANN
} from '../../src/lib/engine/met/longwave';
import { everyCase, has, near, num, readFixture, type Ruling } from './cases';

const MODELS = new Map<unknown, (vapourPressure: number, temperature: number) => number>([
	['prata1996', clearSkyEmissivityPrata1996],
	['brutsaert1975', clearSkyEmissivityBrutsaert1975],
	['berdahl_martin1984', (e) => clearSkyEmissivityBerdahlMartin1984(dewPointFromVapourPressure(e))]
]);

describe('sky long wave', () => {
	everyCase('07-sky-longwave.json', 30, (it): Ruling => {
		const { inputs, expected } = it;
		const emissivity = MODELS.get(inputs.model);
		if (emissivity !== undefined)
			return () => {
				const temperature = num(inputs, 'temp_c');
				const vapour = vapourPressureFromRelativeHumidity(temperature, num(inputs, 'rh_pct'));
				// The source's vapour pressure is by other Magnus constants, 0.2 % apart.
				near(emissivity(vapour, temperature), num(expected, 'emissivity'), 2e-4, it);
			};
		if (inputs.model !== undefined) return 'a formula the engine does not use';
		if (has(inputs, 'temp_c', 'rh_pct') && has(expected, 'lw_down_wm2'))
			return () => {
				const temperature = num(inputs, 'temp_c');
				const vapour = vapourPressureFromRelativeHumidity(temperature, num(inputs, 'rh_pct'));
				near(skyLongwave(temperature, vapour, 0), num(expected, 'lw_down_wm2'), 30, it);
			};
		return 'a cloud factor or emissivity of Clark and Allen, or a daily sum: the engine uses neither';
	});

	test('Prata does best of three on the measured day, by bias and RMSE', () => {
		// NOAA SURFRAD, San Luis Valley, 1 January 2016: hourly means.
		const [head, ...lines] = readFixture('surfrad-slv16001-hourly.csv').trim().split('\n');
		const column = (name: string): number => head.split(',').indexOf(name);
		const scores = [...MODELS].map(([name, emissivity]) => {
			const errors = lines.map((line) => {
				const cells = line.split(',').map(Number);
				const temperature = cells[column('temp_c')];
				const vapour = (saturationPressureOverWater(temperature) * cells[column('rh_pct')]) / 100;
				const modelled =
					emissivity(vapour, temperature) * STEFAN_BOLTZMANN * (temperature + 273.15) ** 4;
				return modelled - cells[column('lw_down_wm2')];
			});
			const bias = errors.reduce((a, b) => a + b, 0) / errors.length;
			const rmse = Math.sqrt(errors.reduce((a, b) => a + b * b, 0) / errors.length);
			return { name: String(name), bias, rmse };
		});
		process.stdout.write(
			`sky long wave on the measured day, W/m²: ${scores.map(({ name, bias, rmse }) => `${name} bias ${bias.toFixed(1)} RMSE ${rmse.toFixed(1)}`).join('; ')}\n`
		);
		const rmseOf = (name: string): number =>
			scores.find((score) => score.name === name)?.rmse ?? Infinity;
		expect(lines).toHaveLength(24);
		expect(rmseOf('prata1996')).toBeLessThan(14);
		expect(rmseOf('brutsaert1975')).toBeLessThan(33);
		expect(rmseOf('berdahl_martin1984')).toBeLessThan(22);
		expect(Math.min(...scores.map(({ rmse }) => rmse))).toBe(rmseOf('prata1996'));
	});
});
