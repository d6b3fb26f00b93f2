import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { listQuery } from '../../../../src/lib/api/list';
import { onBehalfOf, behalf } from '../../../../src/lib/server/db/behalf';
import { csvLines, csvResponse } from '../../../../src/lib/server/http/csv';
import { keyOfCursor, pageOf, readListQuery } from '../../../../src/lib/server/http/list';
import { ApiProblem } from '../../../../src/lib/server/http/problem';

const KEY = z.tuple([z.string(), z.number()]);
const at = (query: string): URL => new URL(`http://yard.example/list?${query}`);
const problemOf = (work: () => unknown): ApiProblem => {
	try {
		work();
	} catch (thrown) {
		if (thrown instanceof ApiProblem) return thrown;
	}
	throw new Error('nothing was refused');
};

describe('readListQuery', () => {
	const schema = listQuery({ state: z.enum(['queued', 'done']).optional() });

	test('takes fifty items where nothing is said, and leaves out empty fields', () => {
		expect(readListQuery(at('q=&state='), schema)).toEqual({ limit: 50 });
	});
	test('refuses more than two hundred items, naming the field', () => {
		const { status, errors } = problemOf(() => readListQuery(at('limit=201'), schema));
		expect(status).toBe(400);
		expect(errors).toEqual([{ pointer: '/limit', detail: 'must be a whole number from 1 to 200' }]);
	});
	test('refuses a field that is not of the list', () => {
		expect(problemOf(() => readListQuery(at('page=2'), schema)).errors?.[0]?.pointer).toBe('/page');
	});
});

describe('cursors', () => {
	const rows = [
		{ name: 'Ä', id: 1 },
		{ name: 'b', id: 2 },
		{ name: 'c', id: 3 }
	];
	const keyOf = ({ name, id }: { name: string; id: number }) => [name, id];

	test('the next page begins after the last item shown', () => {
		const page = pageOf(rows, { limit: 2 }, keyOf, ({ id }) => id);
		expect(page.items).toEqual([1, 2]);
		expect(keyOfCursor(page.next ?? '', KEY)).toEqual(['b', 2]);
	});
	test('a page that holds the last item has none after it', () => {
		expect(pageOf(rows, { limit: 3 }, keyOf, ({ id }) => id).next).toBeNull();
	});
	test.each(['nonsense', Buffer.from('["b"]').toString('base64url'), ''])(
		'%j is refused',
		(cursor) => {
			expect(problemOf(() => keyOfCursor(cursor, KEY)).status).toBe(400);
		}
	);
});

describe('csvLines', () => {
	test('quotes commas, quotes and line breaks, and ends lines with CR LF', () => {
		expect(csvLines([['a,b', 'say "now"', 'two\nlines', null, 1.5]])).toBe(
			'"a,b","say ""now""","two\nlines",,1.5\r\n'
		);
	});
	test.each(['=1+1', '+1', '-x', '@sum'])('%s is no formula', (text) => {
		expect(csvLines([[text]])).toBe(`'${text}\r\n`);
	});
	test('numbers below zero stay numbers', () => {
		expect(csvLines([[-2.5]])).toBe('-2.5\r\n');
	});
});

describe('csvResponse', () => {
	/** A list of a million, which tells how far it was read and on whose behalf. */
	const longList = () => {
		const read: (string | null)[] = [];
		const page = ({ limit, cursor }: { limit: number; cursor?: string | undefined }) => {
			read.push(behalf().personId);
			const from = Number(cursor ?? 0);
			return Promise.resolve({
				items: Array.from({ length: limit }, (_, i) => from + i),
				next: from + limit >= 1_000_000 ? null : String(from + limit)
			});
		};
		return { read, page };
	};
	const answer = (page: ReturnType<typeof longList>['page']) =>
		onBehalfOf('person', () => csvResponse('n', { n: (n: number) => n }, { limit: 50 }, page));

	test('reads no further than the other side takes, for who asked', async () => {
		const { read, page } = longList();
		const reader = ((await answer(page)).body as ReadableStream<Uint8Array>).getReader();
		for (let chunk = 0; chunk < 3; chunk++) await reader.read();
		await reader.cancel();
		expect(read.length).toBeGreaterThanOrEqual(3);
		expect(read.length).toBeLessThanOrEqual(5);
		expect(new Set(read)).toEqual(new Set(['person']));
	});
	test('holds every item once, under its header', async () => {
		const { page } = longList();
		const lines = (await (await answer(page)).text()).split('\r\n');
		expect(lines.length).toBe(1_000_002);
		expect(lines.slice(0, 2)).toEqual(['n', '0']);
		expect(lines.at(-2)).toBe('999999');
	});
});
