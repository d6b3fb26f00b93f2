import { describe, expect, test } from 'vitest';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import { methodLimits, timesBefore } from '../../../../../src/lib/engine/coating/sheet/forStep';
import type { Sheet } from '../../../../../src/lib/engine/coating/sheet/sheet';

const SHEET: Sheet = {
	name: 'Plain topcoat',
	type: 'polyurethaneTopcoat',
	sample: false,
	hazards: [],
	limits: { spread: { min: 3 }, wind: { max: 7 } },
	wind: { brush: { wind: 6, gust: 9 }, airless: { gust: 5 } },
	times: { touchDry: 240, overcoatMin: 600, overcoatMax: 2880 }
};

describe('methodLimits', () => {
	test('the sheet’s word for the method stands over its word for any', () => {
		expect(methodLimits(SHEET, 'brush')).toEqual({
			limits: { spread: { min: 3 }, wind: { max: 6 }, gust: { max: 9 } },
			defaults: []
		});
	});

	test('half a word for the method leaves the other half to the sheet', () => {
		expect(methodLimits(SHEET, 'airless')).toEqual({
			limits: { spread: { min: 3 }, wind: { max: 7 }, gust: { max: 5 } },
			defaults: []
		});
	});

	test('what the sheet is silent about is the default of method and coating, and said so', () => {
		expect(methodLimits(SHEET, 'hvlp')).toEqual({
			limits: { spread: { min: 3 }, wind: { max: 7 }, gust: { max: 7 } },
			defaults: ['gust']
		});
		const silent: Sheet = { ...SHEET, limits: {}, wind: undefined };
		expect(methodLimits(silent, 'hvlp')).toEqual({
			limits: { wind: { max: 5 }, gust: { max: 7 } },
			defaults: ['wind', 'gust']
		});
	});

	test('without a method only the coating’s own default is left', () => {
		const primer: Sheet = { ...SHEET, type: 'epoxyPrimer', limits: {} };
		expect(methodLimits(primer, 'none')).toEqual({ limits: {}, defaults: [] });
	});

	test('leaves the sheet as it was', () => {
		const before = structuredClone(SHEET);
		methodLimits(SHEET, 'brush');
		expect(SHEET).toEqual(before);
	});
});

describe('timesBefore', () => {
	const primer = SAMPLE_SHEETS.epoxyPrimer;

	test('a primer’s own window is the one toward itself', () => {
		const next = timesBefore(primer, 'epoxyPrimer');
		expect(next.times).toEqual(primer.times);
		expect([next.overcoatMin, next.overcoatMax]).toEqual(['any', 'any']);
		expect(next.whenMaximumPassed).toMatchObject({ do: 'tackCoat', wash: 'detergent' });
	});

	test('toward a polyurethane it is that pair’s, and another remedy', () => {
		const next = timesBefore(primer, 'polyurethaneTopcoat');
		expect(next.times.overcoatMin).toEqual(primer.following?.polyurethaneTopcoat?.overcoatMin);
		expect(next.times.touchDry).toEqual(primer.times.touchDry);
		expect([next.overcoatMin, next.overcoatMax]).toEqual(['pair', 'pair']);
		expect(next.whenMaximumPassed).toEqual({ do: 'abrade', grit: { from: 220, to: 320 } });
	});

	test('toward antifouling the film must still be tacky: a far shorter maximum', () => {
		const { times } = timesBefore(primer, 'erodingAntifouling');
		expect(times.overcoatMax).toContainEqual([20, 7 * 60]);
		expect(primer.times.overcoatMax).toContainEqual([20, 7 * 1440]);
	});

	test('half a pair takes the other half from the sheet', () => {
		const sheet: Sheet = { ...SHEET, following: { varnish: { overcoatMax: null } } };
		const next = timesBefore(sheet, 'varnish');
		expect(next.times).toMatchObject({ overcoatMin: 600, overcoatMax: null });
		expect([next.overcoatMin, next.overcoatMax]).toEqual(['any', 'pair']);
	});

	test('silence stays silence', () => {
		const next = timesBefore({ ...SHEET, times: { touchDry: 60 } }, 'varnish');
		expect(next).toEqual({
			times: { touchDry: 60 },
			overcoatMin: 'silent',
			overcoatMax: 'silent',
			whenMaximumPassed: null
		});
	});

	test('with nothing known to follow, the sheet’s general times hold', () => {
		expect(timesBefore(primer, null).times).toEqual(primer.times);
	});
});
