import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	faceConditions,
	memberConditions
} from '../../../../../src/lib/engine/outlook/face/conditions';
import { errorSeries } from '../../../../../src/lib/engine/outlook/hours/errors';
import { stepHours } from '../../../../../src/lib/engine/outlook/hours/stepHours';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import { workableSlots } from '../../../../../src/lib/engine/outlook/hours/workable';
import { stepChances } from '../../../../../src/lib/engine/outlook/members/chances';
import { faceErrors, yardErrors } from '../../../../../src/lib/engine/outlook/members/memberErrors';
import { slotWeather } from '../../../../../src/lib/engine/outlook/weather/weather';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import { STATES } from '../../../../../src/lib/engine/vocabulary';
import { days, ensembleOf } from '../changingWeather';
import { COAT, forecastOf, SITE, slotAt, TOPSIDES } from '../flatWeather';

const SHUT = STATES.indexOf('shut');
const RUNS = { numRuns: 40 };

const STEP: Step = {
	...COAT,
	durationMinutes: 120,
	workHours: [{ days: [1, 2, 3, 4, 5], from: '07:30', to: '18:30' }],
	limits: {
		airTemperature: { min: 8, max: 28 },
		surfaceTemperature: { min: 7, max: 40 },
		relativeHumidity: { max: 85 },
		spread: { min: 3, untilDry: true },
		wind: { max: 7 },
		gust: { max: 10 },
		rainFree: true,
		drySurface: true,
		daylight: true,
		curing: { min: 5 }
	},
	times: {
		touchDry: [
			[10, 300],
			[20, 180]
		],
		keepDry: 240,
		overcoatMin: [
			[10, 900],
			[20, 480]
		]
	}
};

const chancesIn = (forecast: ReturnType<typeof ensembleOf>, step = STEP) => {
	const yard = yardWeather({ site: SITE, forecast, looseSand: null });
	return stepChances(step, memberConditions(yard, TOPSIDES, 'open'), SITE, 8);
};

describe('workable slots of a member', () => {
	test('are the slots that a full judgement does not shut, whatever the weather', () => {
		fc.assert(
			fc.property(days, (it) => {
				const weather = slotWeather({
					site: SITE,
					forecast: ensembleOf(it, []),
					looseSand: null
				});
				const conditions = faceConditions(weather, SITE, TOPSIDES, 'open');
				// One slot long: no run is too short.
				const step = { ...STEP, durationMinutes: 15 };
				const { state } = stepHours(step, conditions, SITE);
				const workable = workableSlots(step, conditions, SITE, errorSeries(weather));
				expect([...workable]).toEqual([...state].map((s) => (s === SHUT ? 0 : 1)));
			}),
			{ numRuns: 120 }
		);
	});

	test('a silent drying time leaves none', () => {
		const weather = slotWeather({ site: SITE, forecast: forecastOf(), looseSand: null });
		const conditions = faceConditions(weather, SITE, TOPSIDES, 'open');
		const silent = { ...STEP, times: {} };
		expect(workableSlots(silent, conditions, SITE, errorSeries(weather))).not.toContain(1);
	});
});

describe('chances', () => {
	test('another member changes no chance by more than one in all', () => {
		fc.assert(
			fc.property(
				days,
				fc.array(days, { minLength: 1, maxLength: 4 }),
				days,
				(it, members, more) => {
					const few = chancesIn(ensembleOf(it, members));
					const many = chancesIn(ensembleOf(it, [...members, more]));
					const n = many.members;
					for (const name of ['slots', 'starts'] as const) {
						many[name].forEach((count, i) => {
							expect(Math.abs(count / n - few[name][i] / (n - 1))).toBeLessThanOrEqual(
								1 / n + 1e-12
							);
						});
					}
				}
			),
			RUNS
		);
	});

	test('the order of members changes nothing', () => {
		fc.assert(
			fc.property(days, fc.array(days, { minLength: 2, maxLength: 4 }), (it, members) => {
				const forwards = chancesIn(ensembleOf(it, members));
				const backwards = chancesIn(ensembleOf(it, [...members].reverse()));
				expect(backwards.slots).toEqual(forwards.slots);
				expect(backwards.starts).toEqual(forwards.starts);
			}),
			RUNS
		);
	});

	test('a start counts where the step can go on to its end, a slot where it lies in such a run', () => {
		const rain = (from: number, to: number) => (hour: number) =>
			hour > from && hour <= to ? 2 : 0;
		const dry = {
			...forecastOf(),
			members: [
				{},
				{ precipitation: forecastOf({ precipitation: rain(34, 36) }).hourly.precipitation }
			]
		};
		const step: Step = {
			...COAT,
			durationMinutes: 120,
			limits: { rainFree: true },
			times: { touchDry: 60 }
		};
		const yard = yardWeather({ site: SITE, forecast: dry, looseSand: null });
		const { slots, starts, members } = stepChances(
			step,
			memberConditions(yard, TOPSIDES, 'open'),
			SITE,
			8
		);
		expect(members).toBe(2);
		// Two hours' work and an hour's drying before the rain of 34:00.
		expect(starts[slotAt(31)]).toBe(2);
		expect(starts[slotAt(31.5)]).toBe(1);
		expect(slots[slotAt(32.5)]).toBe(2);
		expect(slots[slotAt(33.5)]).toBe(1);
	});

	test('a missing value in a member counts as not workable', () => {
		const gap = forecastOf().hourly.temperature?.map((value, i) => (i === 36 ? null : value));
		const forecast = { ...forecastOf(), members: [{}, { temperature: gap }] };
		const step: Step = { ...COAT, limits: { airTemperature: { min: 5 } } };
		const yard = yardWeather({ site: SITE, forecast, looseSand: null });
		const { slots } = stepChances(step, memberConditions(yard, TOPSIDES, 'open'), SITE, 4);
		expect(slots[slotAt(30)]).toBe(2);
		expect(slots[slotAt(36)]).toBe(1);
	});
});

