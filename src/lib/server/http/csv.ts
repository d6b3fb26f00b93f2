import { stringify } from 'csv-stringify/sync';
import type { ListPage, PageRequest } from '../../api/list';
import { behalf, onBehalfOf } from '../db/behalf';

/** Rows read at a time: what a list of any length needs of memory. */
const BATCH = 500;

/** Heading of a column, and what stands in it. */
export type Columns<Item> = Readonly<Record<string, (item: Item) => string | number | Date | null>>;

/** Lines of RFC 4180. What a spreadsheet would take for a formula is led by an apostrophe. */
export function csvLines(cells: readonly (readonly (string | number | Date | null)[])[]): string {
	return stringify(
		cells.map((line) => line.map((cell) => (cell instanceof Date ? cell.toISOString() : cell))),
		// A lone line feed is no end of a line to the library, but to most readers it is.
		{ record_delimiter: 'windows', quoted_match: /[\r\n]/, escape_formulas: true }
	);
}

/** Every item of a list from where the query begins, batch by batch. */
async function* batches<Query extends PageRequest, Item>(
	query: Query,
	page: (query: Query) => Promise<ListPage<Item>>
): AsyncGenerator<Item[]> {
	let next: string | null | undefined = query.cursor;
	do {
		const found: ListPage<Item> = await page({
			...query,
			limit: BATCH,
			cursor: next ?? undefined
		});
		yield found.items;
		next = found.next;
	} while (next !== null);
}

/**
 * A whole list as CSV with a header row, in UTF-8. Read and sent batch by batch as the other side
 * takes it, on behalf of who asks; the first batch is read before anything is answered, so that a
 * wrong request is told as one.
 *
 * @param name - of the file, without its ending
 */
export async function csvResponse<Query extends PageRequest, Item>(
	name: string,
	columns: Columns<Item>,
	query: Query,
	page: (query: Query) => Promise<ListPage<Item>>
): Promise<Response> {
	const { personId } = behalf();
	const rows = batches(query, page);
	const readers = Object.values(columns);
	const lines = (items: readonly Item[]): string =>
		csvLines(items.map((item) => readers.map((read) => read(item))));
	const first = await rows.next();
	const encoder = new TextEncoder();
	const body = new ReadableStream<Uint8Array>({
		start(controller) {
			const items = first.done === true ? [] : first.value;
			controller.enqueue(encoder.encode(csvLines([Object.keys(columns)]) + lines(items)));
		},
		async pull(controller) {
			// A stream is pulled outside of the request that began it.
			const batch = await onBehalfOf(personId, () => rows.next());
			if (batch.done === true) controller.close();
			else controller.enqueue(encoder.encode(lines(batch.value)));
		},
		async cancel() {
			await rows.return(undefined);
		}
	});
	return new Response(body, {
		headers: {
			'content-type': 'text/csv; charset=utf-8; header=present',
			'content-disposition': `attachment; filename="${name}.csv"`,
			'cache-control': 'private, no-store'
		}
	});
}
