import { describe, expect, test } from 'vitest';
import { blockLabel } from '../../../../src/lib/components/batten/label';
import { walk } from '../../../../src/lib/components/batten/walk';
import { at, hoursFixture } from '../../../fixtures/hours';

const hours = hoursFixture();
const { runs } = hours.boats[0].steps[0];
const page = { from: 0, to: hours.slotCount };

describe('keys on a batten', () => {
	const from = at(1, '12:00');
	const key = (name: string, shift = false, slot = from) => walk(name, shift, slot, runs, page);

	test('arrows walk a quarter-hour, and with Shift an hour', () => {
		expect(key('ArrowRight')).toBe(from + 1);
		expect(key('ArrowLeft')).toBe(from - 1);
		expect(key('ArrowUp', true)).toBe(from + 4);
		expect(key('ArrowDown', true)).toBe(from - 4);
	});

	test('Home goes to where this run began and then to the run before, End to the run after', () => {
		expect(key('Home')).toBe(at(1, '09:45'));
		expect(key('Home', false, at(1, '09:45'))).toBe(at(1, '09:15'));
		expect(key('End')).toBe(at(1, '14:15'));
	});

	test('no key leads off the axis', () => {
		expect(key('ArrowLeft', false, 0)).toBe(0);
		expect(key('Home', false, 0)).toBe(0);
		expect(key('ArrowRight', true, 382)).toBe(383);
		expect(key('End', false, 383)).toBe(383);
	});

	test('on a window, the keys keep to the window', () => {
		const window = { from: at(1, '06:00'), to: at(1, '19:00') };
		expect(walk('Home', false, at(1, '06:30'), runs, window)).toBe(window.from);
		expect(walk('End', false, at(1, '16:00'), runs, window)).toBe(window.to - 1);
	});

	test('other keys are left to the page', () => {
		expect(key('Tab')).toBeNull();
		expect(key('a')).toBeNull();
	});
});

describe('the label of a block', () => {
	const block = (left: number, right: number) => ({ left, right, above: 4, height: 15 });
	const room = (outside: 'above' | 'beside' | 'none', width = 1152) => ({ width, outside });

	test('stands inside where it fits with 7 px at each end', () => {
		expect(blockLabel('10:15', block(100, 160), room('above'))).toMatchObject({
			x: 130,
			anchor: 'middle',
			inside: true
		});
	});

	test('stands above in the first row of a boat, 4 px over the block', () => {
		expect(blockLabel('10:15', block(100, 121), room('above'))).toEqual({
			x: 100,
			y: -8,
			anchor: 'start',
			inside: false
		});
	});

	test('stands right of it in the other rows, 7 px off and 3.5 px over the lath', () => {
		expect(blockLabel('10:15', block(100, 121), room('beside'))).toEqual({
			x: 128,
			y: -3.5,
			anchor: 'start',
			inside: false
		});
	});

	test('stands left of it at the right end of the axis', () => {
		expect(blockLabel('22:15', block(1120, 1141), room('beside'))).toMatchObject({
			x: 1113,
			anchor: 'end'
		});
	});

	test('is left to the row’s own label where nothing is free', () => {
		expect(blockLabel('10:15', block(100, 121), room('none'))).toBeNull();
		expect(blockLabel('10:15', block(2, 23), room('beside', 30))).toBeNull();
	});
});
