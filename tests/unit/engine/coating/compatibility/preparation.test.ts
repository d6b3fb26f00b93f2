import { describe, expect, test } from 'vitest';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import { chainOf, coatOf, codesOf, faceOf, only, stepOf } from './chains';

const { epoxyBarrier, epoxyPrimer, varnish, polyurethaneTopcoat, erodingAntifouling } =
	SAMPLE_SHEETS;
const abrade = stepOf({ kind: 'abrade', method: 'none' });
const degrease = stepOf({ kind: 'degrease', method: 'none' });
const wash = stepOf({ kind: 'wash', method: 'none' });

describe('gelcoat', () => {
	const gelcoat = faceOf({ surface: 'gelcoat' });

	test('is degreased before it is sanded', () => {
		expect(codesOf(chainOf(gelcoat, [abrade]))).toEqual(['degreaseFirst']);
		expect(codesOf(chainOf(gelcoat, [abrade, degrease]))).toEqual(['degreaseFirst']);
		expect(codesOf(chainOf(gelcoat, [degrease, abrade]))).toEqual([]);
	});

	test('a wash is no degreasing', () => {
		expect(codesOf(chainOf(gelcoat, [wash, abrade]))).toEqual(['degreaseFirst']);
	});
});

describe('moisture in a laminate before a barrier', () => {
	const wet = faceOf({ surface: 'bare', laminateMoisture: { reading: 20, dry: 12 } });

	test('a reading over that of the dry topsides warns with both', () => {
		expect(only(chainOf(wet, [coatOf(epoxyBarrier)]), 'laminateMoisture')).toEqual({
			code: 'laminateMoisture',
			step: 0,
			face: 0,
			reading: 20,
			dry: 12,
			daysAshore: 10,
			leastDays: 3
		});
	});

	test('no reading at all warns; a dry one does not', () => {
		const unread = faceOf({ surface: 'bare', laminateMoisture: null });
		expect(only(chainOf(unread, [coatOf(epoxyBarrier)]), 'laminateMoisture')).toMatchObject({
			reading: null
		});
		const dry = faceOf({ surface: 'bare' });
		expect(codesOf(chainOf(dry, [coatOf(epoxyBarrier)]))).toEqual([]);
	});

	test('a reading on the day of the haul says little', () => {
		const dry = faceOf({ surface: 'bare' });
		const fresh = chainOf(dry, [coatOf(epoxyBarrier)], { daysAshore: 1 });
		expect(only(fresh, 'laminateMoisture')).toMatchObject({ daysAshore: 1, leastDays: 3 });
	});

	test('is asked before the first barrier coat alone, and of laminates alone', () => {
		expect(codesOf(chainOf(wet, [coatOf(epoxyBarrier), coatOf(epoxyBarrier)]))).toEqual([
			'laminateMoisture'
		]);
		expect(codesOf(chainOf({ ...wet, surface: 'epoxyBarrier' }, [coatOf(epoxyBarrier)]))).toEqual(
			[]
		);
		expect(codesOf(chainOf({ ...wet, substrate: 'lead' }, [coatOf(epoxyBarrier)]))).toEqual([]);
	});
});

describe('moisture in wood', () => {
	const wood = (woodMoisture: number | null) =>
		faceOf({ substrate: 'timber', surface: 'bare', woodMoisture });

	test.each([
		[12, false],
		[15, false],
		[16, true],
		[20, true],
		[null, true]
	])('at %d %%', (percent, isWarned) => {
		const chain = chainOf(wood(percent), [coatOf(varnish)]);
		expect(codesOf(chain)).toEqual(isWarned ? ['woodMoisture'] : []);
		if (isWarned)
			expect(only(chain, 'woodMoisture')).toMatchObject({ percent, most: 15, never: 18 });
	});

	test('under old varnish it is not asked', () => {
		const old = faceOf({ substrate: 'timber', surface: 'varnish', woodMoisture: null });
		expect(codesOf(chainOf(old, [coatOf(varnish)]))).toEqual([]);
	});
});

describe('blush on epoxy', () => {
	const face = faceOf({ surface: 'unknown', substrate: 'steel' });
	const damp = { relativeHumidity: 85, surfaceTemperature: 12, minutesSince: 900 };
	const after = (...steps: ReturnType<typeof stepOf>[]) =>
		codesOf(chainOf(face, [coatOf(epoxyPrimer), ...steps])).filter((code) => code === 'blush');

	test('after a cool damp night a coat or dry paper wants a wash first', () => {
		expect(after(coatOf(polyurethaneTopcoat, damp))).toEqual(['blush']);
		expect(after(stepOf({ ...abrade, ...damp }))).toEqual(['blush']);
		expect(
			only(chainOf(face, [coatOf(epoxyPrimer), coatOf(polyurethaneTopcoat, damp)]), 'blush')
		).toMatchObject({ step: 1, minutes: 900, relativeHumidity: 85, surfaceTemperature: 12 });
	});

	test('once washed it is gone, until the next coat of epoxy', () => {
		expect(after(wash, coatOf(polyurethaneTopcoat, damp))).toEqual([]);
		expect(after(wash, coatOf(epoxyPrimer, damp), coatOf(polyurethaneTopcoat, damp))).toEqual([
			'blush'
		]);
	});

	test('solvent does not take it off', () => {
		expect(after(degrease, coatOf(polyurethaneTopcoat, damp))).toEqual(['blush']);
	});

	test('dry air or a warm face makes none', () => {
		expect(after(coatOf(polyurethaneTopcoat, { ...damp, relativeHumidity: 60 }))).toEqual([]);
		expect(after(coatOf(polyurethaneTopcoat, { ...damp, surfaceTemperature: 24 }))).toEqual([]);
	});

	test('in unknown air a long wait or sanding counts, a quick recoat does not', () => {
		const unknown = { relativeHumidity: null, surfaceTemperature: null };
		expect(after(coatOf(epoxyPrimer, { ...unknown, minutesSince: 900 }))).toEqual(['blush']);
		expect(after(coatOf(epoxyPrimer, { ...unknown, minutesSince: null }))).toEqual(['blush']);
		expect(after(coatOf(epoxyPrimer, { ...unknown, minutesSince: 300 }))).toEqual([]);
		expect(after(stepOf({ ...abrade, ...unknown, minutesSince: 300 }))).toEqual(['blush']);
	});

	test('only epoxy blushes', () => {
		const coats = [coatOf(erodingAntifouling), coatOf(erodingAntifouling, damp)];
		expect(codesOf(chainOf(faceOf(), coats))).not.toContain('blush');
	});

	test('every pair of coats is told', () => {
		const steps = [coatOf(epoxyBarrier), coatOf(epoxyBarrier, damp), coatOf(epoxyBarrier, damp)];
		expect(codesOf(chainOf(faceOf(), steps))).toEqual(['blush', 'blush']);
	});
});

describe('rubber seals', () => {
	const leg = faceOf({ substrate: 'grp', fittings: [{ kind: 'rubberSeal' }] });

	test('are masked from solvents', () => {
		expect(codesOf(chainOf(leg, [degrease]))).toEqual(['solventOnRubber']);
		expect(codesOf(chainOf(leg, [coatOf(epoxyPrimer)]))).toEqual(['solventOnRubber']);
		expect(codesOf(chainOf(leg, [wash]))).toEqual([]);
	});
});
