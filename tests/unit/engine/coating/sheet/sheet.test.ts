import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { HAZARDS } from '../../../../../src/lib/engine/coating/hazards';
import { layingMethodSchema } from '../../../../../src/lib/engine/coating/methodWind';
import { orderedSchema } from '../../../../../src/lib/engine/coating/range';
import { SAMPLE_SHEETS } from '../../../../../src/lib/engine/coating/samples/samples';
import { COATING_TYPES, COATINGS } from '../../../../../src/lib/engine/coating/sheet/coatingTypes';
import { maximumPassedSchema } from '../../../../../src/lib/engine/coating/sheet/maximumPassed';
import { sheetSchema } from '../../../../../src/lib/engine/coating/sheet/sheet';
import {
	isAluminium,
	isMetal,
	SUBSTRATES
} from '../../../../../src/lib/engine/coating/sheet/substrates';
import { TIME_NAMES } from '../../../../../src/lib/engine/coating/times';

const LEAST = {
	name: 'Whimbrel varnish',
	type: 'varnish',
	sample: false,
	hazards: [],
	limits: {},
	times: {}
};
const accepts = (change: Record<string, unknown>): boolean =>
	sheetSchema.safeParse({ ...LEAST, ...change }).success;

describe('sheetSchema', () => {
	test('a tin may be silent about nearly everything', () => {
		expect(sheetSchema.parse(LEAST)).toEqual(LEAST);
	});

	test('keeps “no limit” apart from silence', () => {
		const { times } = sheetSchema.parse({ ...LEAST, times: { overcoatMax: null } });
		expect(times.overcoatMax).toBeNull();
		expect('overcoatMin' in times).toBe(false);
	});

	test('wind is stated by the method that lays, never for none', () => {
		for (const method of layingMethodSchema.options)
			expect(accepts({ wind: { [method]: { wind: 5, gust: 8 } } })).toBe(true);
		expect(accepts({ wind: { none: { wind: 5 } } })).toBe(false);
		expect(accepts({ wind: { brush: { wind: -1 } } })).toBe(false);
	});

	test('a window may be stated toward every kind of coating', () => {
		const pair = { overcoatMin: 60, overcoatMax: null };
		const following = Object.fromEntries(COATING_TYPES.map((type) => [type, pair]));
		expect(accepts({ following })).toBe(true);
		expect(accepts({ following: { gravy: pair } })).toBe(false);
	});

	test.each([
		['2031-02-28', true],
		['2031-02-30', false],
		['28.2.2031', false],
		['', false]
	])('issued on %s', (issuedOn, isDate) => {
		expect(accepts({ issuedOn })).toBe(isDate);
	});

	test('parts have a name and a share, up to four of them', () => {
		const part = { name: 'base', share: 3 };
		const withParts = (...parts: unknown[]) => accepts({ mix: { by: 'volume', parts } });
		expect(withParts(part)).toBe(true);
		expect(withParts(part, part, part, part)).toBe(true);
		expect(withParts(part, part, part, part, part)).toBe(false);
		expect(withParts({ ...part, share: 0 })).toBe(false);
		expect(withParts({ ...part, density: 1200 })).toBe(false);
		expect(withParts({ name: 'base' })).toBe(false);
	});

	test('names no field that the sheet does not know', () => {
		expect(accepts({ colour: 'red' })).toBe(false);
		expect(accepts({ film: { gloss: 80 } })).toBe(false);
	});

	test('every sample comes back from JSON as it was', () => {
		fc.assert(
			fc.property(fc.constantFrom(...Object.values(SAMPLE_SHEETS)), (sheet) => {
				const copy: unknown = JSON.parse(JSON.stringify(sheet));
				expect(sheetSchema.parse(copy)).toEqual(sheet);
			})
		);
	});
});

describe('maximumPassedSchema', () => {
	test.each([
		[{ do: 'abrade' }],
		[{ do: 'abrade', grit: { from: 320, to: 400 }, wet: true }],
		[{ do: 'washAndAbrade', wash: 'freshWater', grit: { from: 80, to: 80 } }],
		[{ do: 'tackCoat', waitMinutes: 240 }],
		[{ do: 'tackCoat', wash: 'detergent', wetFilm: { from: 25, to: 50 }, waitMinutes: 240 }],
		[{ do: 'freshTieCoat' }]
	])('%j is a remedy', (remedy) => {
		expect(maximumPassedSchema.parse(remedy)).toEqual(remedy);
	});

	test.each([
		[{ do: 'hope' }],
		[{ do: 'tackCoat' }],
		[{ do: 'washAndAbrade' }],
		[{ do: 'freshTieCoat', grit: { from: 80, to: 80 } }],
		[{ do: 'abrade', grit: { from: 0, to: 80 } }]
	])('%j is none', (remedy) => {
		expect(maximumPassedSchema.safeParse(remedy).success).toBe(false);
	});
});

describe('orderedSchema', () => {
	test('takes either end, both, or none', () => {
		const schema = orderedSchema(0, 10);
		for (const range of [{}, { min: 3 }, { max: 3 }, { min: 3, max: 3 }, { min: 0, max: 10 }])
			expect(schema.parse(range)).toEqual(range);
	});

	test('names both ends where they are the wrong way about', () => {
		const [issue] = orderedSchema(0, 10).safeParse({ min: 7, max: 4 }).error?.issues ?? [];
		expect(issue).toMatchObject({
			message: 'the least, 7, is above the most, 4',
			params: { code: 'leastOverMost', found: 7, against: 4 }
		});
	});
});

describe('closed lists', () => {
	test('every kind of coating has its traits, and needs only times that exist', () => {
		expect(Object.keys(COATINGS)).toEqual([...COATING_TYPES]);
		for (const { needs } of Object.values(COATINGS))
			for (const name of needs) expect(TIME_NAMES).toContain(name);
	});

	test('antifoulings are soft or hard, and nothing else is', () => {
		const kinds = COATING_TYPES.filter((type) => COATINGS[type].antifouling !== null);
		expect(kinds).toEqual(['erodingAntifouling', 'hardAntifouling']);
	});

	test('what hurts for life comes first among the hazards', () => {
		expect(HAZARDS[0]).toBe('isocyanate');
		expect(HAZARDS.indexOf('biocide')).toBeLessThan(HAZARDS.indexOf('solvent'));
		expect(new Set(HAZARDS).size).toBe(HAZARDS.length);
	});

	test('drive legs are aluminium, and metals are metals', () => {
		expect(SUBSTRATES.filter(isAluminium)).toEqual(['aluminium', 'casting']);
		expect(SUBSTRATES.filter((it) => !isMetal(it))).toEqual(['grp', 'coredGrp', 'timber']);
	});
});
