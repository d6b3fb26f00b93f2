import { drizzle } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import * as schema from './schema';

/**
 * A pool and the query builder on it. The caller ends the pool.
 *
 * @param url - connection string of the database
 */
export function createDatabase(url: string) {
	const pool = new pg.Pool({ connectionString: url, max: 10 });
	// A connection dropped by the server while idle must not end the process; the pool replaces it.
	pool.on('error', () => undefined);
	return { pool, db: drizzle(pool, { schema, casing: 'snake_case' }) };
}
export type Database = ReturnType<typeof createDatabase>['db'];
