import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { SAMPLE_SHEETS } from '../../../../../../src/lib/engine/coating/samples/samples';
import {
	checkedSheetSchema,
	checkSheet,
	readSheet
} from '../../../../../../src/lib/engine/coating/sheet/check/readSheet';
import { findingSentence } from '../../../../../../src/lib/engine/coating/sheet/check/sentence';
import type { Sheet } from '../../../../../../src/lib/engine/coating/sheet/sheet';
import { tables } from './arbitraries';

const PRIMER: Sheet = { ...SAMPLE_SHEETS.epoxyPrimer, name: 'Gannet primer' };

/** What reading a sheet with some of it replaced says, as sentences. */
const said = (change: Record<string, unknown>): string[] =>
	readSheet({ ...PRIMER, ...change }).problems.map(findingSentence);
const withTimes = (times: Record<string, unknown>): string[] =>
	said({ times: { ...PRIMER.times, ...times } });

describe('readSheet on samples', () => {
	/** Samples whose tin is silent on purpose. */
	const NAMED: Partial<Record<keyof typeof SAMPLE_SHEETS, string[]>> = {
		etchPrimer: ['silent: potLife']
	};

	test.each(Object.entries(SAMPLE_SHEETS))('%s is read whole', (name, sheet) => {
		const reading = readSheet(sheet);
		expect(reading.problems.map(findingSentence)).toEqual([]);
		expect(reading.sheet).toEqual(sheet);
		const named = Object.entries(NAMED).find(([key]) => key === name)?.[1] ?? [];
		expect(reading.warnings.map(({ code, path }) => `${code}: ${path.slice(1).join('.')}`)).toEqual(
			named
		);
	});

	test('a sheet survives a round trip as JSON', () => {
		const copy: unknown = JSON.parse(JSON.stringify(PRIMER));
		expect(readSheet(copy).sheet).toEqual(PRIMER);
	});
});

describe('readSheet on a wrong shape', () => {
	test.each([
		[null, 'This sheet, the sheet: is nothing; wanted is a group of fields.'],
		[5, 'This sheet, the sheet: is 5; wanted is a group of fields.'],
		['primer', 'This sheet, the sheet: is “primer”; wanted is a group of fields.'],
		[[1, 2], 'This sheet, the sheet: is a list of 2; wanted is a group of fields.']
	])('%j is no sheet', (input, sentence) => {
		const reading = readSheet(input);
		expect(reading.sheet).toBeNull();
		expect(reading.problems.map(findingSentence)).toEqual([sentence]);
	});

	test('every field that must be there is named', () => {
		const { problems } = readSheet({});
		expect(problems.map((it) => it.path.join('.'))).toEqual([
			'name',
			'type',
			'sample',
			'hazards',
			'limits',
			'times'
		]);
		expect(new Set(problems.map((it) => it.code))).toEqual(new Set(['missing']));
	});

	test('a table that does not rise names sheet, table, row and both temperatures', () => {
		const broken = [
			[10, 480],
			[10, 400],
			[20, 240]
		];
		expect(withTimes({ touchDry: broken })).toEqual([
			'Gannet primer, touch dry, row 2: 10 °C does not rise above the row before, 10 °C.'
		]);
		const [problem] = readSheet({
			...PRIMER,
			times: { ...PRIMER.times, touchDry: broken }
		}).problems;
		expect(problem).toMatchObject({
			code: 'notRising',
			sheet: 'Gannet primer',
			path: ['times', 'touchDry'],
			row: 1,
			found: 10,
			against: 10,
			unit: '°C'
		});
	});

	test('every row that does not rise is named', () => {
		expect(
			withTimes({
				touchDry: [
					[30, 480],
					[20, 400],
					[10, 240]
				]
			})
		).toHaveLength(2);
	});

	test.each([
		['x', 'is “x”; wanted is a table of temperatures and times, one time or “no limit”'],
		[true, 'is a boolean; wanted is a table of temperatures and times, one time or “no limit”'],
		[-1, '-1 min is under 0 min'],
		[[], 'is a list of 0; wanted is at least 1 entries'],
		[9e9, '6250000 days is over 3650 days']
	])('a time of %j is refused in its own words', (touchDry, words) => {
		expect(withTimes({ touchDry })).toEqual([`Gannet primer, touch dry: ${words}.`]);
	});

	test.each([
		[[[20]], 'is a list of 1; wanted is at least 2 entries'],
		[[[20, 'a']], 'is “a”; wanted is a number'],
		[[[20, 0]], 'must be more than 0 min'],
		[[[20, null]], 'is nothing; wanted is a number'],
		[['20'], 'is “20”; wanted is a temperature and a time'],
		[[[-50, 60]], '-50 °C is under -40 °C']
	])('a row of %j is refused in its own words', (touchDry, words) => {
		expect(withTimes({ touchDry })).toEqual([`Gannet primer, touch dry, row 1: ${words}.`]);
	});

	test('a time that no sheet has is named', () => {
		expect(withTimes({ drytime: 60 })).toEqual([
			'Gannet primer, times: has no place for “drytime”.'
		]);
	});

	test('times toward the next coat are named with the coat', () => {
		expect(
			said({
				following: { varnish: { overcoatMin: [[20, -4]] }, nextBest: {} }
			})
		).toEqual([
			'Gannet primer, overcoat min before varnish, row 1: -4 min is under 0 min.',
			'Gannet primer, following: has no place for “nextBest”.'
		]);
	});

	test.each([
		[{ relativeHumidity: { max: 120 } }, 'relative humidity most: 120 % is over 100 %'],
		[
			{ surfaceTemperature: { min: 30, max: 10 } },
			'surface temperature: the least, 30, is above the most, 10'
		],
		[
			{ airTemperature: { max: 95 } },
			'air temperature most: 95 °C is too hot for work: Fahrenheit? That would be 35 °C'
		],
		[{ airTemperature: { max: 400 } }, 'air temperature most: 400 °C is over 60 °C'],
		[{ sand: 'some' }, 'sand: is “some”, which is none of: none'],
		[{ mist: true }, 'limits: has no place for “mist”'],
		[{ gust: 12 }, 'gust: is 12; wanted is a group of fields'],
		[{ rainFree: 'yes' }, 'rain free: is “yes”; wanted is yes or no']
	])('limits of %j are refused', (limits, words) => {
		expect(said({ limits })).toEqual([`Gannet primer, ${words}.`]);
	});

	test.each([
		[{ type: 'paint' }, /^Gannet primer, type: is “paint”, which is none of: epoxyPrimer, /],
		[{ film: { solids: 0 } }, /solids: must be more than 0 %\.$/],
		[{ film: { solids: 104 } }, /solids: 104 % is over 100 %\.$/],
		[{ film: { loss: { roller: 95 } } }, /loss roller: 95 % is over 90 %\.$/],
		[{ film: { coats: { min: 3, max: 2 } } }, /coats: the least, 3, is above the most, 2\.$/],
		[{ mix: { by: 'volume', parts: [] } }, /mix parts: is a list of 0; wanted is at least 1/],
		[{ mix: { by: 'weight', parts: [] } }, /mix by: is “weight”, which is none of: volume, mass/],
		[{ issuedOn: 'yesterday' }, /issued on: is “yesterday”; wanted is a date\.$/],
		[{ whenMaximumPassed: { do: 'pray' } }, /when maximum passed do: is “pray”/],
		[{ hazards: ['glitter'] }, /hazards 1: is “glitter”, which is none of: isocyanate/],
		[{ tinLitres: ['a'] }, /tin litres 1: is “a”; wanted is a number/],
		[{ colour: 'red' }, /the sheet: has no place for “colour”\.$/],
		[{ sample: 'yes' }, /sample: is “yes”; wanted is yes or no\.$/]
	])('%j is refused in a sentence', (change, words) => {
		const sentences = said(change);
		expect(sentences.length).toBeGreaterThan(0);
		expect(sentences[0]).toMatch(words);
	});

	test('a name is not repeated without end', () => {
		const { problems } = readSheet({ ...PRIMER, name: 'a'.repeat(10_000) });
		expect(problems.every((it) => findingSentence(it).length < 400)).toBe(true);
		expect(problems[0].code).toBe('wrongType');
	});
});

