import { and, asc, eq, gte, inArray, isNull, lt, lte, sql } from 'drizzle-orm';
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

/** How long a worker that took a mail has it for itself. */
const LEASE_MINUTES = 5;

/** Takes the next due mail for this worker: none other sees it until the lease is over. */
async function takeDue(db: Database): Promise<Mail | null> {
	const next = db
		.select({ id: mails.id })
		.from(mails)
		.where(
			and(isNull(mails.sentAt), lte(mails.nextTryAt, sql`now()`), lt(mails.attempts, MOST_ATTEMPTS))
		)
		.orderBy(asc(mails.nextTryAt))
		.limit(1)
		.for('update', { skipLocked: true });
	const [mail] = await db
		.update(mails)
		.set({
			attempts: sql`${mails.attempts} + 1`,
			nextTryAt: sql`now() + make_interval(mins => ${LEASE_MINUTES})`,
			// Stands there for whoever looks after a worker that never came back.
			lastError: 'A worker took it and has not said what came of it.'
		})
		.where(inArray(mails.id, next))
		.returning();
	return mail ?? null;
}

/** What of a mail a server refuses for good; a refused login or sender is ours to put right. */
const REFUSALS: readonly unknown[] = ['RCPT TO', 'DATA'];

/** Whether a mail server has said that it will never take this mail. */
function isForGood(error: unknown): boolean {
	if (!(error instanceof Error) || !('responseCode' in error) || !('command' in error))
		return false;
	const { responseCode: code, command } = error;
	return typeof code === 'number' && code >= 500 && code < 600 && REFUSALS.includes(command);
}

/** What a letter keeps that nobody will send any more: nothing that opens anything. */
const EMPTIED = { text: '', html: '' };

async function noteFailure(db: Database, mail: Mail, error: unknown): Promise<void> {
	const attempts = isForGood(error) ? MOST_ATTEMPTS : mail.attempts;
	await db
		.update(mails)
		.set({
			attempts,
			...(attempts >= MOST_ATTEMPTS ? EMPTIED : {}),
			nextTryAt: sql`now() + make_interval(secs => ${pauseAfter(mail.attempts)})`,
			lastError: error instanceof Error ? error.message.slice(0, 500) : 'unknown'
		})
		.where(eq(mails.id, mail.id));
}

/**
 * Sends what is due in the outbox. A worker takes a mail for some minutes and holds nothing while
 * it talks to the server; where it dies, another gets the mail afterwards, under the same
 * Message-ID. A mail that was taken keeps nothing of its text: links in it open things.
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
		const mail = await takeDue(db);
		if (mail === null) break;
		try {
			await send(mail);
		} catch (error) {
			await noteFailure(db, mail, error);
			failed++;
			continue;
		}
		await db
			.update(mails)
			.set({ sentAt: sql`now()`, lastError: null, ...EMPTIED })
			.where(eq(mails.id, mail.id));
		sent++;
	}
	return { sent, failed };
}

/** Empties letters whose last worker never came back: nobody sends them any more. */
export async function emptyAbandoned(db: Database): Promise<void> {
	await db
		.update(mails)
		.set(EMPTIED)
		.where(
			and(
				isNull(mails.sentAt),
				gte(mails.attempts, MOST_ATTEMPTS),
				lte(mails.nextTryAt, sql`now()`)
			)
		);
}
