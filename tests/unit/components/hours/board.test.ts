import { describe, expect, test } from 'vitest';
import { LAYOUTS, wideStart } from '../../../../src/lib/components/hours/board';

const DAY = 96;
const MARGINS = 2 * 24;
const LABELS = 264;

describe('where the wide axis begins', () => {
	test('by day, four days and their labels fill 1440 px between the margins', () => {
		const hours = (4 * DAY - wideStart(4 * DAY, 40)) / 4;
		expect(MARGINS + LABELS + hours * LAYOUTS.wide.pxPerHour).toBe(1440);
	});

	test('four days with an hour more, in autumn, fill as much', () => {
		expect(4 * DAY + 4 - wideStart(4 * DAY + 4, 40)).toBe(4 * DAY - wideStart(4 * DAY, 40));
	});

	test('no hour is left out before it is past', () => {
		expect(wideStart(4 * DAY, 0)).toBe(0);
		expect(wideStart(4 * DAY, 3.9)).toBe(0);
		expect(wideStart(4 * DAY, 4)).toBe(4);
		expect(wideStart(4 * DAY, 9)).toBe(8);
	});

	test('fewer days begin where they begin', () => {
		expect(wideStart(3 * DAY, 40)).toBe(0);
	});
});
