import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { forecastSchema, type Forecast } from '../../../../src/lib/engine';
import {
	HISTORY_SECONDS,
	missingHistory,
	withHistory
} from '../../../../src/lib/server/forecast/history';
import { HOUR } from './answers';

const H0 = Date.UTC(2026, 11, 1, 6) / 1000;
/** A run issued 20 minutes past `H0 + start`, its hours from there on, `value` at all of them. */
function run(start: number, hours: number, value: number, more: Partial<Forecast['hourly']> = {}) {
	const time = Array.from({ length: hours }, (_, i) => H0 + (start + i) * HOUR);
	const series = time.map(() => value);
	return {
		issuedAt: H0 + start * HOUR + 1_200,
		hourly: {
			time,
			temperature: series,
			// The amount before the first stamp is not in the format of a provider without a past.
			precipitation: series.map((v, i) => (i === 0 ? null : v)),
			...more
		}
	};
}
const hourOf = (t: number | undefined) => ((t ?? NaN) - H0) / HOUR;

describe('withHistory', () => {
	it('puts the hours of earlier runs before a run that begins with now', () => {
		const merged = withHistory(run(0, 5, 10), [run(-3, 60, 3), run(-1, 60, 1)]);
		expect(merged.hourly.time.map(hourOf)).toEqual([-3, -2, -1, 0, 1, 2, 3, 4]);
		expect(merged.hourly.temperature).toEqual([3, 3, 1, 10, 10, 10, 10, 10]);
	});

	it('takes an amount from the run before, where the newest cannot have it', () => {
		const merged = withHistory(run(0, 3, 10), [run(-1, 60, 1), run(-2, 60, 2)]);
		// At −1 the run of −1 has no amount, that of −2 has; at 0 that of −1 has.
		expect(merged.hourly.precipitation).toEqual([null, 2, 1, 10, 10]);
	});

	it('never overwrites what the forecast says, or says to be missing later on', () => {
		const own = run(0, 4, 10, { temperature: [10, 10, null, 10] });
		const merged = withHistory(own, [run(-1, 60, 1)]);
		expect(merged.hourly.temperature).toEqual([1, 10, 10, null, 10]);
	});

	it('closes a gap in the past and leaves one in the future', () => {
		const own = run(-4, 10, 10);
		const without = (hour: number) => hourOf(own.hourly.time[hour]);
		expect([without(2), without(7)]).toEqual([-2, 3]);
		const keep = <T>(values: T[]) => values.filter((_, i) => i !== 2 && i !== 7);
		const gappy: Forecast = {
			issuedAt: H0 + 1_200,
			hourly: {
				time: keep(own.hourly.time),
				temperature: keep(own.hourly.temperature),
				precipitation: keep(own.hourly.precipitation)
			}
		};
		const merged = withHistory(gappy, [run(-6, 60, 6)]);
		expect(merged.hourly.time.map(hourOf)).toEqual([-6, -5, -4, -3, -2, -1, 0, 1, 2, 4, 5]);
		expect(merged.hourly.temperature?.slice(3, 6)).toEqual([10, 6, 10]);
	});

	it('does not pass a coarse stretch off as an hour', () => {
		const coarse = {
			issuedAt: H0 - 30 * HOUR,
			hourly: { time: [H0 - 12 * HOUR, H0 - 6 * HOUR], temperature: [5, 5], precipitation: [9, 9] }
		};
		const merged = withHistory(run(0, 3, 10), [coarse]);
		expect(merged.hourly.time.map(hourOf)).toEqual([-12, 0, 1, 2]);
	});

	it('takes no variable that the forecast itself does not carry', () => {
		const earlier = run(-2, 60, 2, { ghi: Array.from({ length: 60 }, () => 300) });
		expect(withHistory(run(0, 3, 10), [earlier]).hourly).not.toHaveProperty('ghi');
	});

	it('gives members the same past', () => {
		const own: Forecast = { ...run(0, 2, 10), members: [{ temperature: [11, 12] }] };
		const merged = withHistory(own, [run(-2, 60, 2)]);
		expect(merged.members).toEqual([{ temperature: [2, 2, 11, 12] }]);
	});

	it('ignores a run that was issued later', () => {
		const later = run(1, 60, 1, { temperature: Array.from({ length: 60 }, () => 99) });
		expect(withHistory(run(0, 3, 10), [later]).hourly.time.map(hourOf)).toEqual([0, 1, 2]);
	});

	it('reaches 48 h back and no further', () => {
		const merged = withHistory(run(0, 3, 10), [run(-60, 120, 6)]);
		expect(H0 - (merged.hourly.time[0] ?? 0)).toBe(HISTORY_SECONDS - HOUR);
		expect(missingHistory(merged)).toEqual([]);
	});

	it('always makes a sound forecast that contains the given one', () => {
		const anyRun = fc
			.tuple(
				fc.integer({ min: -50, max: 0 }),
				fc.integer({ min: 2, max: 80 }),
				fc.integer({ min: -20, max: 30 })
			)
			.map(([start, hours, value]) => run(start, hours, Math.abs(value)));
		fc.assert(
			fc.property(anyRun, fc.array(anyRun, { maxLength: 5 }), (own, earlier) => {
				const merged = withHistory(own, earlier);
				expect(forecastSchema.safeParse(merged).success).toBe(true);
				const at = (t: number) => merged.hourly.time.indexOf(t);
				own.hourly.time.forEach((t, i) =>
					expect(merged.hourly.temperature?.[at(t)]).toBe(own.hourly.temperature[i])
				);
			})
		);
	});
});
