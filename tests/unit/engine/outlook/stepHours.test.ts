import { describe, expect, test } from 'vitest';
import type { Limits } from '../../../../src/lib/engine/coating/limits';
import type { Times } from '../../../../src/lib/engine/coating/times';
import { runsOf, stepHours } from '../../../../src/lib/engine/outlook/hours/stepHours';
import { LIMITERS, STATES } from '../../../../src/lib/engine/vocabulary';
import {
	COAT,
	conditionsOf,
	forecastOf,
	HOUR,
	SITE,
	slotAt,
	START,
	TOPSIDES,
	type Changes
} from './flatWeather';

const hoursOf = (
	limits: Limits,
	changes: Changes = {},
	times: Times = { touchDry: 60 },
	options: Parameters<typeof conditionsOf>[1] = {}
) => stepHours({ ...COAT, limits, times }, conditionsOf(changes, options), SITE);

/** State and limiter at an hour. */
const at = (hours: ReturnType<typeof hoursOf>, hour: number): string =>
	`${STATES[hours.state[slotAt(hour)]]} ${LIMITERS[hours.limiter[slotAt(hour)]]}`;

describe('limits', () => {
	const CASES: [string, Limits, Changes, string][] = [
		['air too cold', { airTemperature: { min: 20 } }, {}, 'shut cold'],
		['air too warm', { airTemperature: { max: 15 } }, {}, 'shut hot'],
		['air near its least', { airTemperature: { min: 17 } }, {}, 'tight cold'],
		['air equal to its least is inside', { airTemperature: { min: 18 } }, {}, 'tight cold'],
		['air too damp', { relativeHumidity: { max: 40 } }, {}, 'shut damp'],
		['air too dry', { relativeHumidity: { min: 70 } }, {}, 'shut dry'],
		['mean wind over its most', { wind: { max: 1 } }, {}, 'shut wind'],
		['gust over its most', { gust: { max: 2 } }, {}, 'shut wind'],
		['surface under its least', { surfaceTemperature: { min: 40 } }, {}, 'shut cold'],
		['rain in the hour', { rainFree: true }, { precipitation: 0.1 }, 'shut rain'],
		[
			'rain under a tenth of a millimetre',
			{ rainFree: true },
			{ precipitation: (hour) => (hour === 20 ? 0.09 : 0) },
			'open rain'
		],
		['an even chance of rain', { rainFree: true }, { precipitationProbability: 50 }, 'shut rain'],
		['a chance of a third', { rainFree: true }, { precipitationProbability: 33 }, 'tight rain'],
		['a small chance', { rainFree: true }, { precipitationProbability: 20 }, 'open rain'],
		['spread under its least', { spread: { min: 15 } }, {}, 'shut dew'],
		[
			'a missing value of a limit',
			{ gust: { max: 20 } },
			{ windSpeed: () => null, windGust: () => null },
			'shut noData'
		],
		[
			'a missing value of no limit',
			{ airTemperature: { min: 5 } },
			{ windSpeed: () => null, windGust: () => null, windDirection: () => null },
			'open cold'
		]
	];
	test.each(CASES)('%s: %j', (_, limits, changes, expected) => {
		expect(at(hoursOf(limits, changes), 36)).toBe(expected);
	});

	test('a step without limits is open through the forecast', () => {
		expect(at(hoursOf({}, {}, {}), 36)).toBe('open none');
	});

	test('a sheltered face has neither rain nor the open yard’s wind', () => {
		const limits: Limits = { rainFree: true, gust: { max: 5 } };
		const changes = { precipitation: 3, windSpeed: 6, windGust: 10 };
		expect(at(hoursOf(limits, changes), 36)).toContain('shut');
		expect(at(hoursOf(limits, changes, { touchDry: 60 }, { shelter: 'tent' }), 36)).toContain(
			'open'
		);
	});

	test('direct sun shuts a face it falls on and not the one behind', () => {
		const changes = { cloudCover: 0 };
		const limits: Limits = { noDirectSun: true };
		const morning = 33;
		expect(at(hoursOf(limits, changes), morning)).toBe('shut sun');
		const west = { face: { ...TOPSIDES, azimuth: 270 } };
		expect(at(hoursOf(limits, changes, {}, west), morning)).toContain('open');
	});

	test('a film on the face shuts it as wet, and below freezing as frost', () => {
		const wet = hoursOf({ drySurface: true }, { precipitation: 2 });
		expect(at(wet, 36)).toBe('shut wet');
		const frozen = hoursOf(
			{ drySurface: true },
			{ temperature: -5, dewPoint: -5.2, cloudCover: 0, windSpeed: 0.5 }
		);
		expect(at(frozen, 28)).toBe('shut frost');
	});

	test('a bare timber face may only be coated while it cools', () => {
		const hours = hoursOf(
			{ surfaceTrend: 'falling' },
			{ temperature: (hour) => 15 + 6 * Math.sin((hour / 24) * 2 * Math.PI), cloudCover: 100 }
		);
		expect(at(hours, 26)).toBe('shut rising');
		expect(at(hours, 36)).toContain('open');
	});

	test('of several faces the worse binds', () => {
		const cold = conditionsOf({}, { face: TOPSIDES, shelter: 'open' });
		const hot = conditionsOf(
			{},
			{
				face: TOPSIDES,
				shelter: { wind: 1, sun: 1, sky: 1, rain: false, dust: false, heat: 12, vapour: 0 }
			}
		);
		const limits: Limits = { airTemperature: { min: 10, max: 25 } };
		const step = { ...COAT, limits, times: {} };
		// Two weathers of one forecast would not share a grid object, so both are given as faces of one.
		const both = [...cold, { ...hot[0], weather: cold[0].weather }];
		expect(STATES[stepHours(step, cold, SITE).state[slotAt(36)]]).toBe('open');
		expect(LIMITERS[stepHours(step, both, SITE).limiter[slotAt(36)]]).toBe('hot');
	});
});

