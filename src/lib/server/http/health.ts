import type { Health } from '../../api/health';
import type { Database } from '../db/client';
import { databaseAnswers, providerHealth, queueHealth, workerSeenAt } from '../db/health';

/** A worker not seen for this long is taken for gone. */
const WORKER_GONE_MS = 120_000;

/** How the installation does at an instant. Never throws: a lost database is an answer. */
export async function healthOf(db: Database, now: Date): Promise<Health> {
	if (!(await databaseAnswers(db)))
		return { status: 'down', database: 'down', providers: [], queue: null };
	const [providers, queue, seenAt] = await Promise.all([
		providerHealth(db),
		queueHealth(db),
		workerSeenAt(db)
	]);
	const workerLives = seenAt !== null && now.getTime() - seenAt.getTime() < WORKER_GONE_MS;
	const answered = providers.some(({ openUntil }) => openUntil === null || openUntil < now);
	const well = workerLives && answered && queue.failed === 0;
	return {
		status: well ? 'ok' : 'degraded',
		database: 'ok',
		providers: providers.map(({ provider, lastSuccessAt, openUntil }) => ({
			provider,
			lastSuccessAt: lastSuccessAt?.toISOString() ?? null,
			circuitOpen: openUntil !== null && openUntil > now
		})),
		queue: { ...queue, workerSeenAt: seenAt?.toISOString() ?? null }
	};
}
