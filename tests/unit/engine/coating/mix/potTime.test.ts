import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { potTime } from '../../../../../src/lib/engine/coating/mix/potTime';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import type { Sheet } from '../../../../../src/lib/engine/coating/sheet/sheet';
import { errorOf, valueOf } from './value';

const PRIMER = SAMPLE_SHEETS.epoxyPrimer;
const withTimes = (times: Sheet['times']): Sheet => ({ ...PRIMER, times });

describe('potTime', () => {
	test('at a row of the tin it is the tin’s own, the induction taken from it', () => {
		expect(valueOf(potTime(PRIMER, 20))).toEqual({
			potLifeMinutes: expect.closeTo(240, 9),
			inductionMinutes: expect.closeTo(15, 9),
			workMinutes: expect.closeTo(225, 9),
			extrapolated: false,
			standstill: false
		});
	});

	test('hotter than the tin goes, it goes on shortening', () => {
		const [at38, at45] = [38, 45].map((celsius) => valueOf(potTime(PRIMER, celsius)));
		expect(at38.extrapolated).toBe(true);
		expect(at38.potLifeMinutes).toBeLessThan(90);
		expect(at45.potLifeMinutes).toBeLessThan(at38.potLifeMinutes ?? 0);
	});

	test('colder than the tables reach, pot life stays at its longest and the standstill is said', () => {
		const sheet = withTimes({ potLife: PRIMER.times.potLife });
		const [at4, at5, atFrost] = [4, 5, -10].map((celsius) => valueOf(potTime(sheet, celsius)));
		expect(at5).toMatchObject({ extrapolated: true, standstill: false });
		expect(at4).toMatchObject({ extrapolated: true, standstill: true });
		expect(at4.potLifeMinutes).toBeCloseTo(at5.potLifeMinutes ?? NaN, 9);
		expect(atFrost.potLifeMinutes).toBe(at4.potLifeMinutes);
	});

	test('an induction that stands still in the cold never makes the pot ready', () => {
		expect(errorOf(potTime(PRIMER, 2))).toEqual({
			code: 'standsStill',
			time: 'induction',
			celsius: 2
		});
	});

	test('an induction as long as the pot leaves no time', () => {
		expect(errorOf(potTime(withTimes({ potLife: 30, induction: 30 }), 20))).toEqual({
			code: 'noTimeLeft',
			potLifeMinutes: expect.closeTo(30, 9),
			inductionMinutes: expect.closeTo(30, 9)
		});
	});

	test('two parts without a pot life cannot be planned for', () => {
		expect(errorOf(potTime(withTimes({}), 20))).toEqual({ code: 'potLifeSilent' });
	});

	test('one part without a pot life has none to watch', () => {
		expect(valueOf(potTime(SAMPLE_SHEETS.varnish, 20))).toEqual({
			potLifeMinutes: null,
			inductionMinutes: 0,
			workMinutes: null,
			extrapolated: false,
			standstill: false
		});
	});

	test('“no limit” on the tin is none', () => {
		expect(valueOf(potTime(withTimes({ potLife: null }), 20)).workMinutes).toBeNull();
	});

	test('without a temperature there is no answer', () => {
		expect(errorOf(potTime(PRIMER, NaN))).toEqual({ code: 'temperatureUnknown' });
		expect(errorOf(potTime(PRIMER, Infinity))).toEqual({ code: 'temperatureUnknown' });
	});

	test('a warmer pot never lives longer', () => {
		fc.assert(
			fc.property(
				fc.constantFrom(...Object.values(SAMPLE_SHEETS)),
				fc.double({ min: -20, max: 60, noNaN: true }),
				fc.double({ min: 0, max: 20, noNaN: true }),
				({ times, ...sheet }, celsius, more) => {
					const only = { ...sheet, times: { potLife: times.potLife ?? 60 } };
					const cool = valueOf(potTime(only, celsius)).potLifeMinutes ?? NaN;
					const warm = valueOf(potTime(only, celsius + more)).potLifeMinutes ?? NaN;
					expect(warm).toBeLessThanOrEqual(cool * (1 + 1e-9));
				}
			)
		);
	});
});
