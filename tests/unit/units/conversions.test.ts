import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { fromDepth, toDepth } from '../../../src/lib/units/depth';
import { fromSpeed, SPEED_UNITS, toSpeed } from '../../../src/lib/units/speed';
import {
	fromTemperature,
	fromTemperatureDifference,
	toTemperature,
	toTemperatureDifference
} from '../../../src/lib/units/temperature';

// Source: NIST SP 811 (2008), Appendix B, and the exact definitions, as collected in the fixture;
// each case there names its own source and says whether it was verified, derived or from memory.
const published = new URL('../../fixtures/published/10-unit-conversions.json', import.meta.url);

interface PublishedCase {
	inputs: { from_?: string; to?: string; temp_c?: number; nist_sp811_appendix_b_unit?: string };
	expected: { factor?: string; temp_f?: number; factor_to_si?: string };
}
const { cases }: { cases: PublishedCase[] } = JSON.parse(readFileSync(published, 'utf8'));

/** The published factor as a number: "1852/3600 = 0.51444…" is the quotient, so exact. */
function factor(text: string): number {
	const [first] = text.split('=');
	const [above, below] = first.split('/').map(Number);
	return below === undefined ? above : above / below;
}

/** Conversions of this library by the published names. */
const CONVERSIONS: Record<string, (value: number) => number> = {
	'1 kn m/s': () => fromSpeed(1, 'kn'),
	'1 mi/h m/s': () => fromSpeed(1, 'mph'),
	'1 km/h m/s': () => fromSpeed(1, 'km/h'),
	'1 in mm': () => fromDepth(1, 'in'),
	'1 m/s kn': () => toSpeed(1, 'kn'),
	'1 m/s mph': () => toSpeed(1, 'mph')
};

/** Why a published case has no conversion here to be held against. */
const LEFT_OUT: Record<string, string> = {
	'1 nmi m': 'no screen shows distances at sea; the knot is held to it above',
	'1 ft m': 'no screen shows lengths yet',
	'1 mil um': 'no screen shows film thickness yet',
	'10 mil um': 'no screen shows film thickness yet',
	'1 hPa Pa': 'pressure is shown nowhere',
	'1 inHg (conventional) hPa': 'pressure is shown nowhere',
	'29.92 inHg hPa': 'pressure is shown nowhere',
	'1 psi Pa': 'pressure is shown nowhere'
};

const name = (it: PublishedCase) => `${it.inputs.from_} ${it.inputs.to}`;
const factors = cases.filter((it) => it.expected.factor !== undefined);
const temperatures = cases.filter((it) => it.inputs.temp_c !== undefined);

describe('published factors', () => {
	test('every published factor is either met or left out for a stated reason', () => {
		const unaccounted = factors.filter(
			(it) => !(name(it) in CONVERSIONS) && !(name(it) in LEFT_OUT)
		);
		expect(unaccounted.map(name)).toEqual([]);
		expect(Object.keys(CONVERSIONS).every((key) => factors.some((it) => name(it) === key))).toBe(
			true
		);
	});

	test.each(factors.filter((it) => name(it) in CONVERSIONS).map((it) => [name(it), it] as const))(
		'%s is the published factor to every listed digit',
		(key, it) => {
			const wanted = factor(it.expected.factor ?? '');
			expect(Math.abs(CONVERSIONS[key](1) / wanted - 1)).toBeLessThan(1e-12);
		}
	);

	test.each(temperatures.map((it) => [it.inputs.temp_c ?? NaN, it.expected.temp_f ?? NaN]))(
		'%d °C is %d °F',
		(celsius, fahrenheit) => {
			expect(toTemperature(celsius, '°F')).toBeCloseTo(fahrenheit, 10);
			expect(fromTemperature(fahrenheit, '°F')).toBeCloseTo(celsius, 10);
		}
	);

	test('a knot is the printed 5.144444 E-01 m/s and a mile an hour 4.4704 E-01', () => {
		expect(fromSpeed(1, 'kn').toExponential(6)).toBe('5.144444e-1');
		expect(fromSpeed(1, 'mph').toExponential(4)).toBe('4.4704e-1');
	});
});

describe('there and back', () => {
	test.each(SPEED_UNITS)('a speed in %s returns to itself', (unit) => {
		expect(fromSpeed(toSpeed(12.3, unit), unit)).toBeCloseTo(12.3, 12);
	});

	test('a temperature difference knows no 32', () => {
		expect(toTemperatureDifference(3, '°F')).toBeCloseTo(5.4, 12);
		expect(toTemperatureDifference(3, '°C')).toBe(3);
		expect(fromTemperatureDifference(5.4, '°F')).toBeCloseTo(3, 12);
	});

	test('a depth in inches returns to itself', () => {
		expect(fromDepth(toDepth(0.1, 'in'), 'in')).toBeCloseTo(0.1, 12);
		expect(toDepth(25.4, 'in')).toBe(1);
		expect(toDepth(2, 'mm')).toBe(2);
	});
});
