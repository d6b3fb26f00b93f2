import { error } from '@sveltejs/kit';
import type { z } from 'zod';
import type { ListPage, PageRequest } from '../../api/list';
import { ApiProblem, invalid } from './problem';

/** Lists are read page by page behind a key: the last item of one page says where the next begins. */

/**
 * The query of a list from an address. Fields left empty, as forms send them, are not asked.
 *
 * @throws {ApiProblem} 400 naming each field that is wrong or not of this list
 */
export function readListQuery<Schema extends z.ZodObject>(url: URL, schema: Schema) {
	const given = [...url.searchParams].filter(([, value]) => value !== '');
	const parsed = schema.safeParse(Object.fromEntries(given));
	if (!parsed.success) throw invalid(parsed.error);
	return parsed.data;
}

/** Runs what tells its problems to programs for a page of ours. */
export async function asPage<Result>(work: () => Promise<Result>): Promise<Result> {
	try {
		return await work();
	} catch (thrown) {
		if (thrown instanceof ApiProblem) error(thrown.status, thrown.message);
		throw thrown;
	}
}

/**
 * The key a cursor holds; null without a cursor.
 *
 * @throws {ApiProblem} 400 for a cursor that is not one of this list
 */
export function keyOfCursor<Key>(cursor: string | undefined, schema: z.ZodType<Key>): Key | null {
	if (cursor === undefined) return null;
	let key: unknown = null;
	try {
		key = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
	} catch {
		// What is no JSON is no key either.
	}
	const parsed = schema.safeParse(key);
	if (parsed.success) return parsed.data;
	throw new ApiProblem(400, 'The cursor is not one of this list: begin again without it.', [
		{ pointer: '/cursor', detail: 'is not one of this list' }
	]);
}

/**
 * A page of rows of which one more than asked was read, to know whether there are more.
 *
 * @param keyOf - where in the list's order a row stands, as its cursor's schema takes it
 */
export function pageOf<Row, Item>(
	rows: readonly Row[],
	{ limit }: PageRequest,
	keyOf: (row: Row) => readonly (string | number)[],
	itemOf: (row: Row) => Item
): ListPage<Item> {
	const shown = rows.slice(0, limit);
	const last = shown.at(-1);
	const next =
		rows.length <= limit || last === undefined
			? null
			: Buffer.from(JSON.stringify(keyOf(last))).toString('base64url');
	return { items: shown.map(itemOf), next };
}
