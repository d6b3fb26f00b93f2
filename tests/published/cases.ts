import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { z } from 'zod';

const scalar = z.union([z.number(), z.string(), z.boolean(), z.null()]);
const field = z.union([scalar, z.array(z.union([scalar, z.array(z.number())]))]);
const caseSchema = z.object({
	inputs: z.record(z.string(), field),
	expected: z.record(z.string(), field),
	tolerance: z.string(),
	note: z.string().nullish(),
	status: z.string(),
	source: z.string()
});
const fileSchema = z.object({ topic: z.string(), cases: z.array(caseSchema) });

/** One published value with where it was read. */
export type PublishedCase = z.infer<typeof caseSchema>;

const fixture = (name: string): URL => new URL(`../fixtures/published/${name}`, import.meta.url);

export function readFixture(name: string): string {
	return readFileSync(fixture(name), 'utf8');
}

/** The number of a case's input or expectation; fails the test where it is none. */
export function num(fields: PublishedCase['inputs'], name: string): number {
	const value = fields[name];
	if (typeof value !== 'number') throw new Error(`${name} of this case is no number`);
	return value;
}

export const has = (fields: PublishedCase['inputs'], ...names: string[]): boolean =>
	names.every((name) => typeof fields[name] === 'number');

/** Within an absolute distance, told with the source when it is not. */
export function near(actual: number, expected: number, tolerance: number, it: PublishedCase): void {
	expect(
		Math.abs(actual - expected),
		`${actual} against ${expected} (${it.source}; ${it.note ?? ''})`
	).toBeLessThanOrEqual(tolerance);
}

/** Every case of a file. */
export function casesOf(file: string): PublishedCase[] {
	return fileSchema.parse(JSON.parse(readFixture(file))).cases;
}

/** What is done with a case: checked, or left out for a reason. */
export type Ruling = (() => void) | string;

/**
 * Rules on every case of a file: each is asserted or left out with its reason, none silently.
 *
 * @param least - how many must be asserted, so that a change cannot leave out more unseen
 */
export function everyCase(
	file: string,
	least: number,
	rule: (it: PublishedCase, index: number) => Ruling
): void {
	const cases = casesOf(file);
	const leftOut: string[] = [];
	let asserted = 0;
	cases.forEach((it, index) => {
		const ruling =
			it.note?.startsWith('SUSPECT') === true ? `suspect: ${it.note}` : rule(it, index);
		if (typeof ruling === 'string') {
			leftOut.push(`${index}: ${ruling}`);
			return;
		}
		asserted++;
		test(`case ${index} of ${file} holds (${it.source.slice(0, 90)})`, ruling);
	});
	test(`${file}: every case is asserted or left out with a reason`, () => {
		expect(asserted + leftOut.length).toBe(cases.length);
		expect(leftOut.every((line) => /: .{8,}/.test(line))).toBe(true);
		expect(asserted).toBeGreaterThanOrEqual(least);
	});
}
