import { z } from 'zod';

/** Lists: what is asked of one and how it answers, the same for every list of the API. */

/** The most items that one answer holds, and how many it holds when nothing is said. */
export const MOST_ITEMS = 200;
export const USUAL_ITEMS = 50;

const WHOLE = `must be a whole number from 1 to ${MOST_ITEMS}`;

/** What every list can be asked. */
const LIST_FIELDS = {
	/** Words to look for. */
	q: z.string().trim().max(100, 'has more than 100 characters').optional(),
	limit: z.coerce
		.number(WHOLE)
		.int(WHOLE)
		.min(1, WHOLE)
		.max(MOST_ITEMS, WHOLE)
		.default(USUAL_ITEMS),
	/** `next` of the answer before, as it came. */
	cursor: z.string().max(1000, 'is not one of this list').optional()
};

/** The query of a list with filters of its own. */
export const listQuery = <Filters extends z.ZodRawShape>(filters: Filters) =>
	z.strictObject({ ...LIST_FIELDS, ...filters });

/** The answer of a list. `next` asks for the items after these; null: there are none. */
export const listOf = <Item extends z.ZodType>(item: Item) =>
	z.object({ items: z.array(item), next: z.string().nullable() });

/** An answer of a list of anything. */
export interface ListPage<Item> {
	readonly items: Item[];
	readonly next: string | null;
}

/** What asks for one page of any list. */
export interface PageRequest {
	readonly limit: number;
	readonly cursor?: string | undefined;
}
