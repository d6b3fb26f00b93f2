import { json } from '@sveltejs/kit';
import type { RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import type { ListPage, PageRequest } from '../../api/list';
import { requireMembership, type Membership, type Permission } from '../access/roles';
import { parts } from '../composition';
import type { Database } from '../db/client';
import { csvResponse, type Columns } from '../http/csv';
import { readListQuery } from '../http/list';
import { api } from '../http/problem';

/** A list of a yard: what it may be asked, who may, how a page is read, what its CSV holds. */
export interface YardList<Schema extends z.ZodObject, Item> {
	/** Of its file. */
	readonly name: string;
	readonly permission: Permission;
	readonly schema: Schema;
	readonly page: (
		db: Database,
		membership: Membership,
		query: z.infer<Schema> & PageRequest
	) => Promise<ListPage<Item>>;
	readonly columns: Columns<Item>;
}

/** Reads the query of a request and who asks. */
async function asked<Schema extends z.ZodObject, Item>(
	list: YardList<Schema, Item>,
	{ locals, params, url }: RequestEvent
) {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '', list.permission);
	return {
		db,
		membership,
		query: readListQuery(url, list.schema) as z.infer<Schema> & PageRequest
	};
}

/** The method that answers a list's page. */
export const listRoute = <Schema extends z.ZodObject, Item>(list: YardList<Schema, Item>) =>
	api(async (event: RequestEvent) => {
		const { db, membership, query } = await asked(list, event);
		return json(await list.page(db, membership, query), {
			headers: { 'cache-control': 'private, no-store' }
		});
	});

/** The method that answers all of a list as CSV. */
export const csvRoute = <Schema extends z.ZodObject, Item>(list: YardList<Schema, Item>) =>
	api(async (event: RequestEvent) => {
		const { db, membership, query } = await asked(list, event);
		return csvResponse(`${membership.yard.slug}-${list.name}`, list.columns, query, (page) =>
			list.page(db, membership, page)
		);
	});
