import { describe, expect, test } from 'vitest';
import { checkSheet } from '../../../../../../src/lib/engine/coating/sheet/check/readSheet';
import { findingSentence } from '../../../../../../src/lib/engine/coating/sheet/check/sentence';
import { SAMPLE_SHEETS } from '../../../../../../src/lib/engine/coating/samples/samples';
import { COATINGS } from '../../../../../../src/lib/engine/coating/sheet/coatingTypes';
import type { Sheet } from '../../../../../../src/lib/engine/coating/sheet/sheet';

const SHEET: Sheet = {
	name: 'Knot enamel',
	type: 'onePartEnamel',
	sample: false,
	hazards: [],
	limits: {},
	times: { touchDry: 300, overcoatMin: 1080, overcoatMax: 4320 }
};
const problemsOf = (change: Partial<Sheet>): string[] =>
	checkSheet({ ...SHEET, ...change }).problems.map(findingSentence);
const warningsOf = (change: Partial<Sheet>): string[] =>
	checkSheet({ ...SHEET, ...change }).warnings.map(findingSentence);

describe('hours typed as minutes', () => {
	test('are seen at the row nearest to 20 °C', () => {
		expect(
			problemsOf({
				times: {
					...SHEET.times,
					touchDry: [
						[10, 8],
						[20, 5],
						[30, 3]
					]
				}
			})
		).toEqual([
			'Knot enamel, touch dry, row 2: 5 min is too short for any coating (10 min and more is usual): hours or days typed as minutes?'
		]);
	});

	test.each([
		['overcoatMin', 18],
		['overcoatMax', 72],
		['launchMin', 24],
		['keepDry', 8],
		['dustFree', 1.5]
	] as const)('%s of %d', (name, value) => {
		expect(checkSheet({ ...SHEET, times: { [name]: value } }).problems).toMatchObject([
			{ code: 'hoursAsMinutes', path: ['times', name], found: value }
		]);
	});

	test('every sample typed in hours is refused, but for the quick kinds', () => {
		for (const sheet of Object.values(SAMPLE_SHEETS)) {
			if (COATINGS[sheet.type].quick) continue;
			const { touchDry } = sheet.times;
			if (!Array.isArray(touchDry)) throw new Error('samples have rows');
			const inHours = touchDry.map(([celsius, minutes]): [number, number] => [
				celsius,
				minutes / 60
			]);
			const { problems } = checkSheet({ ...sheet, times: { ...sheet.times, touchDry: inHours } });
			expect(problems[0]?.code).toBe('hoursAsMinutes');
		}
	});

	test('an etch primer may truly take minutes', () => {
		expect(checkSheet(SAMPLE_SHEETS.etchPrimer).problems).toEqual([]);
		const { times } = SAMPLE_SHEETS.etchPrimer;
		expect(checkSheet({ ...SHEET, times }).problems.length).toBeGreaterThan(0);
	});

	test('“at once” is no slip', () => {
		expect(problemsOf({ times: { ...SHEET.times, overcoatMin: 0 } })).toEqual([]);
	});
});

test('minutes typed as hours', () => {
	expect(problemsOf({ times: { ...SHEET.times, potLife: 240 * 60 } })).toEqual([
		'Knot enamel, pot life: 10 days is too long for any coating (up to 4 days is usual): minutes typed as hours?'
	]);
});

describe('Fahrenheit typed as Celsius', () => {
	test('in a table', () => {
		expect(
			problemsOf({
				times: {
					...SHEET.times,
					touchDry: [
						[50, 480],
						[68, 300],
						[86, 180]
					]
				}
			})
		).toEqual([
			'Knot enamel, touch dry, row 1: 50 °C is too hot for work: Fahrenheit? That would be 10 °C.'
		]);
	});

	test('at the hot end of a table that begins cold', () => {
		expect(
			checkSheet({
				...SHEET,
				times: {
					...SHEET.times,
					touchDry: [
						[35, 480],
						[77, 300]
					]
				}
			}).problems
		).toMatchObject([{ code: 'fahrenheitAsCelsius', row: 1, found: 77, against: 25 }]);
	});

	test.each([
		[{ airTemperature: { min: 50 } }, ['limits', 'airTemperature', 'min']],
		[{ airTemperature: { max: 59 } }, ['limits', 'airTemperature', 'max']],
		[{ surfaceTemperature: { min: 50 } }, ['limits', 'surfaceTemperature', 'min']],
		[{ surfaceTemperature: { max: 86 } }, ['limits', 'surfaceTemperature', 'max']],
		[{ curing: { min: 45 } }, ['limits', 'curing', 'min']]
	])('in limits of %j', (limits, path) => {
		expect(checkSheet({ ...SHEET, limits }).problems).toMatchObject([
			{ code: 'fahrenheitAsCelsius', path }
		]);
	});

	test('a hot-climate table of specifications passes', () => {
		expect(
			problemsOf({
				limits: { airTemperature: { max: 43 }, surfaceTemperature: { max: 52 } },
				times: {
					...SHEET.times,
					touchDry: [
						[16, 480],
						[49, 60]
					]
				}
			})
		).toEqual([]);
	});
});

