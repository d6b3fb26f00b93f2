import { and, asc, eq, gte, sql } from 'drizzle-orm';
import type { NewAbsence } from '../../api/workTimes';
import type { WorkHours } from '../../engine';
import { mayDo, type Membership } from '../access/roles';
import type { Database } from '../db/client';
import { absences, memberships, users } from '../db/schema';

/** When people work in a yard, and when they are away. */

/**
 * Whose times a member may say: their own, a manager everybody's.
 *
 * @returns the person, or null where there is none of that id whose times are theirs to say
 */
export async function personWithTimes(
	db: Database,
	{ yard, user, role }: Membership,
	personId: string
) {
	if (personId !== user.id && !mayDo(role, 'setTimes')) return null;
	const [person] = await db
		.select({ id: users.id, name: users.name, workHours: memberships.workHours })
		.from(memberships)
		.innerJoin(users, eq(users.id, memberships.userId))
		.where(and(eq(memberships.yardId, yard.id), eq(memberships.userId, personId)));
	return person ?? null;
}

/** Everybody of a yard by name, for a choice whose times to say. */
export function peopleWithTimes(db: Database, { yard }: Membership) {
	return db
		.select({ id: users.id, name: users.name })
		.from(memberships)
		.innerJoin(users, eq(users.id, memberships.userId))
		.where(eq(memberships.yardId, yard.id))
		.orderBy(asc(users.name));
}

/** A person's absences in a yard that are not over. */
export function absencesAhead(db: Database, yardId: string, personId: string) {
	return db
		.select({
			id: absences.id,
			from: absences.fromDate,
			to: absences.toDate,
			note: absences.note
		})
		.from(absences)
		.where(
			and(
				eq(absences.yardId, yardId),
				eq(absences.userId, personId),
				gte(absences.toDate, sql`current_date - 1`)
			)
		)
		.orderBy(asc(absences.fromDate));
}

/** Says a person's own hours; null goes by the yard's. */
export async function setWorkHours(
	db: Database,
	yardId: string,
	personId: string,
	workHours: WorkHours | null
): Promise<void> {
	await db
		.update(memberships)
		.set({ workHours })
		.where(and(eq(memberships.yardId, yardId), eq(memberships.userId, personId)));
}

export async function addAbsence(
	db: Database,
	yardId: string,
	personId: string,
	{ from, to, note }: NewAbsence
): Promise<void> {
	await db.insert(absences).values({ yardId, userId: personId, fromDate: from, toDate: to, note });
}

/** Takes an absence of a person away; false where there is none. */
export async function removeAbsence(
	db: Database,
	yardId: string,
	personId: string,
	id: string
): Promise<boolean> {
	const gone = await db
		.delete(absences)
		.where(and(eq(absences.id, id), eq(absences.yardId, yardId), eq(absences.userId, personId)))
		.returning({ id: absences.id });
	return gone.length > 0;
}
