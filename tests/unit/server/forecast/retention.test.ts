import { describe, expect, it } from 'vitest';
import { prunable } from '../../../../src/lib/server/forecast/retention';
import { NOW } from './answers';

const now = new Date(NOW * 1000);
const HOUR_MS = 3_600_000;
const hourly = (from: number, to: number) =>
	Array.from({ length: to - from }, (_, i) => ({
		fetchedAt: new Date(now.getTime() - (from + i) * HOUR_MS)
	}));
const ages = (runs: { fetchedAt: Date }[]) =>
	runs.map(({ fetchedAt }) => (now.getTime() - fetchedAt.getTime()) / HOUR_MS);

describe('prunable', () => {
	it('keeps every run of the last sixty hours', () => {
		expect(prunable(hourly(0, 60), now)).toEqual([]);
	});
	it('keeps one run in six hours up to ten days, and none after', () => {
		const runs = hourly(0, 300);
		const gone = new Set(prunable(runs, now));
		const kept = ages(runs.filter((run) => !gone.has(run)));
		expect(Math.max(...kept)).toBeLessThanOrEqual(240);
		const thinned = kept.filter((age) => age > 60);
		expect(thinned).toHaveLength(30);
		const gaps = thinned.slice(1).map((age, i) => age - (thinned[i] ?? 0));
		expect(Math.max(...gaps)).toBe(6);
	});
	it('never takes the newest, however old: it may be the last good one', () => {
		expect(prunable(hourly(1_000, 1_003), now)).toHaveLength(2);
		expect(ages(prunable(hourly(1_000, 1_003), now))).toEqual([1_001, 1_002]);
	});
	it('finds nothing more the second time', () => {
		const runs = hourly(0, 300);
		const gone = new Set(prunable(runs, now));
		expect(
			prunable(
				runs.filter((run) => !gone.has(run)),
				now
			)
		).toEqual([]);
	});
});
