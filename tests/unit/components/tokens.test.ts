import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const css = readFileSync(new URL('../../../src/app.css', import.meta.url), 'utf8');

type Theme = 'light' | 'dark';

/** The tokens as the style sheet gives them: `--name: light-dark(#light, #dark);`. */
const tokens = new Map(
	[...css.matchAll(/--([a-z-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\);/g)].map(
		([, name, light, dark]) => [name, { light, dark }]
	)
);

function luminance(hex: string): number {
	const [r, g, b] = [1, 3, 5].map((at) => {
		const share = parseInt(hex.slice(at, at + 2), 16) / 255;
		return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
	});
	return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Contrast ratio. Source: WCAG 2.2, definitions of relative luminance and contrast ratio. */
function contrast(one: string, other: string, theme: Theme): number {
	const [a, b] = [one, other].map((name) => {
		const token = tokens.get(name);
		if (!token) throw new Error(`no token ${name}`);
		return luminance(token[theme]);
	});
	return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}

const THEMES: readonly Theme[] = ['light', 'dark'];
const each = (pairs: readonly (readonly [string, string])[]) =>
	THEMES.flatMap((theme) => pairs.map(([one, other]) => [theme, one, other] as const));

test('the measure knows that black on white is 21 to 1', () => {
	expect((luminance('#ffffff') + 0.05) / (luminance('#000000') + 0.05)).toBeCloseTo(21, 6);
});

test('every token of the design is there, once, for light and dark', () => {
	const wanted =
		'chalk lath edge rim ink ink-soft paint paint-fill on-paint tape tape-ground oxide signal';
	expect([...tokens.keys()]).toEqual(wanted.split(' '));
	for (const name of tokens.keys())
		expect(css.match(new RegExp(`--${name}:`, 'g'))).toHaveLength(1);
});

describe('text reads, 4.5 to 1 (WCAG 2.2, 1.4.3)', () => {
	test.each(
		each([
			['ink', 'chalk'],
			['ink', 'lath'],
			['ink-soft', 'chalk'],
			['ink-soft', 'lath'],
			['paint', 'chalk'],
			['paint', 'lath'],
			['oxide', 'chalk'],
			['oxide', 'lath'],
			['signal', 'chalk'],
			['signal', 'lath'],
			['on-paint', 'paint'],
			['on-paint', 'paint-fill'],
			['ink', 'tape-ground']
		])
	)('%s: %s on %s', (theme, one, other) => {
		// Rounded to a tenth, as the criterion's own examples are.
		expect(Number(contrast(one, other, theme).toFixed(1))).toBeGreaterThanOrEqual(4.5);
	});
});

describe('numbers a person acts on read at 7 to 1 (WCAG 2.2, 1.4.6)', () => {
	test.each(
		each([
			['ink', 'chalk'],
			['ink', 'lath'],
			['paint', 'chalk']
		])
	)('%s: %s on %s', (theme, one, other) => {
		expect(Number(contrast(one, other, theme).toFixed(1))).toBeGreaterThanOrEqual(7);
	});
});

describe('shapes that mean something stand out, 3 to 1 (WCAG 2.2, 1.4.11)', () => {
	test.each(
		each([
			['rim', 'chalk'],
			['rim', 'lath'],
			['paint-fill', 'lath'],
			['tape', 'tape-ground'],
			['tape', 'lath'],
			['chalk', 'paint-fill'],
			['signal', 'chalk'],
			['signal', 'lath']
		])
	)('%s: %s on %s', (theme, one, other) => {
		expect(contrast(one, other, theme)).toBeGreaterThanOrEqual(3);
	});
});

describe('ratios are the ones the design states, to a tenth', () => {
	test.each([
		['edge', 'chalk', 2.0, 2.2],
		['rim', 'chalk', 4.0, 5.0],
		['ink', 'chalk', 14.3, 14.4],
		['ink-soft', 'chalk', 6.5, 8.6],
		['paint', 'chalk', 7.5, 7.0],
		['paint-fill', 'chalk', 7.5, 4.4],
		['tape', 'chalk', 4.4, 9.0],
		['oxide', 'chalk', 6.9, 7.2],
		['signal', 'chalk', 7.3, 8.6]
	] as const)('%s on %s is %f and %f', (one, other, light, dark) => {
		expect(Math.abs(contrast(one, other, 'light') - light)).toBeLessThanOrEqual(0.1);
		expect(Math.abs(contrast(one, other, 'dark') - dark)).toBeLessThanOrEqual(0.1);
	});
});
