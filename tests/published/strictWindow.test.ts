import { describe, expect, test } from 'vitest';
import { strictVerdict } from '../../src/lib/engine/coating/strictWindow';
import { PU_OVER_PU } from '../fixtures/published/strictBands';
import { casesOf, num } from './cases';

const SLOTS = 400;
const SLOTS_PER_HOUR = 4;

describe('the recoat window read from the highest surface temperature (UFGS 09971)', () => {
	const cases = casesOf('09-cure-maturity.json').filter(
		({ inputs }) => inputs.coat === 'polyurethane over polyurethane'
	);

	test('four bands are published', () => {
		expect(cases).toHaveLength(4);
	});

	test.each(cases.map((it) => [String(it.inputs.highest_surface_temp_f), it] as const))(
		'%s °F',
		(_, { inputs, expected }) => {
			const band = inputs.highest_surface_temp_f;
			if (!Array.isArray(band)) throw new Error('a band has two ends');
			const least = num(expected, 'recoat_min_h');
			const most = num(expected, 'recoat_max_h');
			for (const fahrenheit of band) {
				const celsius = ((Number(fahrenheit) - 32) * 5) / 9;
				const surface = new Float64Array(SLOTS).fill(celsius);
				// A coat of no length, so that both strokes are one.
				const verdict = (slots: number) =>
					strictVerdict(
						PU_OVER_PU,
						surface,
						{ start: 0, finish: 0 },
						{ start: slots, finish: slots }
					);
				expect(verdict(least * SLOTS_PER_HOUR - 1)).toBe('early');
				expect(verdict(least * SLOTS_PER_HOUR)).toBe('inside');
				expect(verdict(most * SLOTS_PER_HOUR)).toBe('inside');
				expect(verdict(most * SLOTS_PER_HOUR + 1)).toBe('late');
			}
		}
	);
});
