import { describe, expect, test } from 'vitest';
import { slipOf } from '../../../../../src/lib/engine/outlook/plan/launch';

const at = (text: string): number => Date.parse(text) / 1000;
const WISH = { launchBy: at('2026-05-04T08:00:00Z'), dayRate: 30 };
const cost = (wish: Parameters<typeof slipOf>[0], ready: string) => {
	const { days, cost: money } = slipOf(wish, 'UTC', at(ready));
	return [days, money];
};

describe('what a slip costs', () => {
	test('is every day at the day rate where no rule is stated', () => {
		expect(cost(WISH, '2026-05-07T10:00:00Z')).toEqual([3, 90]);
		expect(cost(WISH, '2026-05-03T10:00:00Z')).toEqual([0, 0]);
	});

	test('leaves the free days out, and never pays back', () => {
		const wish = { ...WISH, slipFreeDays: 2 };
		expect(cost(wish, '2026-05-07T10:00:00Z')).toEqual([3, 30]);
		expect(cost(wish, '2026-05-05T10:00:00Z')).toEqual([1, 0]);
	});

	test('bills each begun week whole', () => {
		const wish = { ...WISH, slipPer: 'week' as const, slipFreeDays: 1 };
		expect(cost(wish, '2026-05-06T10:00:00Z')).toEqual([2, 210]);
		expect(cost(wish, '2026-05-12T10:00:00Z')).toEqual([8, 210]);
		expect(cost(wish, '2026-05-13T10:00:00Z')).toEqual([9, 420]);
	});
});
