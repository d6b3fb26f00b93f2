import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Limits } from '../../../../src/lib/engine/coating/limits';
import { faceConditions } from '../../../../src/lib/engine/outlook/face/conditions';
import type { Forecast, HourlyVariable } from '../../../../src/lib/engine/outlook/weather/forecast';
import { slotReading } from '../../../../src/lib/engine/outlook/hours/reading';
import { stepHours } from '../../../../src/lib/engine/outlook/hours/stepHours';
import { flagBit } from '../../../../src/lib/engine/outlook/weather/flags';
import { slotWeather } from '../../../../src/lib/engine/outlook/weather/weather';
import { windowMinima } from '../../../../src/lib/engine/outlook/hours/windows';
import { LIMITERS, STATES } from '../../../../src/lib/engine/vocabulary';
import { COAT, forecastOf, HOUR, SITE, START, TOPSIDES } from './flatWeather';

const SHUT = STATES.indexOf('shut');
const RUNS = { numRuns: 60 };

/** A forecast of three days with weather of every kind in it, reproducible from its seed. */
const forecasts = fc
	.record({
		warmth: fc.double({ min: -4, max: 28, noNaN: true }),
		swing: fc.double({ min: 0, max: 9, noNaN: true }),
		dryness: fc.double({ min: 0.2, max: 12, noNaN: true }),
		wind: fc.double({ min: 0, max: 11, noNaN: true }),
		cloud: fc.integer({ min: 0, max: 100 }),
		rainAt: fc.integer({ min: 0, max: 90 }),
		missingAt: fc.option(fc.integer({ min: 1, max: 70 }))
	})
	.map((it): Forecast =>
		forecastOf(
			{
				temperature: (h) => it.warmth + it.swing * Math.sin(((h - 9) / 24) * 2 * Math.PI),
				dewPoint: (h) => it.warmth - it.dryness + 0.5 * Math.sin(h),
				windSpeed: (h) => it.wind * (0.6 + 0.4 * Math.sin((h / 24) * 2 * Math.PI)),
				windGust: (h) => 1.6 * it.wind * (0.6 + 0.4 * Math.sin((h / 24) * 2 * Math.PI)),
				cloudCover: it.cloud,
				precipitation: (h) => (Math.abs(h - it.rainAt) < 2 ? 0.6 : 0),
				...(it.missingAt === null
					? {}
					: { dewPoint: (h: number) => (h === it.missingAt ? null : it.warmth - it.dryness) })
			},
			73
		)
	);

const LIMITS: Limits = {
	airTemperature: { min: 8, max: 28 },
	surfaceTemperature: { min: 7, max: 35 },
	relativeHumidity: { max: 85 },
	spread: { min: 3 },
	wind: { max: 7 },
	gust: { max: 10 },
	rainFree: true,
	drySurface: true,
	daylight: true,
	curing: { min: 5 }
};
const TIMES = {
	touchDry: [[10, 300] as [number, number], [20, 180] as [number, number]],
	overcoatMin: 480
};
const conditionsIn = (forecast: Forecast, site = SITE) =>
	faceConditions(slotWeather({ site, forecast, looseSand: null }), site, TOPSIDES, 'open');
const judged = (forecast: Forecast, limits: Limits) =>
	stepHours({ ...COAT, limits, times: TIMES }, conditionsIn(forecast), SITE);

/** Each limit with a looser one beside it. */
const LOOSER: [string, Limits][] = [
	['airTemperature', { airTemperature: { min: 4, max: 32 } }],
	['surfaceTemperature', { surfaceTemperature: { min: 2, max: 45 } }],
	['relativeHumidity', { relativeHumidity: { max: 95 } }],
	['spread', { spread: { min: 1 } }],
	['wind', { wind: { max: 10 } }],
	['gust', { gust: { max: 15 } }],
	['rainFree', { rainFree: false }],
	['drySurface', { drySurface: false }],
	['daylight', { daylight: false }],
	['curing', { curing: { min: 1 } }]
];

