import { describe, expect, test } from 'vitest';
import { jobOutlook } from '../../../../../src/lib/engine/outlook/job/jobOutlook';
import { jobRemedies } from '../../../../../src/lib/engine/outlook/job/jobRemedies';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import { SHELTERS, type ShelterName } from '../../../../../src/lib/engine/vocabulary';
import { COAT, forecastOf, SITE, START, type Changes } from '../flatWeather';
import { at, FACE, hoursOf, on } from './jobs';

const remediesIn = (
	step: Partial<Step>,
	changes: Changes,
	shelters: readonly ShelterName[] = SHELTERS
) => {
	const yard = yardWeather({ site: SITE, forecast: forecastOf(changes), looseSand: null });
	const job = { steps: [on({ ...COAT, ...step })], launch: {} };
	const outlook = jobOutlook(yard, job, { from: START });
	return jobRemedies(yard, outlook, { shelters, from: START });
};

describe('what would open a shut run', () => {
	const rain = { precipitation: (h: number) => (h > 30 && h <= 34 ? 2 : 0) };
	const dry: Partial<Step> = { limits: { rainFree: true }, times: { touchDry: 60 } };

	test('rain: waiting, and what keeps it off; a wind-break gains nothing and says so', () => {
		const remedies = remediesIn(dry, rain).filter(({ limiter }) => limiter === 'rain');
		const [wait] = remedies;
		expect(wait).toMatchObject({ code: 'wait', step: 0 });
		expect(hoursOf(wait.opensFrom)).toBeGreaterThanOrEqual(34);
		const gains = Object.fromEntries(
			remedies.flatMap(({ shelter, gainMinutes }) =>
				shelter === null ? [] : [[shelter, gainMinutes]]
			)
		);
		expect(gains.lee).toBe(0);
		const whole = (remedies[0].to - remedies[0].from) / 60;
		expect(gains).toMatchObject({ tarp: whole, tent: whole, heatedTent: whole, shed: whole });
	});

	test('in order of trouble: wait, another method, then shelters from the lightest', () => {
		const windy = remediesIn(
			{ method: 'airSpray', limits: { wind: { max: 4.5 }, gust: { max: 6 } } },
			{ windSpeed: 8, windGust: 9 }
		);
		const { from } = windy[0];
		expect(
			windy
				.filter((remedy) => remedy.from === from)
				.map(({ code, shelter, method }) => shelter ?? method ?? code)
		).toEqual([
			'wait',
			'brush',
			'roller',
			'rollAndTip',
			'hvlp',
			'airless',
			'lee',
			'tarp',
			'tent',
			'heatedTent',
			'shed'
		]);
	});

	test('another method is told only where wind shuts, and rests on the usual limits', () => {
		const roller = remediesIn(
			{ method: 'airSpray', limits: { wind: { max: 4.5 }, gust: { max: 6 } } },
			{ windSpeed: 5, windGust: 8.5 }
		).find(({ method }) => method === 'roller');
		expect(roller).toMatchObject({ code: 'method', isAssumed: true });
		expect(roller?.gainMinutes).toBeGreaterThan(0);
		const cold = remediesIn({ method: 'airSpray', limits: { airTemperature: { min: 30 } } }, {});
		expect(cold.map(({ code }) => code)).not.toContain('method');
	});

	test('a wet face is waited dry', () => {
		const wet = remediesIn({ limits: { drySurface: true } }, rain).filter(
			({ limiter }) => limiter === 'wet'
		);
		expect(wet[0].code).toBe('dry');
		expect(wet[0].opensFrom).toBeGreaterThanOrEqual(wet[0].to);
		expect(wet[0].gainMinutes).toBeGreaterThan(0);
	});

	test('cold: a heated tent warms the air at the face, a tarp does not', () => {
		const remedies = remediesIn({ limits: { airTemperature: { min: 20 } } }, { temperature: 15 });
		const gain = (name: string): number | undefined =>
			remedies.find(({ shelter }) => shelter === name)?.gainMinutes;
		expect(gain('tarp')).toBe(0);
		expect(gain('heatedTent')).toBeGreaterThan(0);
	});

	test('only shelters the yard has, and not the one that stands', () => {
		const remedies = remediesIn(dry, rain, ['open', 'tarp']);
		expect(new Set(remedies.map(({ shelter }) => shelter))).toEqual(new Set([null, 'tarp']));
	});

	test('hours, dark and what is not known have no remedy', () => {
		const limited: Partial<Step> = {
			limits: { daylight: true },
			workHours: [{ days: [1], from: '09:00', to: '17:00' }]
		};
		expect(remediesIn(limited, { temperature: (h) => (h === 40 ? null : 18) })).toEqual([]);
	});

	test('a step that is logged asks for none', () => {
		const yard = yardWeather({ site: SITE, forecast: forecastOf(rain), looseSand: null });
		const step = on({ ...COAT, ...dry }, { startAt: at(31), finishedAt: at(32) });
		const outlook = jobOutlook(yard, { steps: [step], launch: {} }, { from: START });
		expect(jobRemedies(yard, outlook, { shelters: SHELTERS, from: START })).toEqual([]);
		expect(outlook.steps[0].faces[0].id).toBe(FACE.id);
	});
});

describe('a long list is bounded', () => {
	// A shower every five hours, for four days.
	const forecast = forecastOf({ precipitation: (h) => (h % 5 === 0 ? 1 : 0) });
	const yard = yardWeather({ site: SITE, forecast, looseSand: null });
	const dry: Partial<Step> = { limits: { rainFree: true }, times: { touchDry: 30 } };
	const remediesOf = (count: number) => {
		const steps = Array.from({ length: count }, () => on({ ...COAT, ...dry }));
		const outlook = jobOutlook(yard, { steps, launch: {} }, { from: START });
		return jobRemedies(yard, outlook, { shelters: ['tarp'], from: START });
	};
	const runsOfStep = (remedies: ReturnType<typeof remediesOf>, step: number): number =>
		new Set(remedies.filter((it) => it.step === step).map(({ from }) => from)).size;

	test('to the first runs of each step, the steps sharing evenly', () => {
		const alone = remediesOf(1);
		expect(runsOfStep(alone, 0)).toBeGreaterThan(4);
		const many = remediesOf(24);
		for (let step = 0; step < 24; step++) {
			expect(runsOfStep(many, step)).toBe(4);
			expect(many.filter((it) => it.step === step).map(({ from }) => from)).toEqual(
				alone.slice(0, 8).map(({ from }) => from)
			);
		}
	});
});
