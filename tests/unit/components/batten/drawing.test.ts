import { describe, expect, test } from 'vitest';
import { BATTEN } from '../../../../src/lib/components/batten/measures';
import { pieces } from '../../../../src/lib/components/batten/pieces';
import { tapePath } from '../../../../src/lib/components/batten/tape';
import { tickPaths } from '../../../../src/lib/components/batten/ticks';
import { createAxis } from '../../../../src/lib/components/charts/axis';
import { at, hoursFixture, runs } from '../../../fixtures/hours';

const hours = hoursFixture();
const coating = hours.boats[0].steps[0].runs;

describe('pieces of a batten', () => {
	const wednesday = { from: at(1, '00:00'), to: at(2, '00:00') };

	test('open is painted, tight is taped, and both are cut to the window', () => {
		const laid = pieces(coating, wednesday);
		expect(laid.painted).toEqual([{ from: at(1, '09:45'), to: at(1, '14:15') }]);
		expect(laid.taped).toEqual([
			{ from: at(1, '09:15'), to: at(1, '09:45') },
			{ from: at(1, '14:15'), to: at(1, '14:45') }
		]);
		expect(pieces(coating, { from: at(1, '12:00'), to: at(1, '13:00') }).painted).toEqual([
			{ from: at(1, '12:00'), to: at(1, '13:00') }
		]);
	});

	test('tight for two reasons in a row is one length of tape', () => {
		const twice = runs([
			[
				['00:00', 'tight dew'],
				['06:00', 'tight wind'],
				['09:00', 'shut wind']
			]
		]);
		expect(pieces(twice, { from: 0, to: 96 }).taped).toEqual([{ from: 0, to: at(0, '09:00') }]);
	});

	test('what is missing keeps its name', () => {
		const oil = hours.boats[2].steps[1].runs;
		expect(pieces(oil, { from: at(3, '00:00'), to: at(4, '00:00') }).missing).toEqual([
			expect.objectContaining({ from: at(3, '07:00'), to: at(4, '00:00'), missing: 'dew point' })
		]);
	});
});

describe('ticks', () => {
	const axis = createAxis(hours, 12);
	const count = (path: string) => path.split('M').length - 1;

	test('a day has twenty plain ones and three deep ones, and a notch instead of one at midnight', () => {
		const ticks = tickPaths(axis, BATTEN.list, []);
		expect(count(ticks.bare)).toBe(4 * 20);
		expect(count(ticks.bareDeep)).toBe(4 * 3);
	});

	test('those on paint are cut in another colour, from the run’s first slot to before its end', () => {
		const painted = [{ from: at(1, '10:00'), to: at(1, '13:00') }];
		const ticks = tickPaths(axis, BATTEN.list, painted);
		expect(count(ticks.painted)).toBe(2);
		expect(ticks.paintedDeep).toBe(`M${axis.x(at(1, '12:00'))} 24v-10`);
	});

	test('under 7 px an hour only the deep ones are left', () => {
		const ticks = tickPaths(createAxis(hours, 6), BATTEN.list, []);
		expect(ticks.bare).toBe('');
		expect(count(ticks.bareDeep)).toBe(12);
	});
});

describe('tape', () => {
	const numbers = (path: string) => path.match(/-?\d+(\.\d+)?/g)?.map(Number) ?? [];
	const xs = (path: string) => numbers(path).filter((_, i) => i % 2 === 0);
	const ys = (path: string) => numbers(path).filter((_, i) => i % 2 === 1);
	const torn = { amplitude: 1.5, step: 5 };

	test('its torn ends stay within their amplitude and it stands past the lath', () => {
		const path = tapePath(100, 160, -2, 26, torn, 3);
		expect(Math.min(...xs(path))).toBeGreaterThanOrEqual(98.5);
		expect(Math.max(...xs(path))).toBeLessThanOrEqual(161.5);
		expect([Math.min(...ys(path)), Math.max(...ys(path))]).toEqual([-2, 26]);
		expect(path.endsWith('Z')).toBe(true);
	});

	test('the same tape is torn the same way, and another is not', () => {
		expect(tapePath(0, 60, -2, 26, torn, 3)).toBe(tapePath(0, 60, -2, 26, torn, 3));
		expect(tapePath(0, 60, -2, 26, torn, 3)).not.toBe(tapePath(0, 60, -2, 26, torn, 4));
	});

	test('a length narrower than its teeth does not cross itself', () => {
		const path = tapePath(10, 13, -2, 26, torn, 0);
		const [left, right] = [xs(path).filter((x) => x < 11.5), xs(path).filter((x) => x > 11.5)];
		expect(Math.max(...left)).toBeLessThanOrEqual(11);
		expect(Math.min(...right)).toBeGreaterThanOrEqual(12);
	});
});

test('the batten keeps the measures of the design', () => {
	expect(BATTEN.list).toMatchObject({ height: 24, tapeOver: 2, word: 13.5 });
	expect(BATTEN.phone).toMatchObject({ height: 28, tapeOver: 3, word: 16 });
	expect(BATTEN.chart).toMatchObject({ height: 32, tapeOver: 3, word: 16 });
	expect(BATTEN.first).toMatchObject({ height: 64, tapeOver: 4, word: 17, stripes: 'tape-first' });
	expect(BATTEN.first.grain).toEqual([0.16, 0.34, 0.57, 0.78]);
	expect(BATTEN.list.block).toEqual({ above: 4, height: 15 });
});
