import { describe, expect, test } from 'vitest';
import {
	freeStandNear,
	nextFreeStand,
	placed,
	scaleLength,
	turnOnPlan
} from '../../../../src/lib/components/ground/plan';

const STANDS = [
	{ id: 'a', name: '1', x: 10, y: 10 },
	{ id: 'b', name: '2', x: 20, y: 10 },
	{ id: 'c', name: '3', x: null, y: null }
];
const BOATS = [{ id: 'boat', name: 'Knot', standId: 'a', heading: 0 }];
const other = { id: 'other', name: 'Ruff', standId: 'b', heading: 0 };

describe('the ground plan', () => {
	test('turns a hull against the way its upper edge looks', () => {
		expect(turnOnPlan(90, 0)).toBe(90);
		expect(turnOnPlan(10, 350)).toBe(20);
		expect(turnOnPlan(350, 10)).toBe(340);
	});

	test('draws stands not placed yet along the lower edge, and says so', () => {
		expect(placed(STANDS).map(({ isPlaced }) => isPlaced)).toEqual([true, true, false]);
		expect(placed(STANDS)[2].y).toBeLessThanOrEqual(10);
	});

	test('catches a hull at the nearest free stand within reach', () => {
		const drawn = placed(STANDS);
		expect(freeStandNear({ x: 19, y: 12 }, drawn, BOATS, 'boat')).toBe('b');
		expect(freeStandNear({ x: 19, y: 12 }, drawn, [...BOATS, other], 'boat')).toBeNull();
		expect(freeStandNear({ x: 60, y: 60 }, drawn, BOATS, 'boat')).toBeNull();
	});

	test('steps round the free stands, past those taken', () => {
		const boats = [...BOATS, other];
		expect(nextFreeStand('a', 1, STANDS, boats, 'boat')).toBe('c');
		expect(nextFreeStand('c', 1, STANDS, boats, 'boat')).toBe('a');
		expect(nextFreeStand(null, -1, STANDS, BOATS, 'boat')).toBe('c');
		expect(nextFreeStand('a', 1, [STANDS[1]], [other], 'boat')).toBe('a');
	});

	test('scales with a round length', () => {
		expect([120, 80, 30, 3000].map(scaleLength)).toEqual([20, 20, 5, 500]);
	});
});
