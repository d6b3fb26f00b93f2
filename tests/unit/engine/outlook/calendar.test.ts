import { describe, expect, test } from 'vitest';
import {
	daylightMask,
	localDate,
	localDays,
	nights,
	workMask
} from '../../../../src/lib/engine/outlook/weather/calendar';
import { SITE } from './flatWeather';

const epoch = (text: string): number => Date.parse(text) / 1000;

const marked = (mask: Uint8Array): number => mask.reduce((a, b) => a + b, 0);

describe('local days', () => {
	test('the spring change makes a day of 92 slots and the autumn one of 100', () => {
		const spring = localDays('Europe/Lisbon', epoch('2026-03-28T12:00:00Z'), 3);
		expect(spring.map(({ date, slots }) => [date, slots])).toEqual([
			['2026-03-28', 96],
			['2026-03-29', 92],
			['2026-03-30', 96]
		]);
		const autumn = localDays('Europe/Lisbon', epoch('2026-10-25T12:00:00Z'), 1);
		expect(autumn[0]).toEqual({
			date: '2026-10-25',
			start: epoch('2026-10-24T23:00:00Z'),
			slots: 100
		});
	});

	test.each([
		['America/Santiago', '2026-09-05T12:00:00Z', '2026-09-06T04:00:00Z'],
		['Africa/Cairo', '2026-04-23T12:00:00Z', '2026-04-23T22:00:00Z'],
		['America/Havana', '2026-03-07T12:00:00Z', '2026-03-08T05:00:00Z']
	])('where the clock jumps over midnight (%s) the day begins as it jumps', (zone, from, jump) => {
		const [before, after] = localDays(zone, epoch(from), 2);
		expect(before.slots).toBe(96);
		expect(after.slots).toBe(92);
		expect(after.start).toBe(epoch(jump));
		expect(localDate(zone, after.start)).toBe(after.date);
		// Work from midnight begins with the day too, not an hour before it.
		const grid = { start: before.start, count: 96 + 92 };
		const { length } = workMask(
			zone,
			[{ days: [new Date(after.date).getUTCDay() || 7], from: '00:00', to: '08:00' }],
			undefined,
			grid
		).filter((it) => it === 1);
		expect(length).toBe(7 * 4);
	});

	test('dates do not depend on the zone this process runs in', () => {
		const before = process.env.TZ;
		process.env.TZ = 'Europe/Paris';
		// 29 March 2026, 01:30 UTC: clocks spring forward in Paris at 01:00 UTC.
		const date = localDate('America/New_York', epoch('2026-03-29T04:30:00Z'));
		process.env.TZ = before;
		expect(date).toBe('2026-03-29');
		expect(localDate('Pacific/Auckland', epoch('2026-03-29T11:30:00Z'))).toBe('2026-03-30');
	});

	test('days follow each other without a gap, in zones off the hour too', () => {
		for (const zone of [
			'Europe/Lisbon',
			'Asia/Kathmandu',
			'Australia/Lord_Howe',
			'America/St_Johns'
		]) {
			const days = localDays(zone, epoch('2026-04-03T00:00:00Z'), 8);
			days
				.slice(1)
				.forEach((day, i) => expect(day.start).toBe(days[i].start + days[i].slots * 900));
		}
	});
});

describe('work hours', () => {
	const grid = { start: epoch('2026-03-29T00:00:00Z'), count: 96 };

	test('on the day of a change they stay at the clock’s times', () => {
		const mask = workMask(
			'Europe/Lisbon',
			[{ days: [7], from: '08:00', to: '12:00' }],
			undefined,
			grid
		);
		// 08:00 is 07:00 UTC once summer time has come.
		expect(mask[28]).toBe(1);
		expect(mask[27]).toBe(0);
		expect(marked(mask)).toBe(16);
	});

	test('hours from before the change run shorter by the hour that is missing', () => {
		const mask = workMask(
			'Europe/Lisbon',
			[{ days: [7], from: '00:00', to: '06:00' }],
			undefined,
			grid
		);
		expect(marked(mask)).toBe(20);
	});

	test('a slot that an entry does not fill is out, and entries that meet are one', () => {
		const part = workMask('UTC', [{ days: [7], from: '08:05', to: '08:40' }], undefined, grid);
		expect(marked(part)).toBe(1);
		const joined = workMask(
			'UTC',
			[
				{ days: [7], from: '08:00', to: '08:50' },
				{ days: [7], from: '08:50', to: '09:15' }
			],
			undefined,
			grid
		);
		expect(marked(joined)).toBe(5);
	});
});

describe('spans closed', () => {
	const grid = { start: epoch('2026-05-04T00:00:00Z'), count: 96 };
	const at = (hour: number) => grid.start + hour * 3600;

	test('take away every slot they touch, from work hours and from all hours', () => {
		const touched = [{ from: at(8) + 60, to: at(9) + 60 }];
		expect(marked(workMask('UTC', undefined, touched, grid))).toBe(96 - 5);
		const worked = workMask('UTC', [{ days: [1], from: '08:00', to: '10:00' }], touched, grid);
		expect(marked(worked)).toBe(3);
	});

	test('before, past or at the edges of the grid take nothing they do not touch', () => {
		const spans = [
			{ from: at(-5), to: at(0) },
			{ from: at(24), to: at(30) },
			{ from: at(23), to: at(40) }
		];
		expect(marked(workMask('UTC', undefined, spans, grid))).toBe(92);
	});
});

describe('day and night', () => {
	test('daylight is inside sunrise and sunset, and civil night outside both', () => {
		const start = epoch('2026-05-04T00:00:00Z');
		const mask = daylightMask(SITE, { start, count: 96 });
		const dark = nights(SITE, start, start + 86_400);
		expect(mask[48]).toBe(1);
		expect(mask[0]).toBe(0);
		expect(dark.length).toBe(2);
		const first = mask.indexOf(1) * 900 + start;
		expect(first).toBeGreaterThan(dark[0].to);
	});

	test('beyond the polar circle there may be no day, or no night', () => {
		const north = { latitude: 78, longitude: 15 };
		const winter = epoch('2026-01-03T00:00:00Z');
		const summer = epoch('2026-06-21T00:00:00Z');
		expect(daylightMask(north, { start: winter, count: 96 }).includes(1)).toBe(false);
		expect(daylightMask(north, { start: summer, count: 96 }).includes(0)).toBe(false);
		expect(nights(north, summer, summer + 86_400)).toEqual([]);
	});
});
