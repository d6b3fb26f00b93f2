import { and, desc, eq, getTableName, type InferInsertModel } from 'drizzle-orm';
import type { PgColumn, PgTable } from 'drizzle-orm/pg-core';
import type { Writer } from '../mail/outbox';
import { changes } from './schema';

type Counted = PgTable & { id: PgColumn; revision: PgColumn };

/** What became of a change: somebody else's came first, or the row is not there (any more). */
export type ChangeResult =
	| { readonly outcome: 'changed' }
	| { readonly outcome: 'stale'; readonly revision: number; readonly why: string }
	| { readonly outcome: 'gone' };

/**
 * Changes a row as its reader saw it. The caller has made sure that the row is theirs to change.
 *
 * @param revision - the one they had before them
 * @returns `stale` with the revision there is now and a sentence, where another change came first
 */
export async function changeRow<Table extends Counted>(
	db: Writer,
	table: Table,
	id: string,
	revision: number,
	values: Partial<InferInsertModel<Table>>
): Promise<ChangeResult> {
	const written = await db
		.update(table)
		.set(values as never)
		.where(and(eq(table.id, id), eq(table.revision, revision)))
		.returning({ id: table.id });
	if (written.length > 0) return { outcome: 'changed' };
	const rows = await db
		.select({ revision: table.revision })
		.from(table as PgTable)
		.where(eq(table.id, id));
	const now = rows[0]?.revision;
	if (typeof now !== 'number') return { outcome: 'gone' };
	return { outcome: 'stale', revision: now, why: await staleSentence(db, table, id) };
}

/** Says who came first, as far as the record tells. */
async function staleSentence(db: Writer, table: PgTable, id: string): Promise<string> {
	const [last] = await db
		.select({ by: changes.personName })
		.from(changes)
		.where(and(eq(changes.subject, getTableName(table)), eq(changes.rowId, id)))
		.orderBy(desc(changes.id))
		.limit(1);
	const who = last?.by ?? 'Somebody else';
	return `${who} changed this while you had it open. Nothing of yours is saved yet: look at what is there now, and save again to put yours in its place.`;
}
