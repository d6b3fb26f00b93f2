import { describe, expect, test } from 'vitest';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import type { CoatingType } from '../../../../../src/lib/engine/coating/sheet/coatingTypes';
import { chainOf, coatOf, codesOf, faceOf, only, stepOf } from './chains';

const {
	epoxyPrimer,
	erodingAntifouling,
	hardAntifouling,
	polyurethaneTopcoat,
	onePartEnamel,
	varnish,
	siliconeTieCoat,
	siliconeFinish,
	etchPrimer,
	runningGearSilicone
} = SAMPLE_SHEETS;
const on = (surface: CoatingType) => faceOf({ surface, substrate: 'coredGrp' });

describe('one coating over another', () => {
	test('polyurethane lifts one-part paint, old or new', () => {
		expect(
			only(chainOf(on('onePartEnamel'), [coatOf(polyurethaneTopcoat)]), 'strongSolvent')
		).toEqual({ code: 'strongSolvent', step: 0, face: 0, over: 'onePartEnamel' });
		const timber = faceOf({ surface: 'varnish', substrate: 'timber' });
		expect(codesOf(chainOf(timber, [coatOf(varnish), coatOf(polyurethaneTopcoat)]))).toEqual([
			'strongSolvent'
		]);
	});

	test('polyurethane over epoxy, and enamel over either, is fine', () => {
		expect(codesOf(chainOf(on('epoxyPrimer'), [coatOf(polyurethaneTopcoat)]))).toEqual([]);
		expect(codesOf(chainOf(on('polyurethaneTopcoat'), [coatOf(onePartEnamel)]))).toEqual([]);
		expect(codesOf(chainOf(on('onePartEnamel'), [coatOf(onePartEnamel)]))).toEqual([]);
	});

	test('hard over eroding antifouling warns; eroding over hard does not', () => {
		expect(codesOf(chainOf(on('erodingAntifouling'), [coatOf(hardAntifouling)]))).toEqual([
			'hardOverSoft'
		]);
		expect(codesOf(chainOf(on('hardAntifouling'), [coatOf(erodingAntifouling)]))).toEqual([]);
	});

	test('nothing but antifouling goes over antifouling unsealed', () => {
		expect(codesOf(chainOf(on('hardAntifouling'), [coatOf(epoxyPrimer)]))).toEqual([
			'overAntifouling'
		]);
		const seal = { ...onePartEnamel, type: 'onePartPrimer' as const };
		expect(codesOf(chainOf(on('hardAntifouling'), [coatOf(seal)]))).toEqual([]);
	});

	test('polyurethane over antifouling is told as antifouling, not as one-part paint', () => {
		expect(codesOf(chainOf(on('erodingAntifouling'), [coatOf(polyurethaneTopcoat)]))).toEqual([
			'overAntifouling'
		]);
	});

	test('taken off, what was beneath no longer counts', () => {
		const strip = stepOf({ kind: 'strip', method: 'none', bares: true });
		expect(codesOf(chainOf(on('erodingAntifouling'), [strip, coatOf(epoxyPrimer)]))).toEqual([]);
	});

	test('paint that nobody knows is tested and sealed first', () => {
		expect(codesOf(chainOf(faceOf({ surface: 'unknown' }), [coatOf(onePartEnamel)]))).toEqual([
			'unknownPaint'
		]);
		expect(
			codesOf(chainOf(on('epoxyBarrier'), [stepOf({ sheet: null }), coatOf(onePartEnamel)]))
		).toEqual(['unknownPaint']);
	});
});

describe('silicone', () => {
	test('nothing sticks to it but its own kind', () => {
		for (const sheet of [epoxyPrimer, hardAntifouling, polyurethaneTopcoat])
			expect(codesOf(chainOf(on('siliconeFinish'), [coatOf(sheet)]))).toContain('overSilicone');
		expect(codesOf(chainOf(on('siliconeFinish'), [coatOf(siliconeTieCoat)]))).toEqual([]);
		expect(codesOf(chainOf(on('siliconeFinish'), [coatOf(siliconeFinish)]))).toEqual([]);
	});

	test('the finish wants its tie coat', () => {
		expect(
			only(chainOf(on('epoxyPrimer'), [coatOf(siliconeFinish)]), 'tieCoatMissing')
		).toMatchObject({ over: 'epoxyPrimer' });
		expect(codesOf(chainOf(on('siliconeTieCoat'), [coatOf(siliconeFinish)]))).toEqual([]);
	});

	test('on running gear the etch primer is enough', () => {
		const propeller = faceOf({ substrate: 'bronze', surface: 'unknown' });
		const abrade = stepOf({ kind: 'abrade', method: 'none', bares: true });
		expect(
			codesOf(
				chainOf(propeller, [
					abrade,
					coatOf(etchPrimer, { method: 'brush', minutesSince: 30 }),
					coatOf(runningGearSilicone, { method: 'brush', minutesSince: 10 })
				])
			)
		).toEqual([]);
	});

	test('the tie coat wants its epoxy fresh', () => {
		const days = (n: number) => n * 1440;
		const steps = (minutesSince: number) => [
			coatOf(epoxyPrimer),
			coatOf(siliconeTieCoat, { minutesSince })
		];
		expect(codesOf(chainOf(on('epoxyPrimer'), steps(days(2))))).toEqual([]);
		expect(only(chainOf(on('epoxyPrimer'), steps(days(4))), 'oldPrimer')).toMatchObject({
			step: 1,
			minutes: days(4),
			most: days(3)
		});
	});

	test('its mist is a warning, its roller none', () => {
		expect(
			codesOf(chainOf(on('siliconeTieCoat'), [coatOf(siliconeFinish, { method: 'airless' })]))
		).toEqual(['siliconeMist']);
	});
});

describe('what the sheet names', () => {
	test('a coating on a substrate that its sheet does not name', () => {
		const steel = faceOf({ substrate: 'steel', surface: 'bare' });
		expect(only(chainOf(steel, [coatOf(varnish)]), 'notOnSheet')).toMatchObject({
			substrate: 'steel'
		});
	});

	test('over another coat the substrate beneath is that coat’s matter', () => {
		const steel = faceOf({ substrate: 'steel', surface: 'epoxyPrimer' });
		expect(codesOf(chainOf(steel, [coatOf(varnish)]))).not.toContain('notOnSheet');
	});

	test('a sheet that names none is silent', () => {
		const gelcoat = faceOf({ surface: 'gelcoat' });
		expect(codesOf(chainOf(gelcoat, [coatOf(onePartEnamel)]))).not.toContain('notOnSheet');
	});
});
