import { existsSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { newDataFolder } from './dataFolder';
import { databaseOf, endForSure, isThere, startNode, until, type Started } from './processes';

/** A private database that is stopped as soon as its owner is told to. */
const OWNER = `
	const { findPostgres } = await import('./fakes/local-stack/debian.mjs');
	const { startCluster } = await import('./drizzle/server/cluster.mjs');
	const dataFolder = process.env.DATA_DIR;
	const cluster = await startCluster({ dataFolder, ...(await findPostgres(dataFolder)), throwAway: true });
	console.log('started');
	const forever = setInterval(() => undefined, 1000);
	process.once('SIGTERM', () => {
		clearInterval(forever);
		cluster.stop().then(() => console.log('stopped'));
	});
`;
let dataFolder: string;
let owner: Started;

beforeAll(async () => {
	dataFolder = newDataFolder();
	owner = startNode(['--input-type=module', '-e', OWNER], { DATA_DIR: dataFolder });
	await until(() => /started/.test(owner.out()) || !owner.lives(), 40_000, owner.err);
	expect(owner.lives(), owner.err()).toBe(true);
});
afterAll(async () => {
	await endForSure(owner);
	rmSync(dataFolder, { recursive: true, force: true });
});

test('a database that has ended by itself is stopped without a fault, and its folder goes', async () => {
	const database = databaseOf(dataFolder);
	if (database === null) throw new Error('the database runs');
	process.kill(database, 'SIGQUIT');
	await until(() => !isThere(database), 10_000);
	owner.signal('SIGTERM');
	expect(await owner.ended, owner.err()).toBe(0);
	expect(owner.out()).toContain('stopped');
	expect(existsSync(join(dataFolder, 'postgres'))).toBe(false);
});
