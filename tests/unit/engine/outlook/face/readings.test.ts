import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { withReadings } from '../../../../../src/lib/engine/outlook/face/readings';
import { flagNames } from '../../../../../src/lib/engine/outlook/weather/flags';
import { conditionsOf, HOUR, slotAt, START } from '../flatWeather';

const [face] = conditionsOf();
const at = (hour: number): number => START + hour * HOUR;
/** A reading so much off the model's shaded run, at a whole hour. */
const off = (hour: number, kelvins: number) => ({
	time: at(hour),
	surfaceTemperature: face.surfaceShaded[slotAt(hour)] + kelvins
});
const residual = (readings: ReturnType<typeof off>[], hour: number): number =>
	withReadings(face, readings).surfaceShaded[slotAt(hour)] - face.surfaceShaded[slotAt(hour)];

describe('a face with readings', () => {
	test('meets each reading', () => {
		expect(residual([off(20, 2)], 20)).toBeCloseTo(2, 9);
	});

	test('between readings up to twelve hours apart the residual is linear', () => {
		const readings = [off(20, 2), off(30, -1)];
		expect(residual(readings, 25)).toBeCloseTo(0.5, 9);
		expect(residual([off(20, 2), off(32, 2)], 26)).toBeCloseTo(2, 9);
	});

	test('further apart the nearer one fades, e-folding in six hours', () => {
		const readings = [off(20, 2), off(40, -1)];
		expect(residual(readings, 26)).toBeCloseTo(2 / Math.E, 9);
		expect(residual(readings, 34)).toBeCloseTo(-1 / Math.E, 9);
	});

	test('it fades before the first and after the last', () => {
		expect(residual([off(30, 3)], 24)).toBeCloseTo(3 / Math.E, 9);
		expect(residual([off(30, 3)], 42)).toBeCloseTo(3 / Math.E ** 2, 9);
	});

	test('both runs move, the film does not, and the spread follows', () => {
		const moved = withReadings(face, [off(36, 1.5)]);
		const slot = slotAt(36);
		expect(moved.surfaceSunlit[slot] - face.surfaceSunlit[slot]).toBeCloseTo(1.5, 9);
		expect(moved.film).toBe(face.film);
		expect(moved.spread[slot]).toBeCloseTo(moved.surfaceShaded[slot] - face.dewPoint[slot], 12);
	});

	test('a slot is measured within half an hour of a reading', () => {
		const moved = withReadings(face, [off(36, 1)]);
		const isMeasured = (hour: number): boolean =>
			flagNames(moved.flags[slotAt(hour)]).includes('measured');
		expect([35.25, 35.5, 36, 36.5, 36.75].map(isMeasured)).toEqual([
			false,
			true,
			true,
			true,
			false
		]);
	});

	test('a reading outside the grid changes nothing', () => {
		const late = { time: at(500), surfaceTemperature: 30 };
		expect(withReadings(face, [late])).toBe(face);
		expect(withReadings(face, [])).toBe(face);
	});

	test('the yard’s own bias stands where no reading does', () => {
		const moved = withReadings(face, [off(20, 2)], 0.5);
		expect(moved.surfaceShaded[slotAt(90)] - face.surfaceShaded[slotAt(90)]).toBeCloseTo(0.5, 3);
		expect(moved.surfaceShaded[slotAt(20)] - face.surfaceShaded[slotAt(20)]).toBeCloseTo(2, 9);
	});

	test('the residual never leaves the range of the readings and nought', () => {
		fc.assert(
			fc.property(
				fc.array(
					fc.record({
						hour: fc.integer({ min: 1, max: 94 }),
						kelvins: fc.double({ min: -6, max: 6, noNaN: true })
					}),
					{ minLength: 1, maxLength: 6 }
				),
				(list) => {
					const moved = withReadings(
						face,
						list.map(({ hour, kelvins }) => off(hour, kelvins))
					);
					const all = [0, ...list.map(({ kelvins }) => kelvins)];
					moved.surfaceShaded.forEach((value, i) => {
						const moves = value - face.surfaceShaded[i];
						expect(moves).toBeGreaterThanOrEqual(Math.min(...all) - 1e-9);
						expect(moves).toBeLessThanOrEqual(Math.max(...all) + 1e-9);
					});
				}
			),
			{ numRuns: 60 }
		);
	});
});
