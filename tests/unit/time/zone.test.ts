import { afterEach, describe, expect, test } from 'vitest';
import { slotAt, slotStart, SLOTS_PER_HOUR } from '../../../src/lib/time/slots';
import {
	clock,
	dateAndClock,
	day,
	dayAndClock,
	localHours,
	sameClock,
	weekday
} from '../../../src/lib/time/zone';

const LISBON = 'Europe/Lisbon';

describe('texts in the yard’s zone', () => {
	test('an instant reads as the yard’s clocks show it', () => {
		const instant = '2026-05-13T08:45:00Z';
		expect(clock(instant, LISBON)).toBe('09:45');
		expect(day(instant, LISBON)).toBe('Wed 13');
		expect(dayAndClock(instant, 'Australia/Hobart')).toBe('Wed 18:45');
		expect(dateAndClock(Date.parse(instant), LISBON)).toBe('Wed 13 May, 09:45');
	});

	test('a weekday has its whole name or its first three letters', () => {
		const days = Array.from({ length: 7 }, (_, i) => Date.UTC(2026, 4, 10 + i, 12));
		expect(days.map((it) => weekday(it, LISBON))).toEqual([
			'Sunday',
			'Monday',
			'Tuesday',
			'Wednesday',
			'Thursday',
			'Friday',
			'Saturday'
		]);
		expect(days.map((it) => day(it, LISBON).split(' ')[0])).toEqual([
			'Sun',
			'Mon',
			'Tue',
			'Wed',
			'Thu',
			'Fri',
			'Sat'
		]);
	});

	test('midnight is 00:00 of the day it begins', () => {
		expect(dayAndClock('2026-05-12T23:00:00Z', LISBON)).toBe('Wed 00:00');
	});
});

describe('the reader’s own zone', () => {
	const before = process.env.TZ;
	afterEach(() => {
		if (before === undefined) delete process.env.TZ;
		else process.env.TZ = before;
	});

	test('a time the reader’s clocks leave out in spring is still read right', () => {
		process.env.TZ = 'Europe/Paris';
		// Paris has no 02:30 on this day; the Azores, at UTC then, have.
		expect(new Date(2026, 2, 29, 2, 30).getHours()).toBe(3);
		expect(clock('2026-03-29T02:30:00Z', 'Atlantic/Azores')).toBe('02:30');
	});
});

describe('hours of an axis', () => {
	const hoursOf = (start: string, slots: number, zone: string) =>
		localHours(start, slots, zone).map((it) => it.hour);

	test('an ordinary day has 24, four slots apart', () => {
		const hours = localHours('2026-05-12T23:00:00Z', 96, LISBON);
		expect(hours.map((it) => it.hour)).toEqual([...Array(24).keys()]);
		expect(hours.map((it) => it.slot)).toEqual(
			[...Array(24).keys()].map((it) => it * SLOTS_PER_HOUR)
		);
	});

	test('the spring day has no 01:00 in Lisbon, and the autumn day has it twice', () => {
		expect(hoursOf('2026-03-29T00:00:00Z', 92, LISBON)).toEqual([
			0,
			...Array.from({ length: 22 }, (_, i) => i + 2)
		]);
		expect(hoursOf('2026-10-24T23:00:00Z', 100, LISBON).slice(0, 4)).toEqual([0, 1, 1, 2]);
	});

	test('a zone off the full hour has its hours at its own slots', () => {
		// Nepal is 5 h 45 min ahead.
		expect(localHours('2026-05-12T18:15:00Z', 8, 'Asia/Kathmandu')).toEqual([
			{ slot: 0, hour: 0 },
			{ slot: 4, hour: 1 }
		]);
		expect(localHours('2026-05-12T18:00:00Z', 8, 'Asia/Kathmandu')[0]).toEqual({
			slot: 1,
			hour: 0
		});
	});
});

describe('slots', () => {
	test('a slot begins where it lies', () => {
		const start = '2026-05-12T23:00:00Z';
		expect(new Date(slotStart(start, 39)).toISOString()).toBe('2026-05-13T08:45:00.000Z');
		expect(slotAt(start, slotStart(start, 39))).toBe(39);
		expect(slotAt(start, slotStart(start, 39) + 450_000)).toBe(39.5);
	});
});

describe('whether the reader’s clock is the yard’s', () => {
	test('two names of one clock are the same, an hour apart is not', () => {
		const instant = '2026-05-13T08:45:00Z';
		expect(sameClock(instant, LISBON, 'Europe/London')).toBe(true);
		expect(sameClock(instant, LISBON, 'Europe/Paris')).toBe(false);
	});
});
