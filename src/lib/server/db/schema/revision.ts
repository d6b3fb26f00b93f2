import { integer } from 'drizzle-orm/pg-core';

/**
 * How often a row was changed, counted by the database. Who changes it says which one they had
 * before them, so that nobody overwrites what another wrote meanwhile.
 */
export const revision = () => integer().notNull().default(1);
