import { describe, expect, test } from 'vitest';
import { foundOnFace } from '../../../../../src/lib/engine/coating/compatibility/surfaceBefore';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import { chainOf, coatOf, faceOf, stepOf } from './chains';

const { epoxyBarrier, erodingAntifouling, laminatingEpoxy } = SAMPLE_SHEETS;
const FACE = faceOf({ surface: 'gelcoat', barrierMicrons: 0 });
const wash = stepOf({ kind: 'wash', method: 'none' });
const degrease = stepOf({ kind: 'degrease', method: 'none' });
const abrade = stepOf({ kind: 'abrade', method: 'none' });

describe('foundOnFace', () => {
	test('the first step finds what the face was, for no known time', () => {
		expect(foundOnFace(chainOf(FACE, [coatOf(epoxyBarrier)]), 0)).toEqual([
			{
				surface: 'gelcoat',
				minutes: null,
				barrierMicrons: 0,
				washed: false,
				degreased: false
			}
		]);
	});

	test('each coat becomes what the next step finds, its age from its finish', () => {
		const steps = [
			coatOf(epoxyBarrier, { coats: 2 }),
			coatOf(epoxyBarrier, { minutesSince: 480 }),
			coatOf(erodingAntifouling, { minutesSince: 300 }),
			coatOf(erodingAntifouling, { minutesSince: 700 })
		];
		const found = foundOnFace(chainOf(FACE, steps), 0);
		expect(found.map((it) => it?.surface)).toEqual([
			'gelcoat',
			'epoxyBarrier',
			'epoxyBarrier',
			'erodingAntifouling'
		]);
		expect(found.map((it) => it?.minutes)).toEqual([null, 480, 300, 700]);
		expect(found.map((it) => it?.barrierMicrons)).toEqual([0, 110, 165, 165]);
	});

	test('washing and degreasing are remembered until the next coat', () => {
		const steps = [wash, degrease, coatOf(epoxyBarrier), abrade];
		const found = foundOnFace(chainOf(FACE, steps), 0);
		expect(found.map((it) => [it?.washed, it?.degreased])).toEqual([
			[false, false],
			[true, false],
			[true, true],
			[false, false]
		]);
	});

	test('time passes while other faces are worked on, who do not change this one', () => {
		const elsewhere = coatOf(erodingAntifouling, {
			faces: [1],
			minutesSince: 10,
			durationMinutes: 50
		});
		const steps = [coatOf(epoxyBarrier), elsewhere, coatOf(epoxyBarrier, { minutesSince: 40 })];
		const [, there, here] = foundOnFace(chainOf(FACE, steps), 0);
		expect(there).toBeNull();
		expect(here).toMatchObject({ surface: 'epoxyBarrier', minutes: 100 });
	});

	test('a gap that nobody has planned makes the age unknown', () => {
		const steps = [coatOf(epoxyBarrier), wash, coatOf(epoxyBarrier, { minutesSince: null })];
		expect(foundOnFace(chainOf(FACE, steps), 0)[2]).toMatchObject({ minutes: null, washed: true });
	});

	test('blasting and baring take it down to what it is made of', () => {
		for (const step of [stepOf({ kind: 'blast' }), stepOf({ kind: 'strip', bares: true })]) {
			const steps = [coatOf(epoxyBarrier), step, coatOf(epoxyBarrier)];
			expect(foundOnFace(chainOf(FACE, steps), 0)[2]).toMatchObject({
				surface: 'bare',
				minutes: 60,
				barrierMicrons: 0
			});
		}
	});

	test('a laminate is a surface and no barrier', () => {
		const laminate = stepOf({ kind: 'laminate', method: 'none', sheet: laminatingEpoxy });
		expect(foundOnFace(chainOf(FACE, [laminate, abrade]), 0)[1]).toMatchObject({
			surface: 'laminatingEpoxy',
			barrierMicrons: 0
		});
	});

	test('a coat without a sheet leaves a surface that nobody knows', () => {
		expect(foundOnFace(chainOf(FACE, [stepOf(), abrade]), 0)[1]).toMatchObject({
			surface: 'unknown'
		});
	});
});
