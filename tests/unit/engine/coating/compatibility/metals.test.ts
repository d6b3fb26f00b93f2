import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { primeWithin } from '../../../../../src/lib/engine/coating/compatibility/primeWithin';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import type { Sheet } from '../../../../../src/lib/engine/coating/sheet/sheet';
import { SUBSTRATES } from '../../../../../src/lib/engine/coating/sheet/substrates';
import { chainOf, coatOf, codesOf, faceOf, only, stepOf } from './chains';

const { aluminiumPrimer, epoxyPrimer, erodingAntifouling, epoxyBarrier } = SAMPLE_SHEETS;
const ALUMINIUM = faceOf({ substrate: 'aluminium', surface: 'unknown', barrierMicrons: 0 });
const COPPER: Sheet = erodingAntifouling;
const THIOCYANATE: Sheet = { ...COPPER, contains: ['copperThiocyanate'] };
const COPPER_FREE: Sheet = { ...COPPER, contains: [] };

describe('copper over aluminium', () => {
	test('without a barrier warns, with the thickness there and the one asked for', () => {
		expect(only(chainOf(ALUMINIUM, [coatOf(COPPER)]), 'copperOnAluminium')).toEqual({
			code: 'copperOnAluminium',
			step: 0,
			face: 0,
			copper: 'cuprousOxide',
			barrierMicrons: 0,
			leastMicrons: 200,
			usualMicrons: 300,
			approved: false
		});
	});

	test('a drive leg is aluminium too', () => {
		const leg = faceOf({ substrate: 'casting', barrierMicrons: 0 });
		expect(codesOf(chainOf(leg, [coatOf(COPPER)]))).toContain('copperOnAluminium');
	});

	test('counts the epoxy that the chain itself lays', () => {
		const steps = [coatOf(aluminiumPrimer, { coats: 2 }), coatOf(COPPER)];
		expect(only(chainOf(ALUMINIUM, steps), 'copperOnAluminium')).toMatchObject({
			step: 1,
			barrierMicrons: 110
		});
	});

	test('over a full barrier still asks for the maker’s word on aluminium', () => {
		const steps = [coatOf(aluminiumPrimer, { coats: 5 }), coatOf(COPPER)];
		expect(only(chainOf(ALUMINIUM, steps), 'copperOnAluminium')).toMatchObject({
			barrierMicrons: 275,
			approved: false
		});
		const approved: Sheet = { ...COPPER, substrates: ['aluminium'] };
		expect(
			codesOf(chainOf(ALUMINIUM, [coatOf(aluminiumPrimer, { coats: 5 }), coatOf(approved)]))
		).not.toContain('copperOnAluminium');
	});

	test('thiocyanate over a barrier is the usual way, and without one is not', () => {
		expect(codesOf(chainOf(ALUMINIUM, [coatOf(THIOCYANATE)]))).toContain('copperOnAluminium');
		expect(
			codesOf(chainOf(ALUMINIUM, [coatOf(aluminiumPrimer, { coats: 4 }), coatOf(THIOCYANATE)]))
		).not.toContain('copperOnAluminium');
	});

	test('a barrier that nobody knows is no barrier', () => {
		const unknown = { ...ALUMINIUM, barrierMicrons: null };
		expect(only(chainOf(unknown, [coatOf(COPPER)]), 'copperOnAluminium')).toMatchObject({
			barrierMicrons: null
		});
		const filmless: Sheet = { ...aluminiumPrimer, film: undefined };
		expect(
			only(
				chainOf(ALUMINIUM, [coatOf(filmless, { coats: 9 }), coatOf(COPPER)]),
				'copperOnAluminium'
			)
		).toMatchObject({ barrierMicrons: null });
	});

	test('blasting takes the barrier off', () => {
		const barred = { ...ALUMINIUM, barrierMicrons: 300 };
		const approved: Sheet = { ...COPPER, substrates: ['aluminium'] };
		expect(codesOf(chainOf(barred, [coatOf(approved)]))).not.toContain('copperOnAluminium');
		expect(
			codesOf(chainOf(barred, [stepOf({ kind: 'blast', method: 'none' }), coatOf(approved)]))
		).toContain('copperOnAluminium');
	});

	test('copper-free paint and other hulls have no such warning', () => {
		expect(codesOf(chainOf(ALUMINIUM, [coatOf(COPPER_FREE)]))).not.toContain('copperOnAluminium');
		for (const substrate of ['grp', 'steel', 'timber'] as const)
			expect(
				codesOf(chainOf(faceOf({ substrate, barrierMicrons: 0 }), [coatOf(COPPER)]))
			).not.toContain('copperOnAluminium');
	});

	test('a thicker barrier never adds a warning', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 0, max: 500 }),
				fc.integer({ min: 0, max: 300 }),
				fc.constantFrom(COPPER, THIOCYANATE, { ...COPPER, substrates: ['aluminium' as const] }),
				(microns, more, sheet) => {
					const warns = (barrierMicrons: number): boolean =>
						codesOf(chainOf({ ...ALUMINIUM, barrierMicrons }, [coatOf(sheet)])).includes(
							'copperOnAluminium'
						);
					if (!warns(microns)) expect(warns(microns + more)).toBe(false);
				}
			)
		);
	});

	test('three coats of it are one warning', () => {
		const steps = [coatOf(COPPER), coatOf(COPPER), coatOf(COPPER)];
		expect(
			codesOf(chainOf(ALUMINIUM, steps)).filter((code) => code === 'copperOnAluminium')
		).toHaveLength(1);
	});
});

