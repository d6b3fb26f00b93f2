import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { ensureDatabase, letWebSignIn, migrateDatabase, WEB_ROLE } from '../../drizzle/migrate';
import { createDatabase } from '../../src/lib/server/db/client';

const TEMPLATE = 'yardglass_template';
/** Any number: held while the template is made, so that test files running at once make it once. */
const TEMPLATE_LOCK = 7_302_116;
/** The role belongs to the whole server: beside a running stack it keeps that one's password. */
const WEB_PASSWORD = process.env.TEST_WEB_PASSWORD ?? 'of the tests alone';

function adminUrl(): string {
	const url = process.env.TEST_DATABASE_URL;
	if (url === undefined || url === '')
		throw new Error(
			'These tests need a PostgreSQL to make databases on: run them through `npm test`, or start one with `node fakes/local-stack/database.mjs` and set TEST_DATABASE_URL to what it prints.'
		);
	return url;
}

const urlOf = (database: string): string => {
	const url = new URL(adminUrl());
	url.pathname = `/${database}`;
	return url.toString();
};

/** The same as the web process signs in: held by row-level security. */
const webUrlOf = (database: string): string => {
	const url = new URL(urlOf(database));
	url.username = WEB_ROLE;
	url.password = WEB_PASSWORD;
	return url.toString();
};

async function withAdmin<T>(work: (client: pg.Client) => Promise<T>): Promise<T> {
	const client = new pg.Client({ connectionString: adminUrl() });
	await client.connect();
	try {
		return await work(client);
	} finally {
		await client.end();
	}
}

/**
 * A migrated, empty database of this test file's own, from a template that is migrated once per
 * run of a checkout. Call `drop` after the tests.
 */
export async function createTestDatabase() {
	const name = `test_${randomBytes(6).toString('hex')}`;
	await withAdmin(async (client) => {
		await client.query('select pg_advisory_lock($1)', [TEMPLATE_LOCK]);
		await ensureDatabase(adminUrl(), TEMPLATE);
		await migrateDatabase(urlOf(TEMPLATE));
		await letWebSignIn(urlOf(TEMPLATE), WEB_PASSWORD);
		await client.query(`create database ${name} template ${TEMPLATE}`);
	});
	const url = urlOf(name);
	const { db, pool } = createDatabase(url);
	return {
		url,
		webUrl: webUrlOf(name),
		db,
		pool,
		async drop(): Promise<void> {
			await pool.end();
			await withAdmin((client) => client.query(`drop database ${name} with (force)`));
		}
	};
}
