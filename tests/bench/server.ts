import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startCluster } from '../../drizzle/server/cluster.mjs';
import { findPostgres } from '../../fakes/local-stack/debian.mjs';

/** The database server of `TEST_DATABASE_URL`, or a throw-away one that `stop` ends. */
export async function startBenchServer(): Promise<{ readonly stop: () => Promise<void> }> {
	const given = process.env.TEST_DATABASE_URL;
	if (given !== undefined && given !== '') return { stop: () => Promise.resolve() };
	const dataFolder = mkdtempSync(join(tmpdir(), 'yardglass-bench-'));
	chmodSync(dataFolder, 0o755);
	const postgres = await findPostgres(dataFolder);
	const cluster = await startCluster({ dataFolder, ...postgres, throwAway: true });
	process.env.TEST_DATABASE_URL = cluster.url;
	return {
		stop: async () => {
			delete process.env.TEST_DATABASE_URL;
			await cluster.stop();
			rmSync(dataFolder, { recursive: true, force: true });
		}
	};
}