describe('fittings', () => {
	const withAnode = faceOf({ fittings: [{ kind: 'anode', alloy: 'zinc' }] });

	test('an anode on a face to be coated is told once', () => {
		const steps = [coatOf(epoxyBarrier), coatOf(epoxyBarrier)];
		expect(codesOf(chainOf(withAnode, steps))).toEqual(['anodeUnpainted']);
		expect(codesOf(chainOf(withAnode, [stepOf({ kind: 'wash' })]))).toEqual([]);
	});

	test.each(['anode', 'driveLeg', 'transducer'] as const)(
		'copper paint keeps its distance from %s',
		(kind) => {
			const face = faceOf({
				fittings: [kind === 'anode' ? { kind, alloy: null } : { kind }]
			});
			expect(only(chainOf(face, [coatOf(COPPER)]), 'copperFreeBand')).toMatchObject({
				fitting: kind,
				leastMillimetres: 25,
				mostMillimetres: 50
			});
			expect(codesOf(chainOf(face, [coatOf(COPPER_FREE)]))).not.toContain('copperFreeBand');
		}
	);

	test.each([
		['zinc', 'salt', false],
		['zinc', 'brackish', true],
		['zinc', 'fresh', true],
		['aluminium', 'salt', false],
		['aluminium', 'brackish', false],
		['aluminium', 'fresh', true],
		['magnesium', 'fresh', false],
		['magnesium', 'salt', true]
	] as const)('an anode of %s in %s water', (alloy, water, isWarned) => {
		const face = faceOf({ fittings: [{ kind: 'anode', alloy }] });
		const chain = chainOf(face, [], { water });
		expect(codesOf(chain)).toEqual(isWarned ? ['anodeAlloy'] : []);
		if (isWarned) expect(only(chain, 'anodeAlloy')).toMatchObject({ step: null, alloy, water });
	});

	test('an alloy or water that nobody states says nothing', () => {
		const face = faceOf({ fittings: [{ kind: 'anode', alloy: null }] });
		expect(codesOf(chainOf(face, []))).toEqual([]);
		expect(codesOf(chainOf(withAnode, [], { water: null }))).toEqual([]);
	});
});

