import { render } from 'svelte/server';
import { describe, expect, test } from 'vitest';
import YardLoading from '../../../../src/lib/components/shell/YardLoading.svelte';

const laths = (html: string): number => html.split('bg-lath').length - 1;
const drawn = (steps: number | null): string =>
	render(YardLoading, { props: { name: 'Samphire Hard', steps } }).body;

describe('a yard that is being fetched', () => {
	test('has as many bare laths as steps are queued there, and says the number', () => {
		expect(laths(drawn(4))).toBe(4);
		expect(drawn(4)).toContain('Finding the hours of Samphire Hard. 4 steps are queued.');
		expect(drawn(1)).toContain('One step is queued.');
	});

	test('stops at a screenful of laths, and still counts', () => {
		expect(laths(drawn(600))).toBe(12);
		expect(drawn(600)).toContain('600 steps are queued.');
	});

	test('with none queued has none', () => {
		expect(laths(drawn(0))).toBe(0);
	});
});
