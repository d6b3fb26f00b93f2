import { describe, expect, test } from 'vitest';
import { cureClock } from '../../src/lib/engine/coating/cure';
import { minutesAt } from '../../src/lib/engine/coating/curve';
import type { TimeTable } from '../../src/lib/engine/coating/times';
import { everyCase, has, near, num, type Ruling } from './cases';

const KELVIN = 273.15;
const SLOTS_PER_HOUR = 4;
const HOUR = 60;

/** A table of an Arrhenius law τ = τ₀·exp(Q(1/T − 1/T₀)), rows every 10 °C. */
function arrhenius(
	activation: number,
	referenceC: number,
	referenceMinutes: number
): Exclude<TimeTable, null> {
	return [-10, 0, 10, 20, 30, 40, 50].map((t): [number, number] => [
		t,
		referenceMinutes * Math.exp(activation * (1 / (t + KELVIN) - 1 / (referenceC + KELVIN)))
	]);
}

/** Hours at the reference temperature that hours at another are worth, by the engine's clock. */
function equivalentHours(
	table: Exclude<TimeTable, null>,
	celsius: number,
	hours: number,
	referenceMinutes: number
): number {
	const temperatures = new Float64Array(hours * SLOTS_PER_HOUR).fill(celsius);
	const clock = cureClock(table, temperatures, 'latest');
	return (clock.progress[temperatures.length] * referenceMinutes) / HOUR;
}

describe('cure clock', () => {
	everyCase('09-cure-maturity.json', 20, (it): Ruling => {
		const { inputs, expected } = it;
		if (inputs.formula === 'exp(13.65-4000/(273+T))' && Array.isArray(inputs.segments_c_days)) {
			const segments = inputs.segments_c_days;
			return () => {
				const [first] = segments;
				if (!Array.isArray(first)) throw new Error('a segment is [°C, days]');
				const [celsius, days] = first;
				// The published constants about their own 273 K: rows of τ = 1 day/exp(13.65 − 4000/(273 + T)).
				const table = [0, 10, 20, 30].map((t): [number, number] => [
					t,
					1440 / Math.exp(13.65 - 4000 / (273 + t))
				]);
				const temperatures = new Float64Array(days * 96).fill(celsius);
				const age = cureClock(table, temperatures, 'earliest').progress[temperatures.length];
				near(
					age,
					num(expected, 'equivalent_age_days'),
					1e-5 * num(expected, 'equivalent_age_days') + 5e-6,
					it
				);
			};
		}
		if (inputs.formula === 'fib MC2010')
			return () => {
				const table = [-10, 0, 5, 10, 20, 25, 40].map((t): [number, number] => [
					t,
					1440 / Math.exp(13.65 - 4000 / (273 + t))
				]);
				near(
					equivalentHours(table, num(inputs, 'temp_c'), 24, 1440),
					num(expected, 'equivalent_hours'),
					1e-3,
					it
				);
			};
		if (has(inputs, 'Q_k'))
			return () => {
				const table = arrhenius(num(inputs, 'Q_k'), num(inputs, 'ref_c'), 600);
				near(
					equivalentHours(table, num(inputs, 'temp_c'), 24, 600),
					num(expected, 'equivalent_hours'),
					1e-3,
					it
				);
			};
		if (has(expected, 'equivalent_Ea_kj_mol'))
			return () => {
				// Two rows a Q10 apart: the slope between them is the activation energy over R.
				const [low, high] = (Array.isArray(inputs.between_c) ? inputs.between_c : []).map(Number);
				const factor = num(inputs, 'q10');
				const table: [number, number][] = [
					[low, factor * 100],
					[high, 100]
				];
				const middle = (low + high) / 2;
				const slope =
					Math.log(minutesAt(table, low, 'earliest') / minutesAt(table, middle, 'earliest')) /
					(1 / (low + KELVIN) - 1 / (middle + KELVIN));
				near((slope * 8.314462618) / 1000, num(expected, 'equivalent_Ea_kj_mol'), 2e-3, it);
			};
		if (has(inputs, 'pot_life_ref_h'))
			return () => {
				// The doubling rule as rows 10 K apart; at a row the table is met exactly, between them the
				// Arrhenius line runs within 1 % of the rule's.
				const [reference, hours] = [num(inputs, 'ref_c'), num(inputs, 'pot_life_ref_h')];
				const table = [-10, 0, 10, 20].map((d): [number, number] => [
					reference + d,
					hours * 60 * 2 ** (-d / 10)
				]);
				near(
					minutesAt(table, num(inputs, 'temp_c'), 'earliest') / 60,
					num(expected, 'pot_life_h'),
					0.01 * num(expected, 'pot_life_h'),
					it
				);
			};
		if (inputs.rule === 'below datum')
			return () => {
				const clock = cureClock(
					[
						[10, 60],
						[20, 30]
					],
					new Float64Array(8).fill(4),
					'earliest'
				);
				near(clock.progress[8], num(expected, 'increment'), 0, it);
			};
		if (has(inputs, 'maturity_c_h'))
			return 'Nurse and Saul’s linear maturity: the engine’s clock is Arrhenius';
		if (has(inputs, 'q10') || has(inputs, 'r1'))
			return 'a Q10 relation the engine does not state; its rows are checked';
		if (inputs.highest_surface_temp_f !== undefined)
			return 'a stepped recoat table: asserted of a sheet typed from it, in sheet.test.ts';
		return 'a rule or limit in words, with no number the clock computes';
	});

	test('constant-temperature rows are met exactly', () => {
		const table: Exclude<TimeTable, null> = [
			[10, 480],
			[20, 240],
			[30, 150]
		];
		for (const [celsius, minutes] of table) {
			const clock = cureClock(table, new Float64Array(96).fill(celsius), 'earliest');
			expect(clock.progress[minutes / 15]).toBeCloseTo(1, 10);
		}
	});
});