/** Limits that leave little, for what happens when one of them goes. */
const STRICT: Limits = {
	...LIMITS,
	relativeHumidity: { min: 35, max: 85 },
	spread: { min: 3, untilDry: true },
	noDirectSun: true,
	surfaceTrend: 'falling',
	sand: 'none'
};
const SAND = { sectors: [{ from: 0, to: 360 }], grainDiameter: 0.2, clayPercent: 1 };

describe('more room never shuts an hour', () => {
	test.each(LOOSER)(
		'a looser %s keeps every workable slot workable, with no less room',
		(_, looser) => {
			fc.assert(
				fc.property(forecasts, (forecast) => {
					const tight = judged(forecast, LIMITS);
					const loose = judged(forecast, { ...LIMITS, ...looser });
					tight.state.forEach((state, i) => {
						if (state === SHUT) return;
						expect(loose.state[i]).toBeGreaterThanOrEqual(state);
						expect(loose.room[i]).toBeGreaterThanOrEqual(tight.room[i] - 1e-6);
					});
				}),
				RUNS
			);
		}
	);
});

describe('a limit taken away never shuts an hour', () => {
	test.each(Object.keys(STRICT) as (keyof Limits)[])('%s', (name) => {
		fc.assert(
			fc.property(forecasts, (forecast) => {
				const conditions = faceConditions(
					slotWeather({ site: SITE, forecast, looseSand: SAND }),
					SITE,
					TOPSIDES,
					'open'
				);
				const fewer = { ...STRICT, [name]: undefined };
				const hours = (limits: Limits) =>
					stepHours({ ...COAT, limits, times: TIMES }, conditions, SITE);
				const strict = hours(STRICT);
				const loose = hours(fewer);
				strict.state.forEach((state, i) => {
					if (state !== SHUT) expect(loose.state[i]).toBeGreaterThanOrEqual(state);
				});
			}),
			RUNS
		);
	});
});

describe('nothing opens on what is not known', () => {
	test('without a value no hour is workable that was shut with it, but for guesses that are flagged', () => {
		const assumed = flagBit('assumed');
		fc.assert(
			fc.property(
				forecasts,
				fc.constantFrom<HourlyVariable>('temperature', 'dewPoint', 'windSpeed', 'cloudCover'),
				fc.integer({ min: 1, max: 70 }),
				(forecast, variable, hour) => {
					const full = judged(forecast, LIMITS);
					const series = forecast.hourly[variable]?.map((value, i) => (i === hour ? null : value));
					const poorer = { ...forecast, hourly: { ...forecast.hourly, [variable]: series } };
					const conditions = conditionsIn(poorer);
					const { state } = stepHours({ ...COAT, limits: LIMITS, times: TIMES }, conditions, SITE);
					state.forEach((it, i) => {
						if (it === SHUT || conditions[0].flags[i] & assumed) return;
						// The face starts anew after a gap: hours later a hair of its temperature may be left.
						if (full.state[i] === SHUT) expect(full.room[i]).toBeGreaterThan(-0.1);
					});
				}
			),
			RUNS
		);
	});

	test('taking a value away never opens an hour', () => {
		const variables: HourlyVariable[] = [
			'temperature',
			'dewPoint',
			'windSpeed',
			'windGust',
			'precipitation',
			'cloudCover'
		];
		fc.assert(
			fc.property(
				forecasts,
				fc.constantFrom(...variables),
				fc.integer({ min: 1, max: 70 }),
				(forecast, variable, hour) => {
					const full = judged(forecast, LIMITS);
					const series = forecast.hourly[variable]?.map((value, i) => (i === hour ? null : value));
					// A gust that is missing is derived from the mean, which may be kinder than the one stated.
					fc.pre(variable !== 'windGust' || forecast.hourly.windSpeed?.[hour] !== null);
					const poorer = judged(
						{ ...forecast, hourly: { ...forecast.hourly, [variable]: series } },
						LIMITS
					);
					const window = { from: (hour - 1) * 4, to: (hour + 1) * 4 };
					poorer.state.forEach((state, i) => {
						if (variable === 'windGust' || i < window.from || i >= window.to) return;
						if (variable === 'precipitation' && i >= hour * 4) return;
						expect(state).toBe(SHUT);
					});
					expect(full.state.length).toBe(poorer.state.length);
				}
			),
			RUNS
		);
	});

	test('a slot that is workable has a known room, and one without data has none', () => {
		fc.assert(
			fc.property(forecasts, (forecast) => {
				const { state, limiter, room } = judged(forecast, LIMITS);
				state.forEach((it, i) => {
					if (it !== SHUT) expect(room[i]).toBeGreaterThanOrEqual(0);
					if (LIMITERS[limiter[i]] === 'noData') expect(Number.isNaN(room[i])).toBe(true);
				});
			}),
			RUNS
		);
	});
});

