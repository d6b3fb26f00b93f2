import { randomUUID } from 'node:crypto';
import { hostname } from 'node:os';
import { Logger as JobLogger, parseCronItems, run } from 'graphile-worker';
import { compose } from '../composition';
import { noteWorker } from '../db/health';
import { allYards } from '../db/yards';
import { currentForecast } from '../forecast/current';
import { addRefresh, createTasks } from './tasks';

/**
 * The worker process: any number of them may run, on any machine, against one database. The web
 * process answers without one.
 */
const HEARTBEAT_MS = 30_000;
/** At start, a yard whose forecast is older than this is refreshed at once. */
const FRESH_MINUTES = 60;

const parts = compose(process.env, 'worker');
const { db, log, config } = parts;
const id = `${hostname()} ${randomUUID().slice(0, 8)}`;

const runner = await run({
	connectionString: config.DATABASE_URL,
	concurrency: 2,
	noHandleSignals: true,
	logger: new JobLogger(() => (level, message) => {
		if (level === 'error') log.error({ source: 'queue' }, message);
		else if (level === 'warning') log.warn({ source: 'queue' }, message);
	}),
	taskList: createTasks(parts),
	parsedCronItems: parseCronItems([
		{ task: 'spreadRefreshes', match: '0 * * * *' },
		{ task: 'deliverMail', match: '* * * * *' },
		{ task: 'sweepFiles', match: '41 * * * *' },
		{ task: 'sweep', match: '17 3 * * *' }
	])
});

for (const yard of await allYards(db)) {
	const current = await currentForecast(db, yard, new Date());
	if (current === null || current.source.ageMinutes >= FRESH_MINUTES)
		await addRefresh(runner.addJob, yard.id);
}

const beat = (): void => {
	noteWorker(db, id, new Date()).catch((error: unknown) => {
		log.warn({ err: error }, 'heartbeat not written');
	});
};
beat();
const heart = setInterval(beat, HEARTBEAT_MS);
log.info({ id }, 'worker started');

let stopping = false;
async function stop(signal: string): Promise<void> {
	if (stopping) return;
	stopping = true;
	log.info({ signal }, 'worker stopping');
	clearInterval(heart);
	await runner.stop();
	await parts.close();
}
for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop(signal));
