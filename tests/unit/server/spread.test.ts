import { describe, expect, test } from 'vitest';
import { refreshOffsetSeconds } from '../../../src/lib/server/work/spread';

describe('spreading refreshes', () => {
	const offsets = Array.from({ length: 3_000 }, (_, i) => refreshOffsetSeconds(`yard ${i}`));

	test('a yard keeps its minute of the hour', () => {
		expect(refreshOffsetSeconds('yard 7')).toBe(offsets[7]);
	});

	test('yards are even over the first fifty minutes', () => {
		expect(Math.min(...offsets)).toBeGreaterThanOrEqual(0);
		expect(Math.max(...offsets)).toBeLessThan(3_000);
		const tenths = Array.from(
			{ length: 10 },
			(_, i) => offsets.filter((at) => Math.floor(at / 300) === i).length
		);
		for (const count of tenths) expect(Math.abs(count - 300)).toBeLessThan(75);
	});
});