describe('the reading and the batten say the same', () => {
	test('state, limiter and room of a reading are those of its slot', () => {
		fc.assert(
			fc.property(forecasts, fc.integer({ min: 0, max: 287 }), (forecast, slot) => {
				const step = { ...COAT, limits: LIMITS, times: TIMES };
				const conditions = conditionsIn(forecast);
				const hours = stepHours(step, conditions, SITE);
				const reading = slotReading(step, conditions, SITE, slot);
				expect(reading.state).toBe(STATES[hours.state[slot]]);
				expect(reading.limiter).toBe(LIMITERS[hours.limiter[slot]]);
				if (!['none', 'hours', 'dark', 'short', 'noData'].includes(reading.limiter)) {
					const least = reading.limits.find(
						({ limiter, scaledRoom }) => limiter === reading.limiter && scaledRoom !== null
					);
					expect(least?.scaledRoom).toBeCloseTo(hours.room[slot], 4);
				}
				const rooms = reading.limits.flatMap(({ scaledRoom }) => scaledRoom ?? []);
				expect(rooms).toEqual([...rooms].sort((a, b) => a - b));
			}),
			RUNS
		);
	});
});

describe('zones', () => {
	test('the same instants are judged alike whatever the zone is called', () => {
		fc.assert(
			fc.property(
				forecasts,
				fc.constantFrom('UTC', 'Asia/Tokyo', 'America/New_York'),
				(forecast, timeZone) => {
					const site = { ...SITE, timeZone };
					const step = { ...COAT, limits: LIMITS, times: TIMES };
					const here = stepHours(step, conditionsIn(forecast), SITE);
					const there = stepHours(step, conditionsIn(forecast, site), site);
					expect(there.state).toEqual(here.state);
					expect(there.limiter).toEqual(here.limiter);
				}
			),
			{ numRuns: 20 }
		);
	});

	test('work hours follow the clock through a change of daylight saving', () => {
		// Lisbon, night of 28 to 29 March 2026.
		const start = Date.UTC(2026, 2, 28) / 1000;
		const forecast = forecastOf({}, 73);
		const moved = {
			issuedAt: forecast.issuedAt + start - START,
			hourly: { ...forecast.hourly, time: forecast.hourly.time.map((t) => t + start - START) }
		};
		const workHours = [{ days: [6, 7], from: '08:00', to: '09:00' }];
		const { stretches } = stepHours(
			{ ...COAT, durationMinutes: 15, workHours },
			conditionsIn(moved),
			SITE
		);
		expect(stretches.map(({ from }) => (from * 900) / HOUR)).toEqual([8, 24 + 7]);
	});
});

describe('sliding windows', () => {
	test('the least of each window is the one a plain search finds', () => {
		fc.assert(
			fc.property(
				fc.array(fc.oneof(fc.double({ min: -5, max: 5, noNaN: true }), fc.constant(NaN)), {
					minLength: 1,
					maxLength: 40
				}),
				fc.integer({ min: 0, max: 2 }),
				fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 40, maxLength: 40 }),
				(list, offset, steps) => {
					const values = Float64Array.from(list);
					let end = 0;
					const ends = Int32Array.from(
						list,
						(_, i) => (end = Math.max(end, i + offset, Math.min(list.length, end + steps[i])))
					);
					const out = new Float64Array(list.length);
					windowMinima(values, offset, ends, out, new Int32Array(list.length));
					for (let i = 0; i < list.length; i++) {
						const window = list.slice(i + offset, Math.min(ends[i], list.length));
						const least = window.some(Number.isNaN) ? NaN : Math.min(...window, Infinity);
						expect(out[i]).toEqual(least);
					}
				}
			)
		);
	});
});