describe('work hours and daylight', () => {
	const workHours = [{ days: [1, 2, 3, 4, 5, 6, 7], from: '08:00', to: '17:00' }];

	test('hours are judged in the yard’s zone over the whole slot', () => {
		const hours = stepHours({ ...COAT, workHours }, conditionsOf(), SITE);
		// 08:00 in Lisbon is 07:00 UTC in May.
		expect(at(hours, 30.75)).toBe('shut hours');
		expect(at(hours, 31)).toBe('open none');
		expect(at(hours, 39.75)).toBe('open none');
		expect(at(hours, 40)).toBe('shut hours');
	});

	test('no entry means never, and no list means always', () => {
		expect(stepHours({ ...COAT, workHours: [] }, conditionsOf(), SITE).best).toBeNull();
		expect(stepHours(COAT, conditionsOf(), SITE).best).not.toBeNull();
	});

	test('an entry past midnight belongs to the day it starts on', () => {
		// 4 May 2026 is a Monday.
		const night = [{ days: [1], from: '22:00', to: '02:00' }];
		const hours = stepHours({ ...COAT, workHours: night }, conditionsOf(), SITE);
		expect(at(hours, 21)).toBe('open none');
		expect(at(hours, 24.75)).toBe('open none');
		expect(at(hours, 25)).toBe('shut hours');
		expect(at(hours, 45)).toBe('shut hours');
	});

	test('daylight is asked for at both ends of a slot', () => {
		const hours = hoursOf({ daylight: true });
		expect(at(hours, 26)).toBe('shut dark');
		expect(at(hours, 36)).toContain('open');
	});

	test('hours is named before what the weather breaks', () => {
		const step = { ...COAT, workHours, limits: { wind: { max: 0.1 } } };
		expect(at(stepHours(step, conditionsOf(), SITE), 26)).toBe('shut hours');
	});
});