describe('members in place of usual errors', () => {
	const spreadOf = (offsets: readonly number[]) => {
		const forecast = forecastOf({ temperature: 18 });
		return yardWeather({
			site: SITE,
			forecast: {
				...forecast,
				members: offsets.map((off) => ({
					temperature: forecast.hourly.temperature?.map(() => 18 + off)
				}))
			},
			looseSand: null
		});
	};

	test('from five members on it is their sample standard deviation', () => {
		const yard = spreadOf([-4, -2, 0, 2, 4]);
		// Σ(x − x̄)²/(n − 1) = 40/4
		expect(yardErrors(yard).airTemperature[40]).toBeCloseTo(Math.sqrt(10), 10);
	});

	test('of four it is the usual error', () => {
		expect(yardErrors(spreadOf([-4, -2, 2, 4])).airTemperature[40]).toBe(1.5);
	});

	test('never under half the usual error, given or by default', () => {
		const yard = spreadOf([0, 0, 0, 0, 0.1]);
		expect(yardErrors(yard).airTemperature[40]).toBe(0.75);
		expect(yardErrors(yard, { airTemperature: [4, 4, 4] }).airTemperature[40]).toBe(2);
	});

	test('the surface’s is that of the members’ faces', () => {
		const yard = spreadOf([-4, -2, 0, 2, 4]);
		const members = memberConditions(yard, TOPSIDES, 'shed').map(([side]) => side);
		const { surfaceTemperature } = faceErrors(yardErrors(yard), members);
		const values = members.map((member) => member.surfaceShaded[60]);
		const mean = values.reduce((a, b) => a + b) / 5;
		const variance = values.reduce((sum, v) => sum + (v - mean) ** 2, 0) / 4;
		expect(surfaceTemperature[60]).toBeCloseTo(Math.sqrt(variance), 9);
	});
});

describe('the hours of a member', () => {
	test('are its own, and the forecast’s where it has none', () => {
		const forecast = forecastOf({ windSpeed: 3, windGust: 6 });
		const yard = yardWeather({
			site: SITE,
			forecast: {
				...forecast,
				members: [
					{
						windSpeed: forecast.hourly.windSpeed?.map(() => 5),
						windGust: forecast.hourly.windGust?.map(() => null)
					}
				]
			},
			looseSand: null
		});
		const [member] = yard.members;
		expect(member.windSpeed[10]).toBe(5);
		expect(member.windGust[10]).toBe(6);
		expect(member.airTemperature).toEqual(yard.weather.airTemperature);
	});

	test('a humidity of its own stands for the forecast’s dew point', () => {
		const forecast = forecastOf({ dewPoint: 8 });
		const yard = yardWeather({
			site: SITE,
			forecast: {
				...forecast,
				members: [{ relativeHumidity: forecast.hourly.time.map(() => 100) }]
			},
			looseSand: null
		});
		expect(yard.members[0].dewPoint[10]).toBeCloseTo(yard.weather.airTemperature[10], 6);
	});

	test('quarter-hour steps keep within 0.3 K root mean square of five-minute ones', () => {
		fc.assert(
			fc.property(days, (it) => {
				const forecast = ensembleOf(it, [it]);
				const yard = yardWeather({ site: SITE, forecast, looseSand: null });
				const [[quick]] = memberConditions(yard, TOPSIDES, 'open');
				const [slow] = faceConditions(yard.weather, SITE, TOPSIDES, 'open');
				const off = slow.surfaceShaded.map((value, i) => (value - quick.surfaceShaded[i]) ** 2);
				expect(Math.sqrt(off.reduce((a, b) => a + b) / off.length)).toBeLessThan(0.3);
			}),
			RUNS
		);
	});
});
