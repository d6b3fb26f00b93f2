import { sql, type SQL } from 'drizzle-orm';
import { pgPolicy, pgRole, uuid, type AnyPgColumn } from 'drizzle-orm/pg-core';
import type { Duty } from '../behalf';

/**
 * The second wall: row-level security for the web process's role. Whatever a query forgets to ask,
 * rows of another yard are not there. Who runs migrations and the worker owns the tables and is
 * not held by it. Every table has its wall; a test looks for one without.
 */
export const webRole = pgRole('yardglass_web').existing();

const wall = (using: SQL, withCheck: SQL = using) =>
	pgPolicy('web_wall', { for: 'all', to: webRole, using, withCheck });

/** Functions of the database, see the migration `walls`: who asks, their yards, people of those. */
const PERSON = sql`(select app_person())`;
const YARDS = sql`(select app_yards())`;
const FELLOWS = sql`(select app_fellows())`;
const onDuty = (duty: Duty): SQL => sql`(select app_duty()) = ${sql.raw(`'${duty}'`)}`;

/** Rows of the yards the person belongs to, and whatever a duty needs of them. */
export const wallOfYard = (yardId: AnyPgColumn, duty?: Duty) =>
	wall(
		duty === undefined ? sql`${yardId} in ${YARDS}` : sql`${yardId} in ${YARDS} or ${onDuty(duty)}`
	);

/**
 * The yard of a row that hangs on a boat, job or step. A trigger writes it from there, whatever is
 * given: asking the parent row by row would cost a list of a whole yard ten times its time.
 */
export const yardOfParent = () =>
	uuid()
		.notNull()
		.default(sql`null`);

/** The person's own rows, and all of them on duty for accounts. */
export const wallOfPerson = (personId: AnyPgColumn) =>
	wall(sql`${personId} = ${PERSON} or ${onDuty('accounts')}`);

/** People: oneself and those of one's yards. */
export const wallOfPeople = (personId: AnyPgColumn) =>
	wall(
		sql`${personId} = ${PERSON} or ${personId} in ${FELLOWS} or ${onDuty('accounts')}`,
		sql`${personId} = ${PERSON} or ${onDuty('accounts')}`
	);

/** Rows that only accounts' own work reads and writes. */
export const wallOfAccounts = () => wall(onDuty('accounts'));

/** Mail: anybody's work may put some into the outbox, and only the worker takes it out. */
export const wallOfPost = () =>
	pgPolicy('web_wall', { for: 'insert', to: webRole, withCheck: sql`true` });

/** What is written down of a yard for good: its people read it, triggers alone write it. */
export const wallOfRecord = (yardId: AnyPgColumn) =>
	pgPolicy('web_wall', { for: 'select', to: webRole, using: sql`${yardId} in ${YARDS}` });

/** Rows that hold nothing of anybody. */
export const noWall = () => wall(sql`true`);
