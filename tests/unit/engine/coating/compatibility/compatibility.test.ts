import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compatibilityWarnings } from '../../../../../src/lib/engine/coating/compatibility/compatibility';
import { COMPATIBILITY_RULES } from '../../../../../src/lib/engine/coating/compatibility/rules';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import { COATING_TYPES } from '../../../../../src/lib/engine/coating/sheet/coatingTypes';
import { SUBSTRATES } from '../../../../../src/lib/engine/coating/sheet/substrates';
import { METHODS, STEP_KINDS } from '../../../../../src/lib/engine/vocabulary';
import { chainOf, coatOf, codesOf, faceOf, stepOf } from './chains';

const RULES = Object.entries(COMPATIBILITY_RULES);
const { epoxyPrimer, erodingAntifouling, epoxyBarrier } = SAMPLE_SHEETS;

describe('COMPATIBILITY_RULES', () => {
	test.each(RULES)('%s says what, why and from where', (_, it) => {
		expect(it.what.length).toBeGreaterThan(10);
		expect(it.reason).toMatch(/^[A-Z].*[.:]|:$/s);
		expect(it.source.length).toBeGreaterThan(10);
		expect(it.severity).toBe('warn');
	});

	test('the rule on copper and aluminium cites what speaks against it and forbids nothing', () => {
		const { reason, source } = COMPATIBILITY_RULES.copperOnAluminium;
		expect(source).toContain('Ocean Engineering 109:595–602');
		expect(reason).toContain('no effect');
		for (const [, it] of RULES) expect(it.reason).not.toMatch(/impossible|forbidden/i);
	});
});

describe('compatibilityWarnings', () => {
	test('a sound system on a sound face has none', () => {
		const steps = [
			coatOf(epoxyBarrier),
			coatOf(epoxyBarrier, { minutesSince: 480 }),
			coatOf(erodingAntifouling, { minutesSince: 300 }),
			coatOf(erodingAntifouling, { minutesSince: 700 })
		];
		expect(codesOf(chainOf(faceOf({ surface: 'bare' }), steps))).toEqual([]);
	});

	test('each face is told for itself, in the order of the faces', () => {
		const steel = faceOf({ substrate: 'steel', surface: 'unknown' });
		const aluminium = faceOf({ substrate: 'aluminium', surface: 'unknown', barrierMicrons: 0 });
		const steps = [
			coatOf(erodingAntifouling, { faces: [0, 1] }),
			coatOf(epoxyPrimer, { faces: [0] })
		];
		expect(
			compatibilityWarnings(chainOf(steel, steps, { faces: [steel, aluminium] })).map(
				({ code, face, step }) => [code, face, step]
			)
		).toEqual([
			['unknownPaint', 0, 0],
			['overAntifouling', 0, 1],
			['copperOnAluminium', 1, 0],
			['unknownPaint', 1, 0]
		]);
	});

	test('no steps, no faces, no warnings', () => {
		expect(codesOf(chainOf(faceOf(), []))).toEqual([]);
		expect(codesOf(chainOf(faceOf(), [coatOf(epoxyPrimer)], { faces: [] }))).toEqual([]);
	});

	test('a step on a face that is not there is passed over', () => {
		expect(codesOf(chainOf(faceOf(), [coatOf(epoxyPrimer, { faces: [7, -1] })]))).toEqual([]);
	});

	const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value);
	const chains = fc.record({
		water: fc.constantFrom('salt' as const, 'fresh' as const, null),
		daysAshore: maybe(fc.integer({ min: 0, max: 90 })),
		faces: fc.array(
			fc.record({
				substrate: fc.constantFrom(...SUBSTRATES),
				surface: fc.constantFrom(
					'bare' as const,
					'gelcoat' as const,
					'unknown' as const,
					...COATING_TYPES
				),
				barrierMicrons: maybe(fc.integer({ min: 0, max: 400 })),
				fittings: fc.constantFrom(
					[],
					[{ kind: 'anode' as const, alloy: 'magnesium' as const }],
					[{ kind: 'rubberSeal' as const }, { kind: 'driveLeg' as const }]
				),
				laminateMoisture: maybe(fc.record({ reading: fc.nat(40), dry: fc.nat(40) })),
				woodMoisture: maybe(fc.nat(40))
			}),
			{ minLength: 1, maxLength: 3 }
		),
		steps: fc.array(
			fc.record({
				kind: fc.constantFrom(...STEP_KINDS),
				method: fc.constantFrom(...METHODS),
				sheet: maybe(fc.constantFrom(...Object.values(SAMPLE_SHEETS))),
				coats: fc.integer({ min: 1, max: 6 }),
				faces: fc.uniqueArray(fc.integer({ min: 0, max: 2 }), { maxLength: 3 }),
				bares: fc.boolean(),
				durationMinutes: fc.integer({ min: 15, max: 600 }),
				minutesSince: maybe(fc.integer({ min: 0, max: 20_000 })),
				relativeHumidity: maybe(fc.integer({ min: 0, max: 100 })),
				surfaceTemperature: maybe(fc.integer({ min: -10, max: 50 }))
			}),
			{ maxLength: 6 }
		)
	});

	test('any chain gets warnings that point at its own steps and faces, with no NaN in them', () => {
		fc.assert(
			fc.property(chains, (chain) => {
				for (const warning of compatibilityWarnings(chain)) {
					expect(COMPATIBILITY_RULES[warning.code]).toBeDefined();
					expect(chain.faces[warning.face]).toBeDefined();
					if (warning.step !== null)
						expect(chain.steps[warning.step].faces).toContain(warning.face);
					for (const value of Object.values(warning)) expect(value).not.toBeNaN();
				}
			}),
			{ numRuns: 300 }
		);
	});

	test('what is told once is told once a face', () => {
		fc.assert(
			fc.property(chains, (chain) => {
				const once = compatibilityWarnings(chain)
					.filter(({ code }) => COMPATIBILITY_RULES[code].told === 'once')
					.map(({ code, face }) => `${code} ${face}`);
				expect(new Set(once).size).toBe(once.length);
			})
		);
	});

	test('knowing less never takes a warning of moisture, waiting or barrier away', () => {
		const known = faceOf({
			substrate: 'aluminium',
			surface: 'bare',
			barrierMicrons: 0
		});
		const steps = [
			stepOf({ kind: 'blast', method: 'none' }),
			coatOf(epoxyPrimer, { minutesSince: 600, relativeHumidity: 90 }),
			coatOf(erodingAntifouling)
		];
		const before = codesOf(chainOf(known, steps));
		const after = codesOf(
			chainOf(
				{ ...known, barrierMicrons: null },
				steps.map((step) => ({ ...step, minutesSince: null, relativeHumidity: null }))
			)
		);
		for (const code of before) expect(after).toContain(code);
		expect(before).toContain('bareMetal');
	});
});