describe('the wet and set phases', () => {
	test('rain before the coat is dry shuts the hour it would be laid in', () => {
		const rainAt = (hour: number): number => (hour === 41 ? 2 : 0);
		const hours = hoursOf({ rainFree: true }, { precipitation: rainAt }, { keepDry: 240 });
		expect(at(hours, 38)).toBe('shut rain');
		// Laid by 35:45 it is through at 39:45, before the rain of the hour from 40.
		expect(at(hours, 35.5)).not.toContain('shut');
	});

	test('dew before touch dry shuts, and with "until dry" so does less than the least spread', () => {
		const night = (hour: number): number => (hour % 24 >= 18 || hour % 24 < 6 ? 8.5 : 18);
		const limits: Limits = { spread: { min: 3 } };
		const wet = hoursOf(limits, { temperature: night, cloudCover: 0 }, { touchDry: 600 });
		expect(at(wet, 40)).toBe('shut dew');
		const untilDry = hoursOf(
			{ spread: { min: 3, untilDry: true } },
			{ temperature: (h) => (h % 24 >= 18 ? 9.5 : 18), cloudCover: 100 },
			{ touchDry: 240 }
		);
		const once = hoursOf(
			limits,
			{ temperature: (h) => (h % 24 >= 18 ? 9.5 : 18), cloudCover: 100 },
			{ touchDry: 240 }
		);
		expect(at(untilDry, 40)).toBe('shut dew');
		expect(at(once, 40)).not.toBe('shut dew');
	});

	test('a surface under the least curing temperature before overcoat min shuts', () => {
		const changes = { temperature: (hour: number) => (hour >= 50 ? 4 : 18), dewPoint: 0 };
		const times: Times = { touchDry: 60, overcoatMin: 900 };
		const hours = hoursOf({ curing: { min: 8 } }, changes, times);
		expect(at(hours, 44)).toBe('shut cold');
		expect(at(hours, 30)).not.toContain('shut');
	});

	test('no drying time on the sheet of a rain-free coat shuts every hour, and not of a wash', () => {
		expect(at(hoursOf({ rainFree: true }, {}, {}), 36)).toBe('shut noData');
		const wash = { ...COAT, kind: 'wash' as const, limits: { rainFree: true } };
		expect(at(stepHours(wash, conditionsOf(), SITE), 36)).toContain('open');
	});

	test('a tin that sets no drying limit does not shut', () => {
		expect(at(hoursOf({ rainFree: true }, {}, { touchDry: null }), 36)).toContain('open');
	});

	test('a wet phase past the end of the forecast is shut, a set phase keeps its state with a flag', () => {
		const wet = hoursOf({ rainFree: true }, {}, { touchDry: 600 });
		expect(at(wet, 88)).toBe('shut noData');
		const set = hoursOf({ rainFree: true }, {}, { touchDry: 60, overcoatMin: 1200 });
		expect(at(set, 88)).toContain('open');
		expect(set.flags).toContain('setPastEnd');
	});

	test('a limit already broken is named before the end of the forecast', () => {
		const hours = hoursOf({ rainFree: true, wind: { max: 0.1 } }, {}, { touchDry: 600 });
		expect(at(hours, 88)).toBe('shut wind');
	});
});

describe('stretches', () => {
	const gap = (from: number, to: number) => (hour: number) => (hour > from && hour <= to ? 1 : 9);

	test('a run shorter than the step is shut as short', () => {
		const step = { ...COAT, durationMinutes: 240, limits: { gust: { max: 5 } } };
		const hours = stepHours(step, conditionsOf({ windGust: gap(30, 33) }), SITE);
		expect(at(hours, 31)).toBe('shut short');
		expect(hours.stretches).toHaveLength(0);
	});

	test('a stretch runs from the first start to brush down and knows its last start', () => {
		const step = { ...COAT, durationMinutes: 100, limits: { gust: { max: 5 } } };
		const { stretches, durationSlots } = stepHours(
			step,
			conditionsOf({ windGust: gap(30, 36) }),
			SITE
		);
		expect(durationSlots).toBe(7);
		expect(stretches).toEqual([
			expect.objectContaining({ from: slotAt(30), to: slotAt(36), lastStart: slotAt(36) - 7 })
		]);
	});

	test('the best start has the most room over all its slots', () => {
		const gusts = (hour: number): number => Math.abs(hour - 40) * 0.5;
		const step = { ...COAT, durationMinutes: 120, limits: { gust: { max: 8 } } };
		const { best } = stepHours(step, conditionsOf({ windGust: gusts, windSpeed: 0 }), SITE);
		expect(best).not.toBeNull();
		expect(Math.abs((best?.start ?? 0) - slotAt(39))).toBeLessThanOrEqual(4);
		expect(best?.limiter).toBe('wind');
	});

	test('no start is offered before now', () => {
		const now = START + 50 * HOUR;
		const { stretches } = stepHours(COAT, conditionsOf(), SITE, { from: now });
		expect(stretches[0]?.from).toBe(slotAt(50));
	});

	test('runs cover the slots asked for, without gaps', () => {
		const step = { ...COAT, limits: { gust: { max: 5 } } };
		const runs = runsOf(stepHours(step, conditionsOf({ windGust: gap(30, 36) }), SITE), 40, 200);
		expect(runs[0]?.from).toBe(40);
		expect(runs.at(-1)?.to).toBe(200);
		runs.slice(1).forEach((run, i) => expect(run.from).toBe(runs[i].to));
	});
});

