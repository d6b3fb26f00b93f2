import { describe, expect, test } from 'vitest';
import { minuteOfDay, readTimeOfDay, timeOfDay } from '../../../src/lib/time/timeOfDay';
import { hoursOutside } from '../../../src/lib/time/weekly';

describe('readTimeOfDay', () => {
	test.each([
		['07:30', '07:30'],
		['7.30', '07:30'],
		['730', '07:30'],
		['7h30', '07:30'],
		[' 18 ', '18:00'],
		['24:00', '00:00']
	])('reads %j as %s', (typed, time) => {
		expect(readTimeOfDay(typed)).toBe(time);
	});

	test.each(['', '25:00', '7:60', '24:01', 'noon', '-1', '12345'])(
		'reads no time in %j',
		(typed) => {
			expect(readTimeOfDay(typed)).toBeNull();
		}
	);
});

test('minutes and times are each other’s', () => {
	expect(minuteOfDay('07:45')).toBe(465);
	expect(timeOfDay(465)).toBe('07:45');
	expect(timeOfDay(1440)).toBe('00:00');
});

describe('hoursOutside', () => {
	test('is the whole week where nothing is taken', () => {
		expect(hoursOutside([])).toEqual([{ days: [1, 2, 3, 4, 5, 6, 7], from: '00:00', to: '00:00' }]);
	});

	test('cuts what runs past midnight out of both days', () => {
		const outside = hoursOutside([{ days: [1, 2, 3, 4, 5, 6, 7], from: '22:00', to: '06:00' }]);
		expect(outside).toEqual([{ days: [1, 2, 3, 4, 5, 6, 7], from: '06:00', to: '22:00' }]);
		expect(hoursOutside([{ days: [1, 2, 3, 4, 5, 6, 7], from: '00:00', to: '00:00' }])).toEqual([]);
	});
});
