import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
	defaultWind,
	layingMethodSchema,
	METHOD_WIND_LIMITS,
	windStops
} from '../../../../src/lib/engine/coating/methodWind';
import { COATING_TYPES } from '../../../../src/lib/engine/coating/sheet/coatingTypes';
import { METHODS } from '../../../../src/lib/engine/vocabulary';

const METHODS_THAT_LAY = layingMethodSchema.options;

describe('METHOD_WIND_LIMITS', () => {
	test('every method that lays a coating has its limits, and none other', () => {
		expect(Object.keys(METHOD_WIND_LIMITS).sort()).toEqual([...METHODS_THAT_LAY].sort());
		expect([...METHODS_THAT_LAY, 'none'].sort()).toEqual([...METHODS].sort());
	});

	test('one is careful before one stops, and a gust may be stronger than the mean', () => {
		for (const { caution, stop, gust } of Object.values(METHOD_WIND_LIMITS)) {
			expect(caution).toBeLessThan(stop);
			expect(stop).toBeLessThan(gust);
		}
	});

	test('the finer the mist, the less wind: airless, HVLP, air spray', () => {
		const { roller, airless, hvlp, airSpray } = METHOD_WIND_LIMITS;
		const stops = [roller, airless, hvlp, airSpray].map((it) => it.stop);
		expect(stops).toEqual([...stops].sort((a, b) => b - a));
		expect(new Set(stops).size).toBe(4);
	});
});

describe('defaultWind', () => {
	test('antifouling by roller has the roller’s own limits', () => {
		expect(defaultWind('roller', 'erodingAntifouling')).toEqual({ caution: 6, stop: 9, gust: 12 });
	});

	test('a gloss by roller or brush stops as early as roll and tip', () => {
		for (const method of ['roller', 'brush', 'rollAndTip'] as const)
			expect(defaultWind(method, 'polyurethaneTopcoat')).toEqual({
				caution: 3,
				stop: 5.5,
				gust: 8
			});
	});

	test('varnish and silicone bring limits of their own', () => {
		expect(defaultWind('brush', 'varnish')).toEqual({ caution: 2.5, stop: 4, gust: 6 });
		expect(defaultWind('roller', 'siliconeFinish')).toEqual({ caution: 3, stop: 5, gust: 7 });
	});

	test('where the method is stricter than the coating, the method binds', () => {
		expect(defaultWind('airSpray', 'siliconeFinish')).toEqual({ caution: 2.5, stop: 4.5, gust: 6 });
	});

	test('a bead of sealant has limits without any method; a primer without one has none', () => {
		expect(defaultWind('none', 'polyurethaneSealant')).toEqual({ caution: 6, stop: 10, gust: 13 });
		expect(defaultWind('none', 'epoxyPrimer')).toBeNull();
		expect(defaultWind('none', null)).toBeNull();
		expect(defaultWind('hvlp', null)).toEqual(METHOD_WIND_LIMITS.hvlp);
	});

	test('no coating ever allows a method more wind than the method has', () => {
		fc.assert(
			fc.property(
				fc.constantFrom(...METHODS_THAT_LAY),
				fc.constantFrom(...COATING_TYPES),
				(method, coating) => {
					const limits = defaultWind(method, coating);
					expect(limits).not.toBeNull();
					expect(limits?.stop).toBeLessThanOrEqual(METHOD_WIND_LIMITS[method].stop);
					expect(limits?.gust).toBeLessThanOrEqual(METHOD_WIND_LIMITS[method].gust);
					expect(limits?.caution).toBeLessThanOrEqual(METHOD_WIND_LIMITS[method].caution);
				}
			)
		);
	});
});

test('windStops gives a step’s limits', () => {
	expect(windStops(METHOD_WIND_LIMITS.airless)).toEqual({ wind: { max: 6.7 }, gust: { max: 9 } });
});