describe('readSheet on anything at all', () => {
	const TEXT = /^.{1,500}[.?]$/s;
	const holds = (input: unknown): void => {
		const { sheet, problems, warnings } = readSheet(input);
		expect(sheet === null).toBe(problems.length > 0);
		for (const it of [...problems, ...warnings]) {
			expect(findingSentence(it)).toMatch(TEXT);
			expect(findingSentence(it)).not.toMatch(/NaN|undefined|Infinity/);
		}
	};

	test('never throws on JSON and always says something', () => {
		fc.assert(fc.property(fc.jsonValue(), holds), { numRuns: 300 });
	});

	test('never throws on a sheet with any one field replaced by any JSON', () => {
		fc.assert(
			fc.property(
				fc.constantFrom(...Object.values(SAMPLE_SHEETS)),
				fc.constantFrom<[string, ...string[]]>(
					['times'],
					['times', 'touchDry'],
					['times', 'overcoatMax'],
					['limits', 'airTemperature'],
					['limits', 'curing'],
					['film', 'solids'],
					['film', 'dryFilm'],
					['film', 'loss'],
					['following'],
					['following', 'varnish'],
					['mix', 'parts'],
					['thinner'],
					['whenMaximumPassed'],
					['wind', 'brush'],
					['hazards'],
					['__proto__']
				),
				fc.jsonValue(),
				(sheet, [head, ...rest], value) => {
					const copy: Record<string, unknown> = JSON.parse(JSON.stringify(sheet));
					const inner = copy[head];
					copy[head] =
						rest.length === 0
							? value
							: { ...(typeof inner === 'object' ? inner : {}), [rest[0]]: value };
					holds(copy);
				}
			),
			{ numRuns: 600 }
		);
	});

	test('never throws on any tables of times', () => {
		fc.assert(
			fc.property(tables, tables, tables, (touchDry, overcoatMin, overcoatMax) => {
				holds({ ...PRIMER, times: { touchDry, overcoatMin, overcoatMax } });
			})
		);
	});
});

describe('checkedSheetSchema', () => {
	test('carries the same sentence at the place of the table', () => {
		const parsed = checkedSheetSchema.safeParse({
			...PRIMER,
			times: { ...PRIMER.times, overcoatMax: 240 }
		});
		expect(parsed.error?.issues).toHaveLength(1);
		expect(parsed.error?.issues[0]).toMatchObject({
			path: ['times', 'overcoatMax'],
			message:
				'Gannet primer, overcoat max: at 10 °C, the maximum, 4 h, is under the minimum, 16 h.'
		});
	});

	test('lets a sound sheet through', () => {
		expect(checkedSheetSchema.safeParse(PRIMER).data).toEqual(PRIMER);
	});
});

test('a unit that is wrong is told alone, without what follows from its numbers', () => {
	const { problems, warnings } = checkSheet({
		...PRIMER,
		times: { ...PRIMER.times, overcoatMax: [[20, 7]] }
	});
	expect(problems.map((it) => it.code)).toEqual(['hoursAsMinutes']);
	expect(warnings).toEqual([]);
});
