import { faceConditions, slotWeather, stepHours, type Face, type Step } from '../../src/lib/engine';
import { forecastOf, SAND, SITE } from './bay';
import { median } from './median';

/**
 * One step over sixteen days, in slots a second, and in ratio to the bare cost of
 * as many `Math.exp` calls as there are slots, in the same run. Medians of many runs; the machine
 * may be shared, so the ratio is what to compare.
 */
const DAYS = 16;
const RUNS = 1_500;

const FACE: Face = {
	tilt: 95,
	azimuth: 110,
	solarAbsorptance: 0.4,
	emissivity: 0.9,
	material: 'grp'
};
const STEP: Step = {
	name: 'barrier coat',
	kind: 'coat',
	durationMinutes: 150,
	method: 'roller',
	workHours: [{ days: [1, 2, 3, 4, 5, 6], from: '07:30', to: '18:30' }],
	limits: {
		airTemperature: { min: 10, max: 32 },
		surfaceTemperature: { min: 10, max: 35 },
		relativeHumidity: { max: 85 },
		spread: { min: 3 },
		wind: { max: 8 },
		gust: { max: 12 },
		rainFree: true,
		drySurface: true,
		daylight: true,
		sand: 'none',
		curing: { min: 8 }
	},
	times: {
		touchDry: [
			[10, 480],
			[20, 240],
			[30, 150]
		],
		keepDry: [
			[10, 900],
			[20, 480],
			[30, 300]
		],
		overcoatMin: [
			[10, 720],
			[20, 420],
			[30, 240]
		]
	}
};

/** Prints the times of one step's parts and their ratios to bare `Math.exp`. */
export function stepBench(print: (line: string) => void): void {
	const sixteenDays = forecastOf(DAYS, 0);
	const weather = slotWeather({ site: SITE, forecast: sixteenDays, looseSand: SAND });
	const conditions = faceConditions(weather, SITE, FACE, 'open');
	const slots = weather.grid.count;

	let sink = 0;
	const bareExp = median(RUNS, () => {
		for (let i = 0; i < slots; i++) sink += Math.exp(-i / slots);
	});
	const parts = [
		[
			'cold: hours to slots, sun, face and limits',
			() => {
				const fresh = slotWeather({ site: { ...SITE }, forecast: sixteenDays, looseSand: SAND });
				return stepHours(STEP, faceConditions(fresh, SITE, FACE, 'open'), SITE);
			}
		],
		[
			'hours to slots and the sun',
			() => slotWeather({ site: SITE, forecast: sixteenDays, looseSand: SAND })
		],
		['face: both runs of the heat balance', () => faceConditions(weather, SITE, FACE, 'open')],
		['limits, phases, stretches of a step', () => stepHours(STEP, conditions, SITE)],
		[
			'warm: face and limits, the weather ready',
			() => stepHours(STEP, faceConditions(weather, SITE, FACE, 'open'), SITE)
		]
	] as const;

	const line = (words: string, milliseconds: number): string =>
		`${words.padEnd(46)} ${milliseconds.toFixed(3)} ms  ${Math.round((slots / milliseconds) * 1000).toLocaleString('en')} slots/s  ${(milliseconds / bareExp).toFixed(1)} × exp`;
	print(`${DAYS} days, ${slots} slots, medians of ${RUNS}`);
	print(line(`bare exp, ${slots} calls`, bareExp));
	for (const [words, work] of parts) print(line(words, median(RUNS, work)));
	if (!Number.isFinite(sink)) throw new Error('the bare sum is no number');
}
