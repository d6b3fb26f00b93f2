import { expect, test } from 'vitest';
import { ReadingLine } from '../../../../src/lib/components/charts/readingLine.svelte';

test('the pointer takes along what it only hovers over', () => {
	const line = new ReadingLine();
	line.pass(40);
	expect([line.slot, line.held]).toEqual([40, false]);
	line.leave();
	expect(line.slot).toBeNull();
});

test('what the keys hold stays when the pointer leaves, until it is dropped', () => {
	const line = new ReadingLine();
	line.hold(40);
	line.leave();
	expect([line.slot, line.held]).toEqual([40, true]);
	line.drop();
	expect([line.slot, line.held]).toEqual([null, false]);
});
