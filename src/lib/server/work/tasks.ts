import type { JobHelpers, TaskList } from 'graphile-worker';
import { z } from 'zod';
import { forgetOldLinks } from '../access/links';
import { askToReset } from '../access/resetPassphrase';
import type { Composition } from '../composition';
import { forgetHoursBefore } from '../db/outlookCache';
import { allBoatsOf, queuedSteps } from '../db/queue';
import { allYards, yardById } from '../db/yards';
import { currentForecast } from '../forecast/current';
import { sweepFiles } from '../files/sweep';
import { refreshForecast } from '../forecast/refresh';
import { deliverDue, emptyAbandoned, smtpSender } from '../mail/deliver';
import { computeOutlook, weatherOnAxis } from '../outlook/compute';
import { refreshOffsetSeconds } from './spread';

const ofYard = z.object({ yardId: z.string() });
const ofAddress = z.object({ email: z.string() });
/** Kept hours older than this belong to runs nobody looks at any more. */
const KEEP_HOURS_MS = 2 * 86_400_000;
const ATTEMPTS = 4;

type Parts = Pick<Composition, 'db' | 'config' | 'log' | 'sessions' | 'storage'>;

/** Queues a yard's refresh; one waits at a time whatever asks for it. */
export async function addRefresh(
	addJob: JobHelpers['addJob'],
	yardId: string,
	runAt?: Date
): Promise<void> {
	await addJob(
		'refreshForecast',
		{ yardId },
		{ jobKey: `refresh ${yardId}`, jobKeyMode: 'replace', maxAttempts: ATTEMPTS, runAt }
	);
}

/** The worker's tasks by name. */
export function createTasks({ db, config, log, sessions, storage }: Parts): TaskList {
	const send = smtpSender(config);
	return {
		/** Hourly: lays each yard's refresh at its own minute of the hour. */
		async spreadRefreshes(_, { addJob }) {
			const from = Date.now();
			for (const { id } of await allYards(db))
				await addRefresh(addJob, id, new Date(from + refreshOffsetSeconds(id) * 1000));
		},
		async refreshForecast(payload, { addJob }) {
			const { yardId } = ofYard.parse(payload);
			const yard = await yardById(db, yardId);
			// Deleted since it was queued.
			if (yard === null) return;
			const result = await refreshForecast({ db, config }, yard, new Date());
			log.info(
				{ yardId, outcome: result.outcome, troubles: result.troubles },
				'forecast refreshed'
			);
			if (result.outcome === 'stored')
				await addJob('computeOutlook', { yardId }, { jobKey: `outlook ${yardId}` });
		},
		/** Judges every queued step of a yard, so that whoever looks next finds it done. */
		async computeOutlook(payload) {
			const { yardId } = ofYard.parse(payload);
			const yard = await yardById(db, yardId);
			if (yard === null) return;
			const now = new Date();
			const queue = await queuedSteps(db, allBoatsOf(yardId));
			const current = await currentForecast(db, yard, now);
			await computeOutlook(db, yard, queue, current, weatherOnAxis(yard, current, now));
			log.info({ yardId, steps: queue.length }, 'outlook computed');
		},
		/** Looks whether somebody who forgot a passphrase has an account, and writes to them. */
		async mailReset(payload) {
			const { email } = ofAddress.parse(payload);
			await askToReset(db, email, config.ORIGIN);
		},
		/** Every minute, and when a letter is posted: sends what is due. */
		async deliverMail() {
			if (send === null) return;
			const { sent, failed } = await deliverDue(db, send);
			if (sent + failed > 0) log.info({ sent, failed }, 'mail delivered');
		},
		/** Hourly, and when a file is deleted: deletes bytes that no file has any more. */
		async sweepFiles() {
			const swept = await sweepFiles({ db, config, storage }, new Date());
			if (swept > 0) log.info({ swept }, 'files swept');
		},
		/** Daily: forgets what can be computed again and sessions that have ended. */
		async sweep() {
			await forgetHoursBefore(db, new Date(Date.now() - KEEP_HOURS_MS));
			await sessions.deleteExpired();
			await forgetOldLinks(db);
			await emptyAbandoned(db);
		}
	};
}
