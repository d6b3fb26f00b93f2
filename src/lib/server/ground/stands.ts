import { and, asc, eq, max } from 'drizzle-orm';
import type { NewStand, Stand, StandPatch } from '../../api/yard/stands';
import type { Membership } from '../access/roles';
import { changeRow, type ChangeResult } from '../db/changeRow';
import type { Database } from '../db/client';
import { boats, stands, type StandRow } from '../db/schema';

/** Stands of a yard: where they lie on its plan and what breaks the wind there. */

export const standDocument = ({ id, name, x, y, lee, revision }: StandRow): Stand => ({
	id,
	name,
	x,
	y,
	lee,
	revision
});

/** A yard's stands in their order. */
export async function standsOf(db: Database, { yard }: Pick<Membership, 'yard'>): Promise<Stand[]> {
	const rows = await db
		.select()
		.from(stands)
		.where(eq(stands.yardId, yard.id))
		.orderBy(asc(stands.position));
	return rows.map(standDocument);
}

/** One stand of a yard; null where it has none such. */
export async function standOf(
	db: Database,
	{ yard }: Pick<Membership, 'yard'>,
	id: string
): Promise<Stand | null> {
	const [row] = await db
		.select()
		.from(stands)
		.where(and(eq(stands.id, id), eq(stands.yardId, yard.id)));
	return row === undefined ? null : standDocument(row);
}

const UNIQUE_VIOLATION = '23505';
const isTaken = (error: unknown): boolean =>
	(error as { cause?: { code?: unknown } }).cause?.code === UNIQUE_VIOLATION;

export type StandResult = ChangeResult | { readonly outcome: 'refused'; readonly why: string };

const nameTaken = (name: string): StandResult => ({
	outcome: 'refused',
	why: `There is a stand ${name} already: give this one another name.`
});

/** Adds a stand behind the others; its id, or why not. */
export async function addStand(
	db: Database,
	{ yard }: Pick<Membership, 'yard'>,
	stand: NewStand
): Promise<{ id: string } | { why: string }> {
	const [{ last }] = await db
		.select({ last: max(stands.position) })
		.from(stands)
		.where(eq(stands.yardId, yard.id));
	const [row] = await db
		.insert(stands)
		.values({ ...stand, yardId: yard.id, position: (last ?? -1) + 1 })
		.onConflictDoNothing()
		.returning({ id: stands.id });
	return row ?? { why: `There is a stand ${stand.name} already.` };
}

/** Changes a stand of the yard as its reader saw it. */
export async function changeStand(
	db: Database,
	membership: Pick<Membership, 'yard'>,
	id: string,
	{ revision, ...values }: StandPatch
): Promise<StandResult> {
	if ((await standOf(db, membership, id)) === null) return { outcome: 'gone' };
	try {
		return await changeRow(db, stands, id, revision, values);
	} catch (error) {
		if (isTaken(error)) return nameTaken(values.name ?? '');
		throw error;
	}
}

/**
 * Takes a stand away. A boat on it stays in the yard, on no stand: unless that is settled the
 * question comes back instead.
 *
 * @param settled - whether whoever asks knows that its boats then stand nowhere
 */
export async function removeStand(
	db: Database,
	membership: Pick<Membership, 'yard'>,
	id: string,
	revision: number,
	settled: boolean
): Promise<StandResult | { readonly outcome: 'asks'; readonly why: string }> {
	const stand = await standOf(db, membership, id);
	if (stand === null) return { outcome: 'gone' };
	return db.transaction(async (tx) => {
		const on = await tx.select({ name: boats.name }).from(boats).where(eq(boats.standId, id));
		if (on.length > 0 && !settled)
			return {
				outcome: 'asks' as const,
				why: `${on.map(({ name }) => name).join(', ')} stands there. Taken away, the boat stands nowhere until somebody moves it.`
			};
		// The same row as was seen, or whoever changed it is named.
		const seen = await changeRow(tx, stands, id, revision, { name: stand.name });
		if (seen.outcome === 'changed') await tx.delete(stands).where(eq(stands.id, id));
		return seen;
	});
}
