import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chmodSync, rmSync } from 'node:fs';
import { startCluster } from '../../drizzle/server/cluster.mjs';
import { findPostgres } from './debian.mjs';

// A throw-away PostgreSQL for running single test files by hand; ends with Ctrl-C.
const dataFolder = mkdtempSync(join(tmpdir(), 'yardglass-'));
chmodSync(dataFolder, 0o755);
const postgres = await findPostgres(dataFolder);
const port = process.env.PORT === undefined ? undefined : Number(process.env.PORT);
const cluster = await startCluster({ dataFolder, ...postgres, throwAway: true, port });
process.stdout.write(`TEST_DATABASE_URL=${cluster.url}\n`);

const forever = setInterval(() => undefined, 60_000);
for (const signal of ['SIGINT', 'SIGTERM']) {
	process.once(signal, () => {
		clearInterval(forever);
		void cluster.stop().then(() => rmSync(dataFolder, { recursive: true, force: true }));
	});
}
