import { generator } from '../../fakes/forecast/generator';
import { NO_NUDGE, type HourWeather } from '../../fakes/forecast/weather';
import {
	faceConditions,
	slotWeather,
	stepHours,
	type Face,
	type Forecast,
	type Site,
	type Step
} from '../../src/lib/engine';

/**
 * `npm run bench`: one step over sixteen days, in slots a second, and in ratio to the bare cost of
 * as many `Math.exp` calls as there are slots, in the same run. Medians of many runs; the machine
 * may be shared, so the ratio is what to compare.
 */
const DAYS = 16;
const HOUR = 3600;
const WARM_UP = 400;
const RUNS = 1_500;

const START = Date.UTC(2026, 4, 4) / 1000;
const SITE: Site = { latitude: 37.02, longitude: -7.86, elevation: 3, timeZone: 'Europe/Lisbon' };
const SAND = { sectors: [{ from: 290, to: 350 }], grainDiameter: 0.25, clayPercent: 1 };
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

/** Sixteen days of the demo's made-up weather, with all that a provider sends but members. */
function forecast(): Forecast {
	const weather = generator({
		timeZone: SITE.timeZone,
		anchor: '2026-05-04',
		seed: 1,
		climate: 'seasonal'
	});
	const time = Array.from({ length: DAYS * 24 + 1 }, (_, i) => START + i * HOUR);
	const hours = time.map((t) => weather.hour(t, SITE, NO_NUDGE));
	const series = (name: keyof HourWeather): (number | null)[] => hours.map((hour) => hour[name]);
	return {
		issuedAt: START,
		hourly: {
			time,
			temperature: series('temperature'),
			dewPoint: series('dewPoint'),
			pressure: series('seaLevelPressure'),
			windSpeed: series('windSpeed'),
			windGust: series('windGust'),
			windDirection: series('windDirection'),
			precipitation: series('precipitation'),
			precipitationProbability: series('precipitationProbability'),
			cloudCover: series('cloudCover'),
			ghi: series('ghi'),
			dni: series('dni'),
			dhi: series('dhi')
		}
	};
}

function median(work: () => unknown): number {
	for (let i = 0; i < WARM_UP; i++) work();
	const times = Array.from({ length: RUNS }, () => {
		const from = performance.now();
		work();
		return performance.now() - from;
	});
	return times.sort((a, b) => a - b)[RUNS >> 1];
}

const sixteenDays = forecast();
const weather = slotWeather({ site: SITE, forecast: sixteenDays, looseSand: SAND });
const conditions = faceConditions(weather, SITE, FACE, 'open');
const slots = weather.grid.count;

let sink = 0;
const bareExp = median(() => {
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
process.stdout.write(`${DAYS} days, ${slots} slots, medians of ${RUNS}\n`);
process.stdout.write(`${line(`bare exp, ${slots} calls`, bareExp)}\n`);
for (const [words, work] of parts) process.stdout.write(`${line(words, median(work))}\n`);
if (!Number.isFinite(sink)) process.exitCode = 1;
