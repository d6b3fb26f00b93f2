import { drizzle } from 'drizzle-orm/node-postgres';
import * as schema from './schema';
import { WalledPool } from './walledPool';

/** Disks no longer seek: a row by its index costs little more than the next row of a table. */
const PLANNING = '-c random_page_cost=1.1';

/**
 * A pool and the query builder on it. The caller ends the pool.
 *
 * @param url - connection string of the database
 * @param walls - `required` refuses a role that row-level security does not hold
 */
export function createDatabase(url: string, walls: 'required' | 'passed' = 'passed') {
	const pool = new WalledPool({ connectionString: url, max: 10, options: PLANNING }, walls);
	// A connection dropped by the server while idle must not end the process; the pool replaces it.
	pool.on('error', () => undefined);
	return { pool, db: drizzle(pool, { schema, casing: 'snake_case' }) };
}
export type Database = ReturnType<typeof createDatabase>['db'];