describe('usual errors', () => {
	test('a far lead needs more room than a near one', () => {
		const hours = hoursOf({ gust: { max: 5.2 } }, { windGust: 2.5, windSpeed: 2 });
		expect(at(hours, 12)).toContain('open');
		expect(at(hours, 90)).toContain('tight');
	});

	test('a derived gust has twice the error', () => {
		const stated = hoursOf({ gust: { max: 6 } }, { windGust: 3, windSpeed: 2 });
		const derived = hoursOf({ gust: { max: 6 } }, { windGust: undefined, windSpeed: 2 });
		expect(stated.room[slotAt(12)] / derived.room[slotAt(12)]).toBeCloseTo(2, 5);
	});

	test('errors of a request replace the defaults', () => {
		const step = { ...COAT, limits: { airTemperature: { min: 15 } } };
		const wide = stepHours(step, conditionsOf(), SITE, {
			usualErrors: { airTemperature: [6, 6, 6] }
		});
		expect(wide.room[slotAt(12)]).toBeCloseTo(0.5, 5);
	});

	test('a slot of a coarse stretch is at best tight', () => {
		const forecast = forecastOf({}, 121);
		const kept = forecast.hourly.time.map((_, i) => i).filter((i) => i < 60 || i % 6 === 0);
		const hourly = Object.fromEntries(
			Object.entries(forecast.hourly).map(([name, values]) => [name, kept.map((i) => values[i])])
		) as typeof forecast.hourly;
		const conditions = conditionsOf({}, { forecast: { ...forecast, hourly } });
		const hours = stepHours({ ...COAT, limits: { airTemperature: { min: 5 } } }, conditions, SITE);
		expect(STATES[hours.state[slotAt(50)]]).toBe('open');
		expect(STATES[hours.state[slotAt(80)]]).toBe('tight');
	});
});

test('a day off shuts its hours, by the word of hours', () => {
	const closed = [{ from: START + 24 * HOUR, to: START + 48 * HOUR }];
	const step = { ...COAT, limits: {}, times: { touchDry: 60 } };
	const free = stepHours(step, conditionsOf(), SITE);
	const shut = stepHours({ ...step, closed }, conditionsOf(), SITE);
	expect(at(free, 30)).toMatch(/^open/);
	expect(at(shut, 30)).toBe('shut hours');
	expect(shut.state.subarray(0, slotAt(23))).toEqual(free.state.subarray(0, slotAt(23)));
});

describe('an hour of missing rain', () => {
	test('may have been wet: the dry hours beside it are no roomier than beside rain', () => {
		const step = { ...COAT, limits: { rainFree: true }, times: { touchDry: 15 } };
		const roomWith = (amount: number | null) =>
			stepHours(step, conditionsOf({ precipitation: (h) => (h === 40 ? amount : 0) }), SITE).room;
		const wet = roomWith(2);
		const missing = roomWith(null);
		for (const slot of [slotAt(37), slotAt(38), slotAt(45)])
			expect(missing[slot]).toBeLessThanOrEqual(wet[slot]);
		expect(missing[slotAt(38)]).toBeLessThan(1);
	});
});

describe('a part with two sides', () => {
	test('has no inside to warm it', () => {
		const face = { ...TOPSIDES, azimuth: 0, bothSides: true };
		const cold = { temperature: (h: number) => (h < 24 ? 22 : 6), dewPoint: 0 };
		const [outside] = conditionsOf(cold, { face });
		const [stated] = conditionsOf(cold, { face: { ...face, inside: { u: 0 } } });
		const [hull] = conditionsOf(cold, { face: { ...face, bothSides: false } });
		expect(outside.surfaceShaded).toEqual(stated.surfaceShaded);
		expect(hull.surfaceShaded[slotAt(30)]).toBeGreaterThan(outside.surfaceShaded[slotAt(30)] + 1);
	});
});
