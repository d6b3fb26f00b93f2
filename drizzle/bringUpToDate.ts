import { letWebSignIn, migrateDatabase } from './migrate';

/** Brings an installation's database up to date, and lets the web process's role sign in to it. */
const [url, webUrl] = process.argv.slice(2);
if (url === undefined || webUrl === undefined)
	throw new Error('Usage: bringUpToDate.ts <the owner’s address> <the web role’s address>');
await migrateDatabase(url);
await letWebSignIn(url, decodeURIComponent(new URL(webUrl).password));