describe('bare metal', () => {
	const STEEL = faceOf({ substrate: 'steel', surface: 'unknown' });
	const blast = stepOf({ kind: 'blast', method: 'none' });
	const prime = (minutesSince: number | null, relativeHumidity: number | null) =>
		coatOf(epoxyPrimer, { minutesSince, relativeHumidity });

	test.each([
		[230, 80, false],
		[250, 80, true],
		[250, 50, false],
		[470, 59, false],
		[490, 50, true],
		[250, null, true],
		[null, 50, true]
	])('steel primed %d minutes after blasting at %d %%', (minutes, humidity, isWarned) => {
		const codes = codesOf(chainOf(STEEL, [blast, prime(minutes, humidity)]));
		expect(codes.includes('bareMetal')).toBe(isWarned);
	});

	test('the warning has the wait, the limit and the air', () => {
		expect(only(chainOf(STEEL, [blast, prime(300, 72)]), 'bareMetal')).toEqual({
			code: 'bareMetal',
			step: 1,
			face: 0,
			substrate: 'steel',
			minutes: 300,
			within: 240,
			relativeHumidity: 72
		});
	});

	test('work between, here or on other faces, does not stop the clock', () => {
		const degrease = stepOf({ kind: 'degrease', method: 'none', minutesSince: 30 });
		expect(only(chainOf(STEEL, [blast, degrease, prime(170, 80)]), 'bareMetal')).toMatchObject({
			minutes: 30 + 60 + 170
		});
		const elsewhere = stepOf({ kind: 'fit', faces: [1], minutesSince: 30, durationMinutes: 200 });
		const chain = chainOf(STEEL, [blast, elsewhere, prime(30, 80)]);
		expect(only({ ...chain, faces: [STEEL, faceOf()] }, 'bareMetal')).toMatchObject({
			minutes: 30 + 200 + 30,
			face: 0
		});
	});

	test('metal rubbed again is fresh metal', () => {
		const abrade = stepOf({ kind: 'abrade', method: 'none', minutesSince: 900 });
		expect(codesOf(chainOf(STEEL, [blast, abrade, prime(60, 80)]))).not.toContain('bareMetal');
	});

	test('sanding paint does not lay metal bare, sanding down to it does', () => {
		const abrade = stepOf({ kind: 'abrade', method: 'none' });
		expect(codesOf(chainOf(STEEL, [abrade, prime(900, 80)]))).not.toContain('bareMetal');
		expect(codesOf(chainOf(STEEL, [{ ...abrade, bares: true }, prime(900, 80)]))).toContain(
			'bareMetal'
		);
	});

	test('the second coat has no bare metal under it', () => {
		expect(codesOf(chainOf(STEEL, [blast, prime(60, 50), prime(900, 80)]))).not.toContain(
			'bareMetal'
		);
	});

	test('aluminium and bronze wait less than steel, lead and laminate not at all', () => {
		expect(primeWithin('aluminium', 60)).toBe(240);
		expect(primeWithin('aluminium', 80)).toBe(60);
		expect(primeWithin('casting', null)).toBe(60);
		expect(primeWithin('bronze', 40)).toBe(60);
		expect(primeWithin('lead', 40)).toBeNull();
		expect(primeWithin('grp', 40)).toBeNull();
	});

	test('damper air never gives more time, and unknown air the least', () => {
		fc.assert(
			fc.property(
				fc.constantFrom(...SUBSTRATES),
				fc.double({ min: 0, max: 100, noNaN: true }),
				fc.double({ min: 0, max: 100, noNaN: true }),
				(substrate, a, b) => {
					const [dry, damp] = [Math.min(a, b), Math.max(a, b)];
					const unknown = primeWithin(substrate, null) ?? 0;
					expect(primeWithin(substrate, damp) ?? 0).toBeLessThanOrEqual(
						primeWithin(substrate, dry) ?? 0
					);
					expect(unknown).toBeLessThanOrEqual(primeWithin(substrate, damp) ?? 0);
				}
			)
		);
	});
});

describe('aluminium', () => {
	test('no zinc-rich primer, by its kind or its contents', () => {
		const zincRich: Sheet = { ...epoxyPrimer, type: 'zincRichPrimer', contains: [] };
		const zincDust: Sheet = { ...epoxyPrimer, contains: ['zincDust'] };
		for (const sheet of [zincRich, zincDust])
			expect(codesOf(chainOf(ALUMINIUM, [coatOf(sheet)]))).toContain('zincOnAluminium');
		expect(codesOf(chainOf(ALUMINIUM, [coatOf(aluminiumPrimer)]))).not.toContain('zincOnAluminium');
		expect(codesOf(chainOf(faceOf({ substrate: 'steel' }), [coatOf(zincRich)]))).not.toContain(
			'zincOnAluminium'
		);
	});

	test('its own tools', () => {
		const abrade = stepOf({ kind: 'abrade', method: 'none' });
		expect(codesOf(chainOf(ALUMINIUM, [abrade]))).toEqual(['aluminiumTools']);
		expect(codesOf(chainOf(faceOf({ substrate: 'steel', surface: 'unknown' }), [abrade]))).toEqual(
			[]
		);
	});
});
