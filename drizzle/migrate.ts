import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { Logger, runMigrations } from 'graphile-worker';
import { fileURLToPath } from 'node:url';
import pg from 'pg';

/** Any number; the same in every process that migrates this product's database. */
const MIGRATION_LOCK = 7_302_115;

/** The web process's role: held by row-level security, unlike the owner of the tables. */
export const WEB_ROLE = 'yardglass_web';

/** A migration that fails throws; nothing else of it need be told. */
const QUIET = new Logger(() => () => undefined);

/** What the web process reads of the queue: how much waits. Given anew, as the queue remakes it. */
const GRANT_QUEUE = `grant usage on schema graphile_worker to ${WEB_ROLE};
	grant select on graphile_worker.jobs to ${WEB_ROLE}`;

/**
 * Brings a database up to date, its queue too. Many may call it at once: the migrator takes no
 * lock of its own, so one connection holds an advisory lock for the whole run.
 */
export async function migrateDatabase(url: string): Promise<void> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	try {
		await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
		await runMigrations({ connectionString: url, logger: QUIET });
		await migrate(drizzle(client), {
			migrationsFolder: fileURLToPath(new URL('./migrations', import.meta.url))
		});
		await client.query(GRANT_QUEUE);
	} finally {
		await client.end();
	}
}

/** Lets the web process's role sign in to a migrated server with a password. */
export async function letWebSignIn(url: string, password: string): Promise<void> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	try {
		await client.query(`alter role ${WEB_ROLE} login password ${pg.escapeLiteral(password)}`);
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
