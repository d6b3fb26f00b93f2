import { createServer } from 'node:http';
import { pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import { SMTPServer } from 'smtp-server';
import { readMessage, type KeptMessage } from './message';
import { listPage, messagePage } from './pages';

const MOST_KEPT = 200;
const MOST_BYTES = 10_000_000;

/** A mail server that keeps what it is sent, and a page on which a developer reads it. */
export interface MailFake {
	smtpUrl: string;
	pageUrl: string;
	messages: () => readonly KeptMessage[];
	close: () => Promise<void>;
}

/** Starts the mail fake on loopback; port 0 takes a free one. */
export async function startMailFake({ smtpPort = 0, pagePort = 0 } = {}): Promise<MailFake> {
	const kept: KeptMessage[] = [];
	let received = 0;
	const smtp = new SMTPServer({
		authOptional: true,
		disabledCommands: ['STARTTLS'],
		size: MOST_BYTES,
		onData(stream, session, done) {
			const chunks: Buffer[] = [];
			stream.on('data', (chunk: Buffer) => chunks.push(chunk));
			stream.on('end', () => {
				const to = session.envelope.rcptTo.map(({ address }) => address);
				readMessage(++received, to, Buffer.concat(chunks)).then(
					(message) => {
						kept.push(message);
						if (kept.length > MOST_KEPT) kept.shift();
						done();
					},
					(error: unknown) => done(error instanceof Error ? error : new Error('unreadable message'))
				);
			});
		}
	});
	const page = createServer((request, response) => {
		const id = /^\/message\/(\d+)$/.exec(request.url ?? '')?.[1];
		const message = kept.find((it) => it.id === Number(id));
		if (request.url === '/messages.json') {
			response.setHeader('content-type', 'application/json').end(JSON.stringify(kept));
			return;
		}
		response.setHeader('content-type', 'text/html; charset=utf-8');
		// Whatever a message holds, its scripts do not run here.
		response.setHeader('content-security-policy', "default-src 'none'; style-src 'unsafe-inline'");
		if (id !== undefined && message === undefined) response.statusCode = 404;
		response.end(message === undefined ? listPage(kept) : messagePage(message));
	});
	await new Promise<void>((resolve) => smtp.listen(smtpPort, '127.0.0.1', resolve));
	await new Promise<void>((resolve) => page.listen(pagePort, '127.0.0.1', resolve));
	const portOf = (address: ReturnType<typeof page.address>): number =>
		typeof address === 'object' && address !== null ? address.port : 0;
	return {
		smtpUrl: `smtp://127.0.0.1:${portOf(smtp.server.address())}`,
		pageUrl: `http://127.0.0.1:${portOf(page.address())}`,
		messages: () => kept,
		async close() {
			await new Promise<void>((resolve) => smtp.close(() => resolve()));
			await new Promise<void>((resolve) => page.close(() => resolve()));
		}
	};
}

async function main(): Promise<void> {
	const { values } = parseArgs({
		options: {
			'smtp-port': { type: 'string', default: '1025' },
			'page-port': { type: 'string', default: '1080' }
		}
	});
	const fake = await startMailFake({
		smtpPort: Number(values['smtp-port']),
		pagePort: Number(values['page-port'])
	});
	process.stdout.write(`Mail fake on ${fake.smtpUrl}, to be read at ${fake.pageUrl}\n`);
	for (const signal of ['SIGINT', 'SIGTERM'] as const)
		process.once(signal, () => void fake.close().then(() => process.exit(0)));
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href)
	await main();
