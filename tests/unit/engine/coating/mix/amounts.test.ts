import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { mixAmounts } from '../../../../../src/lib/engine/coating/mix/amounts';
import type { MixRatio } from '../../../../../src/lib/engine/coating/sheet/mixRatio';
import { errorOf, valueOf } from './value';

const BY_VOLUME: MixRatio = {
	by: 'volume',
	parts: [
		{ name: 'base', share: 3, density: 1.4 },
		{ name: 'hardener', share: 1, density: 0.9 }
	]
};
const BY_MASS: MixRatio = {
	by: 'mass',
	parts: [
		{ name: 'resin', share: 100, density: 1.15 },
		{ name: 'hardener', share: 30, density: 1 }
	]
};
const without = (mix: MixRatio): MixRatio => ({
	...mix,
	parts: mix.parts.map(({ name, share }) => ({ name, share }))
});

describe('mixAmounts', () => {
	test('three to one by volume of two litres', () => {
		expect(valueOf(mixAmounts(without(BY_VOLUME), { litres: 2 }))).toEqual({
			parts: [
				{ name: 'base', litres: 1.5, kilograms: null },
				{ name: 'hardener', litres: 0.5, kilograms: null }
			],
			litres: 2,
			kilograms: null
		});
	});

	test('with densities the scale can be used too', () => {
		const { parts, kilograms } = valueOf(mixAmounts(BY_VOLUME, { litres: 2 }));
		expect(parts[0].kilograms).toBeCloseTo(2.1, 12);
		expect(parts[1].kilograms).toBeCloseTo(0.45, 12);
		expect(kilograms).toBeCloseTo(2.55, 12);
	});

	test('a ratio by mass of so many litres goes by the parts’ own volumes', () => {
		const { parts, litres } = valueOf(mixAmounts(BY_MASS, { litres: 1 }));
		// 100/1.15 = 86.957 volumes of resin to 30 of hardener.
		expect(parts[0].litres).toBeCloseTo(86.9565 / 116.9565, 5);
		expect(parts[1].litres).toBeCloseTo(30 / 116.9565, 5);
		expect(litres).toBeCloseTo(1, 12);
		expect((parts[0].kilograms ?? NaN) / (parts[1].kilograms ?? NaN)).toBeCloseTo(100 / 30, 12);
	});

	test('a ratio by mass of so many kilograms needs no density', () => {
		const { parts, litres, kilograms } = valueOf(mixAmounts(without(BY_MASS), { kilograms: 1.3 }));
		expect(parts.map((part) => part.kilograms)).toEqual([
			expect.closeTo(1, 12),
			expect.closeTo(0.3, 12)
		]);
		expect(litres).toBeNull();
		expect(kilograms).toBeCloseTo(1.3, 12);
	});

	test('without a density that it takes, the part is named', () => {
		expect(errorOf(mixAmounts(without(BY_MASS), { litres: 1 }))).toEqual({
			code: 'densityMissing',
			part: 'resin'
		});
		const half: MixRatio = { ...BY_MASS, parts: [BY_MASS.parts[0], { name: 'fast', share: 30 }] };
		expect(errorOf(mixAmounts(half, { litres: 1 }))).toEqual({
			code: 'densityMissing',
			part: 'fast'
		});
		expect(errorOf(mixAmounts(without(BY_VOLUME), { kilograms: 1 })).code).toBe('densityMissing');
	});

	test.each([NaN, -1, Infinity])('%d of it cannot be mixed', (litres) => {
		expect(errorOf(mixAmounts(BY_VOLUME, { litres }))).toEqual({
			code: 'outOfRange',
			field: 'total',
			found: litres
		});
	});

	const part = fc.record({
		name: fc.constantFrom('base', 'hardener', 'accelerator'),
		share: fc.double({ min: 0.01, max: 1000, noNaN: true }),
		density: fc.double({ min: 0.5, max: 5, noNaN: true })
	});
	const mixes = fc.record({
		by: fc.constantFrom('volume' as const, 'mass' as const),
		parts: fc.array(part, { minLength: 1, maxLength: 4 })
	});

	test('the parts add up to the whole, in litres and in kilograms', () => {
		fc.assert(
			fc.property(
				mixes,
				fc.double({ min: 0, max: 500, noNaN: true }),
				fc.boolean(),
				(mix, wanted, isLitres) => {
					const total = isLitres ? { litres: wanted } : { kilograms: wanted };
					const amounts = valueOf(mixAmounts(mix, total));
					const sum = (unit: 'litres' | 'kilograms'): number =>
						amounts.parts.reduce((all, it) => all + (it[unit] ?? NaN), 0);
					expect(isLitres ? sum('litres') : sum('kilograms')).toBeCloseTo(wanted, 8);
					expect(amounts.litres).toBeCloseTo(sum('litres'), 8);
					expect(amounts.kilograms).toBeCloseTo(sum('kilograms'), 8);
				}
			)
		);
	});

	test('the ratio of the tin is kept, and each part weighs what it measures', () => {
		fc.assert(
			fc.property(mixes, fc.double({ min: 0.01, max: 500, noNaN: true }), (mix, litres) => {
				const { parts } = valueOf(mixAmounts(mix, { litres }));
				parts.forEach((it, i) => {
					const { share, density } = mix.parts[i];
					const unit = mix.by === 'volume' ? it.litres : it.kilograms;
					const first = mix.by === 'volume' ? parts[0].litres : parts[0].kilograms;
					expect((unit ?? NaN) / (first ?? NaN)).toBeCloseTo(share / mix.parts[0].share, 6);
					const ratio = (it.kilograms ?? NaN) / (it.litres ?? NaN);
					expect(ratio).toBeCloseTo(density, 6);
				});
			})
		);
	});
});
