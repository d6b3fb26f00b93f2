import fc from 'fast-check';
import { expect, test } from 'vitest';
import { workHoursSchema, type WorkHours } from '../../../src/lib/engine';
import { hoursInBoth } from '../../../src/lib/time/weekly';

const DAY = 1440;
const minutes = (time: string): number => Number(time.slice(0, 2)) * 60 + Number(time.slice(3));

/** Whether a minute of the week lies inside weekly hours, told minute by minute. */
function isInside(hours: WorkHours, minute: number): boolean {
	return hours.some(({ days, from, to }) =>
		days.some((day) => {
			const start = (day - 1) * DAY + minutes(from);
			const length = (minutes(to) - minutes(from) + DAY) % DAY || DAY;
			return (minute - start + 7 * DAY) % (7 * DAY) < length;
		})
	);
}

const time = fc
	.integer({ min: 0, max: 95 })
	.map(
		(quarter) =>
			`${String(Math.floor(quarter / 4)).padStart(2, '0')}:${String((quarter % 4) * 15).padStart(2, '0')}`
	);
const anyHours = fc.array(
	fc.record({
		days: fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1, maxLength: 7 }),
		from: time,
		to: time
	}),
	// As many as a yard and a person say together stay under the engine's bound on entries.
	{ maxLength: 2 }
);

test('hours in both are those inside each, minute for minute, and read as weekly hours', () => {
	fc.assert(
		fc.property(anyHours, anyHours, (a, b) => {
			const both = hoursInBoth(a, b);
			expect(workHoursSchema.safeParse(both).error).toBeUndefined();
			for (let minute = 0; minute < 7 * DAY; minute += 15)
				expect(isInside(both, minute)).toBe(isInside(a, minute) && isInside(b, minute));
		}),
		{ numRuns: 200 }
	);
});

test('a painter who comes later and leaves earlier than the yard', () => {
	const yard: WorkHours = [{ days: [1, 2, 3, 4, 5], from: '07:00', to: '18:00' }];
	const own: WorkHours = [{ days: [1, 6], from: '09:00', to: '13:00' }];
	expect(hoursInBoth(yard, own)).toEqual([{ days: [1], from: '09:00', to: '13:00' }]);
});
