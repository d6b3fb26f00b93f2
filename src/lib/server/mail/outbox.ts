import { sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { mails } from '../db/schema';

/** The query builder of a transaction, or the database itself. */
export type Writer = Pick<Database, 'insert' | 'select' | 'update' | 'delete' | 'execute'>;

/** A mail as it is read: a subject, and paragraphs of which one may be the link to follow. */
export interface Letter {
	readonly to: string;
	readonly subject: string;
	readonly paragraphs: readonly (string | { readonly link: string; readonly words: string })[];
}

const escaped = (text: string): string =>
	text
		.replaceAll('&', '&amp;')
		.replaceAll('<', '&lt;')
		.replaceAll('>', '&gt;')
		.replaceAll('"', '&quot;');

function textOf({ paragraphs }: Letter): string {
	return `${paragraphs
		.map((it) => (typeof it === 'string' ? it : `${it.words}:\n${it.link}`))
		.join('\n\n')}\n`;
}

function htmlOf({ paragraphs, subject }: Letter): string {
	const body = paragraphs
		.map((it) =>
			typeof it === 'string'
				? `<p>${escaped(it)}</p>`
				: `<p><a href="${escaped(it.link)}">${escaped(it.words)}</a></p>`
		)
		.join('\n');
	return `<!doctype html>\n<html lang="en"><head><meta charset="utf-8"><title>${escaped(subject)}</title></head>\n<body>\n${body}\n</body></html>\n`;
}

/** Puts a letter in the outbox: within the transaction that makes it due, or not at all. */
export async function post(db: Writer, letter: Letter): Promise<void> {
	await db.insert(mails).values({
		recipient: letter.to,
		subject: letter.subject,
		text: textOf(letter),
		html: htmlOf(letter)
	});
	// A worker looks now; its own clock does so every minute.
	await db.execute(sql`select app_ask_worker('deliverMail', '{}', 'deliverMail')`);
}
