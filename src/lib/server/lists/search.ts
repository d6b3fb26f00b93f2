import { and, eq, ilike, or, sql, type AnyColumn, type SQL } from 'drizzle-orm';
import type { Database } from '../db/client';
import { boats, jobs, stands, stepPainters, steps, users } from '../db/schema';

/**
 * Looking for words. Row-level security judges a row before a comparison that might tell of it, and
 * so no index of words serves the web role; functions of the database look into the trigrams of one
 * yard and ask whether it is the person's. Few finds go into the query as a list. Words that find
 * many are looked for row by row along the list's own order, which comes to a page's end soon.
 */
const FEW = 500;

const among = (column: AnyColumn, ids: readonly string[]): SQL =>
	sql`${column} = any(${sql.param(ids)}::uuid[])`;

/** Up to one more than few of the rows that a function of the database finds. */
async function found(db: Database, which: SQL): Promise<string[] | null> {
	const { rows } = await db.execute<{ id: string }>(sql`select id from ${which} as it(id)`);
	return rows.length > FEW ? null : rows.map(({ id }) => id);
}

/** The condition that one of some columns holds the words, whatever their case. */
export function holds(columns: readonly AnyColumn[], words: string | undefined): SQL | undefined {
	if (words === undefined || words === '') return undefined;
	const pattern = `%${words.replaceAll(/[\\%_]/g, '\\$&')}%`;
	return or(...columns.map((column) => ilike(column, pattern)));
}

/**
 * The condition that a boat, its owner or its stand holds the words in its name; none without
 * words. For queries of `boats` with `users` and `stands` joined.
 */
export async function boatsLike(
	db: Database,
	yardId: string,
	words: string | undefined
): Promise<SQL | undefined> {
	if (words === undefined || words === '') return undefined;
	const ids = await found(db, sql`app_boats_like(${yardId}::uuid, ${words}, ${FEW + 1})`);
	return ids === null ? holds([boats.name, users.name, stands.name], words) : among(boats.id, ids);
}

/** The condition on `steps` that the job, its boat, owner or stand holds the words in its name. */
export async function stepsLike(
	db: Database,
	yardId: string,
	words: string | undefined
): Promise<SQL | undefined> {
	if (words === undefined || words === '') return undefined;
	const ids = await found(db, sql`app_jobs_like(${yardId}::uuid, ${words}, ${FEW + 1})`);
	if (ids !== null) return among(steps.jobId, ids);
	const ofStep = db
		.select({
			held: sql<boolean>`${holds([jobs.name, boats.name, users.name, stands.name], words)}`
		})
		.from(jobs)
		.innerJoin(boats, eq(boats.id, jobs.boatId))
		.leftJoin(users, eq(users.id, boats.ownerId))
		.leftJoin(stands, eq(stands.id, boats.standId))
		.where(eq(jobs.id, steps.jobId));
	// As a value, not a join: a join would be made for every row before the page is known.
	return sql`coalesce(${ofStep}, false)`;
}

/** The condition on `steps` that somebody works on it; none for nobody in particular. */
export async function stepsOfPainter(
	db: Database,
	yardId: string,
	userId: string | undefined
): Promise<SQL | undefined> {
	if (userId === undefined) return undefined;
	const theirs = eq(stepPainters.userId, userId);
	const rows = await db
		.select({ id: stepPainters.stepId })
		.from(stepPainters)
		.where(and(eq(stepPainters.yardId, yardId), theirs))
		.limit(FEW + 1);
	if (rows.length <= FEW)
		return among(
			steps.id,
			rows.map(({ id }) => id)
		);
	const named = db
		.select({ id: stepPainters.stepId })
		.from(stepPainters)
		.where(and(eq(stepPainters.stepId, steps.id), theirs));
	return sql`(exists ${named}) is true`;
}
