import { and, asc, eq, isNull, lt, lte, sql } from 'drizzle-orm';
import { createTransport } from 'nodemailer';
import type { Database } from '../db/client';
import { mails, type Mail } from '../db/schema';
import type { MailConfig } from './config';

/** Tries of a mail; after the last it stays with its reason. */
const MOST_ATTEMPTS = 12;
const FIRST_PAUSE_SECONDS = 15;
const LONGEST_PAUSE_SECONDS = 6 * 3600;
const BATCH = 20;

/** Takes a mail or throws; what nodemailer's transport does. */
export type Send = (mail: Mail) => Promise<void>;

/** Sends through the configured server; null where none is. */
export function smtpSender({ SMTP_URL, MAIL_FROM }: MailConfig): Send | null {
	if (SMTP_URL === undefined) return null;
	const transport = createTransport(SMTP_URL);
	const domain = MAIL_FROM.slice(MAIL_FROM.indexOf('@') + 1);
	return async ({ id, recipient, subject, text, html }) => {
		await transport.sendMail({
			from: { name: 'Yardglass', address: MAIL_FROM },
			to: recipient,
			subject,
			text,
			html,
			messageId: `<${id}@${domain}>`
		});
	};
}

/** Seconds to wait after so many tries: doubling from a quarter of a minute to six hours. */
export function pauseAfter(attempts: number): number {
	return Math.min(FIRST_PAUSE_SECONDS * 2 ** (attempts - 1), LONGEST_PAUSE_SECONDS);
}

/**
 * Sends what is due in the outbox, each mail in a transaction of its own that holds its row: one
 * worker at a time has it, and one that dies lets it go. A server that took the mail of a worker
 * that died before writing it down gets it again, under the same Message-ID.
 *
 * @returns how many were taken, and how many failed
 */
export async function deliverDue(
	db: Database,
	send: Send
): Promise<{ sent: number; failed: number }> {
	let sent = 0;
	let failed = 0;
	for (let i = 0; i < BATCH; i++) {
		const outcome = await db.transaction(async (tx) => {
			const [mail] = await tx
				.select()
				.from(mails)
				.where(
					and(
						isNull(mails.sentAt),
						lte(mails.nextTryAt, sql`now()`),
						lt(mails.attempts, MOST_ATTEMPTS)
					)
				)
				.orderBy(asc(mails.nextTryAt))
				.limit(1)
				.for('update', { skipLocked: true });
			if (mail === undefined) return 'none';
			try {
				await send(mail);
			} catch (error) {
				const attempts = mail.attempts + 1;
				await tx
					.update(mails)
					.set({
						attempts,
						nextTryAt: sql`now() + make_interval(secs => ${pauseAfter(attempts)})`,
						lastError: error instanceof Error ? error.message.slice(0, 500) : 'unknown'
					})
					.where(eq(mails.id, mail.id));
				return 'failed';
			}
			await tx
				.update(mails)
				.set({ sentAt: sql`now()`, attempts: mail.attempts + 1, lastError: null })
				.where(eq(mails.id, mail.id));
			return 'sent';
		});
		if (outcome === 'none') break;
		if (outcome === 'sent') sent++;
		else failed++;
	}
	return { sent, failed };
}
