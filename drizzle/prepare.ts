import { createDatabase } from '../src/lib/server/db/client';
import { ensureDatabase, letWebSignIn, migrateDatabase } from './migrate';
import { DEMO_PEOPLE } from './seed/demo';
import { seedDemo } from './seed/seed';

/**
 * Makes a database ready: creates it, migrates it, lets the web process's role in, lays the demo
 * yard. Prints one line of JSON with the demo accounts for the command that started it.
 */
const [adminUrl, url, webUrl] = process.argv.slice(2);
if (adminUrl === undefined || url === undefined || webUrl === undefined)
	throw new Error('Usage: prepare.ts <admin address> <database address> <the web role’s address>');

await ensureDatabase(adminUrl, new URL(url).pathname.slice(1));
await migrateDatabase(url);
await letWebSignIn(url, decodeURIComponent(new URL(webUrl).password));
const { db, pool } = createDatabase(url);
const outcome = await seedDemo(db, new Date());
await pool.end();
const accounts = Object.entries(DEMO_PEOPLE).map(([role, { email, password }]) => ({
	role,
	email,
	password
}));
process.stdout.write(`${JSON.stringify({ outcome, accounts })}\n`);
