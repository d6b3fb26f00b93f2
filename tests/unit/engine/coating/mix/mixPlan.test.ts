import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { lossOf, METHOD_LOSS } from '../../../../../src/lib/engine/coating/mix/loss';
import { mixPlan, type MixRequest } from '../../../../../src/lib/engine/coating/mix/mixPlan';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import type { Sheet } from '../../../../../src/lib/engine/coating/sheet/sheet';
import { METHODS } from '../../../../../src/lib/engine/vocabulary';
import { errorOf, valueOf } from './value';

const BARRIER: Sheet = {
	...SAMPLE_SHEETS.epoxyBarrier,
	film: { solids: 50, dryFilm: 50, wetFilm: 100, spreadRate: 10 },
	tinLitres: [0.75, 2.5]
};
const REQUEST: MixRequest = {
	sheet: BARRIER,
	method: 'roller',
	area: 17,
	coats: 5,
	rate: 17,
	celsius: 20,
	lossPercent: 15
};
const planOf = (change: Partial<MixRequest> = {}) => valueOf(mixPlan({ ...REQUEST, ...change }));

describe('mixPlan', () => {
	test('a bottom of 17 m² in five coats', () => {
		const plan = planOf();
		// 17 m² ÷ (10 m²/L × 0.85) = 2 L a coat.
		expect(plan.need.paintPerCoat).toBeCloseTo(2, 12);
		expect(plan.paint).toBeCloseTo(10, 12);
		expect(plan.lost).toBeCloseTo(1.5, 12);
		expect(plan.thinner).toBe(0);
		expect(plan.tins).toMatchObject({ litres: 10, tins: [{ litres: 2.5, count: 4 }] });
		const pots = valueOf(plan.pots);
		expect(pots).toMatchObject({ count: 2, bound: 'sheet' });
		expect(pots.litres).toBeCloseTo(1, 12);
		expect(pots.minutes).toBeCloseTo(30, 9);
		expect(valueOf(pots.amounts).parts.map((part) => part.litres)).toEqual([
			expect.closeTo(0.75, 12),
			expect.closeTo(0.25, 12)
		]);
		expect(valueOf(plan.amounts).parts.map((part) => part.litres)).toEqual([
			expect.closeTo(7.5, 12),
			expect.closeTo(2.5, 12)
		]);
	});

	test('ten per cent of thinner fills the pot and not the boat', () => {
		const plan = planOf({ thinnerPercent: 10 });
		expect(plan.paint).toBeCloseTo(10, 12);
		expect(plan.thinner).toBeCloseTo(1, 12);
		expect(plan.need.potPerCoat).toBeCloseTo(2.2, 12);
		expect(plan.need.wetFilm).toBeCloseTo(110, 9);
		const pots = valueOf(plan.pots);
		expect(pots.count).toBe(3);
		expect(pots.thinner * pots.count).toBeCloseTo(0.2, 12);
		const inPots = valueOf(pots.amounts).litres ?? NaN;
		expect((inPots + pots.thinner) * pots.count).toBeCloseTo(2.2, 12);
	});

	test('a thicker film takes more paint, told from the solids', () => {
		expect(planOf({ dryFilm: 100 }).paint).toBeCloseTo(20, 12);
	});

	test('a thicker film without solids is told from the stated spread', () => {
		const film = { dryFilm: 50, spreadRate: 10 };
		expect(planOf({ sheet: { ...BARRIER, film }, dryFilm: 100 }).paint).toBeCloseTo(20, 12);
	});

	test('where the sheet states no spread it is told from its film', () => {
		expect(planOf({ sheet: { ...BARRIER, film: { wetFilm: 100 } } }).paint).toBeCloseTo(10, 12);
		expect(planOf({ sheet: { ...BARRIER, film: { solids: 50, dryFilm: 50 } } }).paint).toBeCloseTo(
			10,
			12
		);
	});

	test('hotter, the pots are smaller and more', () => {
		const sheet = {
			...BARRIER,
			mix: { by: BARRIER.mix?.by ?? 'volume', parts: BARRIER.mix?.parts ?? [] }
		};
		const at = (celsius: number): number => valueOf(planOf({ sheet, celsius, rate: 2 }).pots).count;
		expect(at(15)).toBeLessThan(at(25));
		expect(at(25)).toBeLessThan(at(35));
	});

	test('a sheet silent on its spread has no plan', () => {
		expect(errorOf(mixPlan({ ...REQUEST, sheet: { ...BARRIER, film: undefined } }))).toEqual({
			code: 'spreadSilent'
		});
		expect(
			errorOf(mixPlan({ ...REQUEST, dryFilm: 80, sheet: { ...BARRIER, film: { wetFilm: 100 } } }))
		).toEqual({ code: 'spreadSilent' });
	});

	test('what cannot be told carries its reason and the rest stands', () => {
		const sheet: Sheet = { ...BARRIER, mix: undefined, tinLitres: undefined, times: {} };
		const plan = planOf({ sheet });
		expect(errorOf(plan.amounts)).toEqual({ code: 'ratioSilent' });
		expect(plan.tins).toBeNull();
		expect(plan.paint).toBeCloseTo(10, 12);
		expect(valueOf(plan.pots).count).toBe(1);
	});

	test('a forecast without a temperature leaves the pots open and the tins known', () => {
		const plan = planOf({ celsius: NaN });
		expect(errorOf(plan.pots)).toEqual({ code: 'temperatureUnknown' });
		expect(errorOf(plan.potTime)).toEqual({ code: 'temperatureUnknown' });
		expect(plan.tins?.litres).toBe(10);
	});

	test.each([
		['area', 0],
		['area', NaN],
		['area', -3],
		['rate', 0],
		['coats', 0],
		['coats', 1.5],
		['thinnerPercent', -1],
		['lossPercent', 100],
		['dryFilm', 0],
		['largestPot', 0]
	] as const)('%s of %d is refused by name', (field, found) => {
		expect(errorOf(mixPlan({ ...REQUEST, [field]: found }))).toEqual({
			code: 'outOfRange',
			field,
			found
		});
	});

	const requests = fc.record({
		sheet: fc.constantFrom(
			...Object.values(SAMPLE_SHEETS).filter((sheet) => sheet.film?.solids !== undefined)
		),
		method: fc.constantFrom(...METHODS),
		area: fc.double({ min: 0.1, max: 400, noNaN: true }),
		coats: fc.integer({ min: 1, max: 8 }),
		rate: fc.double({ min: 1, max: 80, noNaN: true }),
		celsius: fc.double({ min: -10, max: 50, noNaN: true }),
		thinnerPercent: fc.double({ min: 0, max: 40, noNaN: true })
	});

	test('on any sample, what is mixed is what is needed and no pot outlives its life', () => {
		fc.assert(
			fc.property(requests, (request) => {
				const plan = valueOf(mixPlan(request));
				const { need } = plan;
				expect(need.paintPerCoat + need.thinnerPerCoat).toBeCloseTo(need.potPerCoat, 9);
				// What is left on the boat is the dry film over the area.
				const landed = need.potPerCoat - need.lostPerCoat;
				expect(landed * 1000).toBeCloseTo(need.wetFilm * request.area, 5);
				expect(plan.tins?.litres).toBeGreaterThanOrEqual(plan.paint * (1 - 1e-6));
				if (!plan.pots.ok || !plan.potTime.ok) {
					expect(plan.pots.ok).toBe(false);
					return;
				}
				const { count, litres, minutes } = plan.pots.value;
				expect(count * litres).toBeCloseTo(need.potPerCoat, 9);
				const work = plan.potTime.value.workMinutes ?? Infinity;
				expect(minutes).toBeLessThanOrEqual(work * (1 + 1e-6));
			}),
			{ numRuns: 300 }
		);
	});
});

describe('lossOf', () => {
	const sheet: Sheet = { ...BARRIER, film: { loss: { airless: 40 } } };

	test('what was given, else the sheet’s, else the usual, and says which', () => {
		expect(lossOf(sheet, 'airless', 5)).toEqual({ percent: 5, from: 'given' });
		expect(lossOf(sheet, 'airless', undefined)).toEqual({ percent: 40, from: 'sheet' });
		expect(lossOf(sheet, 'brush', undefined)).toEqual({ percent: 15, from: 'default' });
		expect(lossOf(sheet, 'none', undefined)).toEqual({ percent: 10, from: 'default' });
	});

	test('a mist wastes more than a roller', () => {
		expect(METHOD_LOSS.roller).toBeLessThan(METHOD_LOSS.airless);
		expect(METHOD_LOSS.hvlp).toBeLessThan(METHOD_LOSS.airSpray);
	});
});
