import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { chanceScore } from '../../../../src/lib/engine/scoring/chances';
import { biasCorrection, ownUsualErrors } from '../../../../src/lib/engine/scoring/correction';
import {
	forecastErrors,
	leadBand,
	type ForecastPair
} from '../../../../src/lib/engine/scoring/errors';

const HOUR = 3600;
const pair = (forecast: number, measured: number, leadHours = 10): ForecastPair => ({
	quantity: 'airTemperature',
	lead: leadHours * HOUR,
	forecast,
	measured
});

describe('errors of forecasts', () => {
	test('bias, mean absolute and root mean square of a handful', () => {
		const [day] = forecastErrors([pair(20, 18), pair(15, 16), pair(10, 6)]);
		expect(day).toMatchObject({ quantity: 'airTemperature', lead: 24, count: 3 });
		expect(day.bias).toBeCloseTo(5 / 3, 12);
		expect(day.meanAbsolute).toBeCloseTo(7 / 3, 12);
		expect(day.rootMeanSquare).toBeCloseTo(Math.sqrt(7), 12);
	});

	test('each lead in its band, a border in the shorter, beyond three days in none', () => {
		expect([0, 24, 24.1, 48, 72, 73].map((hours) => leadBand(hours * HOUR))).toEqual([
			24,
			24,
			48,
			48,
			72,
			null
		]);
	});

	test('what was never measured is left out', () => {
		expect(forecastErrors([])).toEqual([]);
		expect(forecastErrors([pair(1, 1, 100)])).toEqual([]);
	});

	test('squares are the bias’s and the variance’s, whatever the errors', () => {
		fc.assert(
			fc.property(
				fc.array(fc.double({ min: -20, max: 20, noNaN: true }), { minLength: 1, maxLength: 40 }),
				(off) => {
					const [{ bias, rootMeanSquare, meanAbsolute }] = forecastErrors(
						off.map((it) => pair(it, 0))
					);
					const variance = off.reduce((sum, it) => sum + (it - bias) ** 2, 0) / off.length;
					expect(rootMeanSquare ** 2).toBeCloseTo(bias ** 2 + variance, 8);
					expect(meanAbsolute).toBeLessThanOrEqual(rootMeanSquare + 1e-12);
				}
			)
		);
	});
});

const told = fc.array(
	fc.record({ chance: fc.integer({ min: 0, max: 12 }).map((k) => k / 12), happened: fc.boolean() }),
	{ minLength: 1, maxLength: 60 }
);

describe('the score of chances', () => {
	test('two days of rain told 0.7 and 0.3, the first wet: 0.09 each', () => {
		const score = chanceScore([
			{ chance: 0.7, happened: true },
			{ chance: 0.3, happened: false }
		]);
		expect(score?.brier).toBeCloseTo(0.09, 12);
	});

	test('certain and right is 0, certain and wrong is 1', () => {
		const of = (chance: number, happened: boolean) => chanceScore([{ chance, happened }])?.brier;
		expect([of(1, true), of(0, false), of(1, false), of(0, true)]).toEqual([0, 0, 1, 1]);
	});

	test('its parts add up (Murphy 1973)', () => {
		fc.assert(
			fc.property(told, (list) => {
				const score = chanceScore(list);
				if (score === null) throw new Error('a chance was told');
				const { brier, reliability, resolution, uncertainty } = score;
				expect(brier).toBeCloseTo(reliability - resolution + uncertainty, 10);
				expect(Math.min(reliability, resolution, uncertainty)).toBeGreaterThanOrEqual(0);
			})
		);
	});

	test('always telling the mean has no skill, and all alike has none to tell', () => {
		const mean = [true, false, false, true].map((happened) => ({ chance: 0.5, happened }));
		expect(chanceScore(mean)?.skill).toBeCloseTo(0, 12);
		expect(chanceScore([{ chance: 0.9, happened: true }])?.skill).toBeNull();
	});

	test('the table holds every chance once, 1 in its last step', () => {
		fc.assert(
			fc.property(told, (list) => {
				const bins = chanceScore(list)?.bins ?? [];
				expect(bins.reduce((sum, bin) => sum + bin.count, 0)).toBe(list.length);
				for (const { from, to, told: mean } of bins) {
					if (mean === null) continue;
					expect(mean).toBeGreaterThanOrEqual(from - 1e-12);
					expect(mean).toBeLessThanOrEqual(to + 1e-12);
				}
			})
		);
	});

	test('without a chance there is none', () => {
		expect(chanceScore([])).toBeNull();
	});
});

describe('the yard’s own correction', () => {
	const times = (count: number, off: number): ForecastPair[] =>
		Array.from({ length: count }, () => pair(20, 20 + off));

	test('few readings change little, many nearly all', () => {
		expect(biasCorrection('airTemperature', times(5, 1)).correction).toBeCloseTo(0.2, 12);
		expect(biasCorrection('airTemperature', times(180, 1)).correction).toBeCloseTo(0.9, 12);
	});

	test('says how many, the mean as counted, and when they are too few', () => {
		expect(biasCorrection('airTemperature', times(5, 1))).toMatchObject({
			count: 5,
			rawMean: 1,
			tooFew: true
		});
		expect(biasCorrection('airTemperature', times(10, 1)).tooFew).toBe(false);
		expect(biasCorrection('wind', times(50, 1))).toEqual({
			quantity: 'wind',
			count: 0,
			rawMean: null,
			correction: 0,
			isBounded: false,
			tooFew: true
		});
	});

	test('never moves further than one and a half usual errors, either way', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 1, max: 400 }),
				fc.double({ min: -60, max: 60, noNaN: true }),
				(count, off) => {
					const { correction, isBounded } = biasCorrection('airTemperature', times(count, off));
					expect(Math.abs(correction)).toBeLessThanOrEqual(2.25);
					expect(Math.abs(correction)).toBeLessThanOrEqual(Math.abs(off) + 1e-12);
					if (isBounded) expect(Math.abs(correction)).toBe(2.25);
				}
			)
		);
	});
});

describe('the yard’s own usual errors', () => {
	const record = (count: number, leadHours: number, off: number): ForecastPair[] =>
		Array.from({ length: count }, (_, i) => pair(10, 10 + (i % 2 === 0 ? off : -off), leadHours));

	test('stand for the defaults once every lead has a long record', () => {
		const long = [...record(60, 12, 1), ...record(60, 36, 1.5), ...record(60, 60, 2)];
		expect(ownUsualErrors(long)).toEqual({ airTemperature: [1, 1.5, 2] });
		expect(ownUsualErrors(long.slice(1))).toEqual({});
	});

	test('a record without error is not believed', () => {
		const exact = [...record(60, 12, 0), ...record(60, 36, 0), ...record(60, 60, 0)];
		expect(ownUsualErrors(exact)).toEqual({});
	});
});
