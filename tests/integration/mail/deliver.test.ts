import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { mails, type Mail } from '../../../src/lib/server/db/schema';
import { deliverDue, emptyAbandoned, pauseAfter } from '../../../src/lib/server/mail/deliver';
import { post } from '../../../src/lib/server/mail/outbox';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
beforeAll(async () => {
	database = await createTestDatabase();
});
afterAll(() => database.drop());
beforeEach(async () => {
	await database.db.delete(mails);
});

const write = (to: string) =>
	post(database.db, {
		to,
		subject: 'Open the yard',
		paragraphs: ['Hello', { words: 'Open', link: 'http://127.0.0.1/found/secret' }]
	});
const kept = () => database.db.select().from(mails);

test('a mail that a server took keeps nothing that opens anything', async () => {
	await write('a@marram.example');
	const seen: Mail[] = [];
	const done = await deliverDue(database.db, (mail) => {
		seen.push(mail);
		return Promise.resolve();
	});
	expect(done).toEqual({ sent: 1, failed: 0 });
	expect(seen[0].text).toContain('/found/secret');
	const [mail] = await kept();
	expect(mail).toMatchObject({ text: '', html: '', attempts: 1 });
	expect(mail.sentAt).not.toBeNull();
});

test('a server that is away is asked again later, under the same id', async () => {
	await write('a@marram.example');
	const away = () => Promise.reject(new Error('connect ECONNREFUSED'));
	expect(await deliverDue(database.db, away)).toEqual({ sent: 0, failed: 1 });
	// Not due yet: nobody asks.
	expect(await deliverDue(database.db, away)).toEqual({ sent: 0, failed: 0 });
	const [mail] = await kept();
	expect(mail).toMatchObject({ attempts: 1, lastError: 'connect ECONNREFUSED', sentAt: null });
	await database.db.update(mails).set({ nextTryAt: sql`now()` });
	const ids: string[] = [];
	await deliverDue(database.db, ({ id }) => {
		ids.push(id);
		return Promise.resolve();
	});
	expect(ids).toEqual([mail.id]);
});

test('a mail refused for good is not tried again, and the others go on', async () => {
	await write('nobody@marram.example');
	await write('b@marram.example');
	const done = await deliverDue(database.db, ({ recipient }) =>
		recipient.startsWith('nobody')
			? Promise.reject(
					Object.assign(new Error('550 no such mailbox'), { responseCode: 550, command: 'RCPT TO' })
				)
			: Promise.resolve()
	);
	expect(done).toEqual({ sent: 1, failed: 1 });
	await database.db.update(mails).set({ nextTryAt: sql`now()` });
	expect(await deliverDue(database.db, () => Promise.resolve())).toEqual({ sent: 0, failed: 0 });
	const [refused] = await database.db
		.select()
		.from(mails)
		.where(eq(mails.recipient, 'nobody@marram.example'));
	expect(refused).toMatchObject({ sentAt: null, lastError: '550 no such mailbox', text: '' });
});

test('a login that the server refuses is ours to put right: the letter waits', async () => {
	await write('c@marram.example');
	const badLogin = () =>
		Promise.reject(
			Object.assign(new Error('535 bad login'), { responseCode: 535, command: 'AUTH PLAIN' })
		);
	await deliverDue(database.db, badLogin);
	await database.db.update(mails).set({ nextTryAt: sql`now()` });
	expect(await deliverDue(database.db, () => Promise.resolve())).toEqual({ sent: 1, failed: 0 });
});

test('a letter whose last worker never came back is emptied, one that may be sent is not', async () => {
	await write('d@marram.example');
	await emptyAbandoned(database.db);
	expect((await kept())[0].text).toContain('/found/secret');
	await database.db.update(mails).set({ attempts: 12 });
	await emptyAbandoned(database.db);
	expect((await kept())[0]).toMatchObject({ text: '', html: '', sentAt: null });
});

test('workers at once take each mail once, and hold nothing while they send', async () => {
	for (let i = 0; i < 12; i++) await write(`person-${i}@marram.example`);
	const sent: string[] = [];
	const send = async ({ recipient }: Mail) => {
		// The row is free: another connection may write it while the server is talked to.
		await database.db.update(mails).set({ subject: 'read' }).where(eq(mails.recipient, recipient));
		sent.push(recipient);
	};
	await Promise.all([1, 2, 3].map(() => deliverDue(database.db, send)));
	expect(sent.toSorted()).toEqual([...new Set(sent)].toSorted());
	expect(sent).toHaveLength(12);
});

test('pauses double from a quarter of a minute to six hours', () => {
	expect([1, 2, 3, 12].map(pauseAfter)).toEqual([15, 30, 60, 21_600]);
});
