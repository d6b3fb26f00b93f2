import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { fileURLToPath } from 'node:url';
import pg from 'pg';

/** Any number; the same in every process that migrates this product's database. */
const MIGRATION_LOCK = 7_302_115;

/**
 * Brings a database up to date. Many may call it at once: the migrator takes no lock of its own,
 * so one connection holds an advisory lock for the whole run.
 */
export async function migrateDatabase(url: string): Promise<void> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	try {
		await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
		await migrate(drizzle(client), {
			migrationsFolder: fileURLToPath(new URL('./migrations', import.meta.url))
		});
	} finally {
		await client.end();
	}
}

/** Creates a database on the server of a connection string unless it is there. */
export async function ensureDatabase(adminUrl: string, name: string): Promise<void> {
	const client = new pg.Client({ connectionString: adminUrl });
	await client.connect();
	try {
		const found = await client.query('select 1 from pg_database where datname = $1', [name]);
		if (found.rowCount === 0) await client.query(`create database ${pg.escapeIdentifier(name)}`);
	} finally {
		await client.end();
	}
}
