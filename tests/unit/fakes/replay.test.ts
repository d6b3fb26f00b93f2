import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readMeasured } from '../../../fakes/forecast/measured';
import { replay } from '../../../fakes/forecast/replay';
import { NO_NUDGE } from '../../../fakes/forecast/weather';
import { HOUR } from '../server/forecast/answers';

const csv = readFileSync('tests/fixtures/weather/ewr-2013.csv', 'utf8');
const rows = csv.trimEnd().split('\n').length - 1;
const { hours, refused } = readMeasured(csv);
const PLACE = { latitude: 40.69, longitude: -74.17 };
const at = (iso: string) => Date.parse(iso) / 1000;

describe('readMeasured', () => {
	it('refuses the one row with an impossible wind and keeps all others', () => {
		expect(refused).toEqual([{ line: 1011, reason: 'wind_ms is 468.659' }]);
		expect(hours).toHaveLength(rows - 1);
	});
	it('reads a row as it stands', () => {
		// 2013-01-01T06:00:00Z,3.9,-3.3,59.37,270,4.63,,0,1012,16.093,
		expect(hours[0]).toEqual({
			time: at('2013-01-01T06:00:00Z'),
			temperature: 3.9,
			dewPoint: -3.3,
			relativeHumidity: 59.37,
			windDirection: 270,
			windSpeed: 4.63,
			windGust: null,
			precipitation: 0,
			seaLevelPressure: 1012
		});
	});
	const [header = '', first = ''] = csv.split('\n');
	it.each([
		['a time out of order', `${first}\n${first}`, 3, 'is not after the row before it'],
		['a field too few', first.replace(',16.093,', ','), 2, 'has 10 fields, not 11'],
		['a text for a number', first.replace('3.9', 'warm'), 2, 'temp_c is warm'],
		['a half hour', first.replace('06:00', '06:30'), 2, 'has no whole hour']
	])('refuses %s', (_, body, line, reason) => {
		expect(readMeasured(`${header}\n${body}\n`).refused).toEqual([{ line, reason }]);
	});
	it('names a missing column', () => {
		expect(() => readMeasured('utc_time,temp_c\n')).toThrow('no column dew_c');
	});
});

describe('replay', () => {
	const weather = replay(hours, 0);
	it('tells what was measured, and null for what was not', () => {
		expect(weather.hour(at('2013-01-01T06:00:00Z'), PLACE, NO_NUDGE)).toEqual({
			temperature: 3.9,
			dewPoint: -3.3,
			relativeHumidity: 59.37,
			seaLevelPressure: 1012,
			windSpeed: 4.63,
			// Not reported: 1.4 times the mean.
			windGust: expect.closeTo(6.482, 6),
			windDirection: 270,
			precipitation: 0,
			precipitationProbability: null,
			cloudCover: null,
			ghi: null,
			dni: null,
			dhi: null
		});
	});
	it('keeps a reported gust', () => {
		const gusty = hours.find(({ windGust }) => windGust !== null);
		expect(weather.hour(gusty?.time ?? 0, PLACE, NO_NUDGE).windGust).toBe(gusty?.windGust);
	});
	it('has nothing at the refused hour, in a gap or after the end', () => {
		const known = new Set(hours.map(({ time }) => time));
		const [start = 0, end = 0] = [hours[0]?.time, hours.at(-1)?.time];
		const gaps: number[] = [];
		for (let t = start; t <= end + HOUR; t += HOUR) if (!known.has(t)) gaps.push(t);
		expect(gaps.length).toBeGreaterThan(17);
		for (const t of gaps)
			expect(Object.values(weather.hour(t, PLACE, NO_NUDGE)).every((v) => v === null)).toBe(true);
	});
	it('can stand on other days, by whole hours', () => {
		const shift = 365 * 24 * HOUR;
		const moved = replay(hours, shift);
		expect(moved.hour(at('2014-01-01T06:00:00Z'), PLACE, NO_NUDGE).temperature).toBe(3.9);
		expect(() => replay(hours, 1_800)).toThrow('whole hours');
	});
	it('nudges members around the measured value, and leaves null alone', () => {
		const nudge = { ...NO_NUDGE, temperature: 1, dewPoint: 9, wind: 2 };
		const hour = weather.hour(at('2013-01-01T06:00:00Z'), PLACE, nudge);
		expect(hour).toMatchObject({
			temperature: 4.9,
			dewPoint: 4.9,
			windSpeed: 9.26,
			cloudCover: null
		});
	});
});
