import { expect, test } from 'vitest';
import { age, duration } from '../../../src/lib/time/spans';

test('an age is rounded down and keeps one unit', () => {
	expect(age(0.4)).toBe('0 min');
	expect(age(59.9)).toBe('59 min');
	expect(age(60)).toBe('1 h');
	expect(age(9 * 60 + 59)).toBe('9 h');
	expect(age(47 * 60)).toBe('47 h');
	expect(age(72 * 60)).toBe('3 days');
	expect(age(-3)).toBe('0 min');
});

test('a duration reads as a yard says it', () => {
	expect(duration(45)).toBe('45 min');
	expect(duration(120)).toBe('2 h');
	expect(duration(105)).toBe('1 h 45');
	expect(duration(125)).toBe('2 h 05');
});
