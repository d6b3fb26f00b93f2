import { describe, expect, test } from 'vitest';
import {
	finding,
	PROBLEM_CODES,
	WARNING_CODES
} from '../../../../../../src/lib/engine/coating/sheet/check/problem';
import { findingSentence } from '../../../../../../src/lib/engine/coating/sheet/check/sentence';

const say = (
	code: (typeof PROBLEM_CODES)[number] | (typeof WARNING_CODES)[number],
	path: (string | number)[],
	details: Parameters<typeof finding>[3] = {}
): string => findingSentence(finding(code, 'Sanderling', path, details));

describe('findingSentence', () => {
	test.each([...PROBLEM_CODES, ...WARNING_CODES])('%s is a sentence with both numbers', (code) => {
		const sentence = say(code, ['times', 'touchDry'], {
			row: 2,
			found: 17,
			against: 23,
			unit: 'min'
		});
		expect(sentence).toMatch(/^Sanderling, touch dry, row 3: .+[.?]$/);
		if (code !== 'missing' && code !== 'silent') expect(sentence).toMatch(/17|23/);
		expect(sentence).not.toMatch(/null|undefined/);
	});

	test('a sheet without a name is “this sheet”', () => {
		expect(findingSentence(finding('missing', '', ['name']))).toBe('This sheet, name: is missing.');
	});

	test.each([
		[['times', 'overcoatMin'], 'overcoat min'],
		[['following', 'hardAntifouling', 'overcoatMax'], 'overcoat max before hard antifouling'],
		[['following', 'varnish'], 'times before varnish'],
		[['following'], 'following'],
		[['times'], 'times'],
		[['limits', 'airTemperature', 'min'], 'air temperature least'],
		[['limits', 'curing', 'min'], 'curing least'],
		[['film', 'wetFilm'], 'wet film'],
		[['mix', 'parts', 1, 'share'], 'mix parts 2 share'],
		[[], 'the sheet']
	])('%j is “%s”', (path, words) => {
		expect(say('missing', path)).toBe(`Sanderling, ${words}: is missing.`);
	});

	test.each([
		[45, '45 min'],
		[119, '119 min'],
		[120, '2 h'],
		[500, '8.333 h'],
		[2879, '47.98 h'],
		[2880, '2 days'],
		[10_080, '7 days'],
		[0, '0 min']
	])('%d minutes read “%s”', (found, words) => {
		expect(say('tooMuch', ['times', 'touchDry'], { found, against: 1, unit: 'min' })).toBe(
			`Sanderling, touch dry: ${words} is over 1 min.`
		);
	});

	test('names the temperature two tables were compared at', () => {
		expect(
			say('maximumUnderMinimum', ['times', 'overcoatMax'], {
				celsius: 12.5,
				found: 60,
				against: 90,
				unit: 'min'
			})
		).toBe(
			'Sanderling, overcoat max: at 12.5 °C, the maximum, 60 min, is under the minimum, 90 min.'
		);
	});
});
