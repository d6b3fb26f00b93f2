import { onBehalfOf } from '../../src/lib/server/db/behalf';
import { createDatabase } from '../../src/lib/server/db/client';
import { layFullYard } from '../fixtures/fullYard';
import { listQueries } from '../fixtures/listQueries';
import { createTestDatabase } from '../setup/database';
import { startBenchServer } from './server';

const RUNS = 60;
const at = (sorted: readonly number[], share: number): string =>
	sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))].toFixed(1);

/** Lists of a yard of 5,000 boats and 50,000 steps, as the web role: milliseconds of a page. */
export async function listBench(print: (line: string) => void): Promise<void> {
	const server = await startBenchServer();
	const database = await createTestDatabase();
	const web = createDatabase(database.webUrl, 'required');
	try {
		const manager = await layFullYard(database);
		await onBehalfOf(manager.user.id, async () => {
			for (const { name, read, query } of await listQueries(web.db, manager)) {
				const times: number[] = [];
				for (let run = -5; run < RUNS; run++) {
					const from = performance.now();
					await read(query);
					if (run >= 0) times.push(performance.now() - from);
				}
				times.sort((a, b) => a - b);
				print(`list: ${name}: median ${at(times, 0.5)} ms, p95 ${at(times, 0.95)} ms`);
			}
		});
	} finally {
		await web.pool.end();
		await database.drop();
		await server.stop();
	}
}
