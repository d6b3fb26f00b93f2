import { describe, expect, test } from 'vitest';
import { bandWords } from '../../../../src/lib/components/hours/bandWords';
import { startWords, stepName, stepPlace } from '../../../../src/lib/components/hours/stepWords';
import { USUAL_UNITS } from '../../../../src/lib/units/quantity';
import { at, hoursFixture } from '../../../fixtures/hours';

const hours = hoursFixture();
const [coat] = hours.boats[0].steps;
const [spray, oil] = hours.boats[2].steps;

describe('what stands beside a lath', () => {
	test('faces, and the shelter where there is one', () => {
		expect(stepPlace(coat)).toBe('starboard topsides');
		expect(stepPlace(spray)).toBe('deck, under a tarp');
		expect(stepPlace({ faces: [], shelter: 'heatedTent' })).toBe('in a heated tent');
	});

	test('the batten’s name says boat, step and place', () => {
		expect(stepName('Marigold', coat)).toBe('Marigold, coat 2, starboard topsides');
	});

	test('the start of the day looked at, else the next day’s with its name, else that there is none', () => {
		expect(startWords(coat, 1, hours)).toBe('10:15');
		expect(startWords(oil, 1, hours)).toBe('Thu 17:15');
		expect(startWords(oil, 3, hours)).toBe('no start');
	});
});

describe('the weather of a slot in words', () => {
	test('every number comes with its unit, in the reader’s', () => {
		const words = bandWords(hours.bands, at(3, '06:00'), USUAL_UNITS);
		expect(words).toMatch(
			/^air -?\d+\.\d °C, dew point -?\d+\.\d °C, wind \d+\.\d kn, gust \d+\.\d kn, rain \d\.\d\d mm$/
		);
	});

	test('dew on the hull and sand in the air are said', () => {
		expect(bandWords(hours.bands, at(1, '05:00'), USUAL_UNITS)).toMatch(
			/no rain, dew on the hull$/
		);
		expect(bandWords(hours.bands, at(1, '17:00'), USUAL_UNITS)).toMatch(/, sand$/);
	});

	test('what is missing is named', () => {
		const bands = { ...hours.bands, windGust: hours.bands.windGust.map(() => null) };
		expect(bandWords(bands, 0, USUAL_UNITS)).toContain('no gust');
	});
});