describe('film', () => {
	test.each([
		[
			{ dryFilm: 0.055 },
			'dry film: 0.055 µm is too thin for a film: another unit? That would be 55 µm'
		],
		[{ dryFilm: 2 }, 'dry film: 2 µm is too thin for a film: another unit? That would be 50.8 µm'],
		[{ wetFilm: 4 }, 'wet film: 4 µm is too thin for a film: another unit? That would be 101.6 µm'],
		[{ solids: 0.5 }, 'solids: 0.5 % looks like a fraction: is it 50 %?'],
		[{ loss: { roller: 0.15 } }, 'loss roller: 0.15 % looks like a fraction: is it 15 %?'],
		[{ dryFilm: 90, wetFilm: 50 }, 'wet film: 50 µm wet is thinner than 90 µm dry'],
		[
			{ solids: 50, dryFilm: 50, spreadRate: 25 },
			'spread rate: 25 m²/L, where the film of the sheet gives 10 m²/L'
		],
		[
			{ solids: 50, dryFilm: 50, spreadRate: 4 },
			'spread rate: 4 m²/L, where the film of the sheet gives 10 m²/L'
		],
		[
			{ wetFilm: 100, spreadRate: 400 },
			'spread rate: 400 m²/L, where the film of the sheet gives 10 m²/L'
		]
	])('%j is refused', (film, words) => {
		expect(problemsOf({ film })).toEqual([
			`Knot enamel, ${words}${words.endsWith('?') ? '' : '.'}`
		]);
	});

	test('a thinner typed as a fraction is refused', () => {
		expect(problemsOf({ thinner: { percent: { max: 0.1 } } })).toEqual([
			'Knot enamel, thinner percent most: 0.1 % looks like a fraction: is it 10 %?'
		]);
	});

	test('no loss at all is no fraction', () => {
		expect(problemsOf({ film: { loss: { roller: 0 } } })).toEqual([]);
	});

	test('a spread rate somewhat off the film is a warning', () => {
		expect(warningsOf({ film: { solids: 50, dryFilm: 50, spreadRate: 14 } })).toEqual([
			'Knot enamel, spread rate: 14 m²/L, where the film of the sheet gives 10 m²/L.'
		]);
		expect(warningsOf({ film: { solids: 50, dryFilm: 50, spreadRate: 12 } })).toEqual([]);
	});

	test('a wet film off the dry film and solids is a warning', () => {
		expect(warningsOf({ film: { solids: 50, dryFilm: 50, wetFilm: 160 } })).toEqual([
			'Knot enamel, wet film: 160 µm, where dry film and solids give 100 µm.'
		]);
	});

	test('half a film contradicts nothing', () => {
		expect(checkSheet({ ...SHEET, film: { solids: 50, spreadRate: 400 } })).toEqual({
			problems: [],
			warnings: []
		});
	});
});

describe('rows and limits', () => {
	const hot: Sheet['times'] = {
		...SHEET.times,
		touchDry: [
			[5, 600],
			[10, 480],
			[20, 300],
			[30, 200],
			[35, 150]
		]
	};

	test('a row that the limits never let a face reach is a warning', () => {
		expect(
			warningsOf({ limits: { surfaceTemperature: { min: 10, max: 30 } }, times: hot })
		).toEqual([
			'Knot enamel, touch dry, row 1: 5 °C lies outside the sheet’s own limit of 10 °C.',
			'Knot enamel, touch dry, row 5: 35 °C lies outside the sheet’s own limit of 30 °C.'
		]);
	});

	test('the one row just past a limit carries the curve to it', () => {
		expect(warningsOf({ limits: { surfaceTemperature: { min: 8, max: 32 } }, times: hot })).toEqual(
			[]
		);
	});

	test('a cooler curing minimum keeps the rows down to it', () => {
		expect(
			warningsOf({
				limits: { surfaceTemperature: { min: 10 }, curing: { min: 5 } },
				times: hot
			})
		).toEqual([]);
	});

	test('limits that reach past the rows are a warning', () => {
		expect(
			warningsOf({
				limits: { airTemperature: { min: 0, max: 42 } },
				times: {
					...SHEET.times,
					touchDry: [
						[10, 480],
						[30, 200]
					]
				}
			})
		).toEqual([
			'Knot enamel, touch dry: the sheet allows work at 0 °C, the table ends at 10 °C.',
			'Knot enamel, touch dry: the sheet allows work at 42 °C, the table ends at 30 °C.'
		]);
	});
});
