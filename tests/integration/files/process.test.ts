import { randomUUID } from 'node:crypto';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { request as httpRequest } from 'node:http';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { freePort } from '../../../drizzle/server/ports.mjs';
import { createSessions } from '../../../src/lib/server/access/sessions';
import { files } from '../../../src/lib/server/db/schema';
import { packedZeros, pdfWith, photoWithPlace, program, vastPng } from '../../fixtures/files';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';
import {
	BUILD_MS,
	endForSure,
	ensureBuilt,
	startNode,
	until,
	type Started
} from '../platform/processes';

/** Uploads to the built web process, and what it holds in memory meanwhile. */

const MEGABYTE = 1024 * 1024;
const TWO_GIGABYTES = 2 * 1024 * MEGABYTE;
/** Buffers of sockets and the garbage of a run; far from the 2 GB, or from 200 megapixels. */
const MOST_GROWTH = 120 * MEGABYTE;

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let web: Started;
let two: TwoYards;
let folder: string;
let origin: URL;
let cookie: string;
let boat: string;

beforeAll(async () => {
	await ensureBuilt();
	folder = await mkdtemp(join(tmpdir(), 'yardglass-files-'));
	database = await createTestDatabase();
	two = await layTwoYards(database.db);
	boat = two.boatOf.get(two.own.step) ?? '';
	const sessions = createSessions(database.db, { secure: false });
	const { name, value } = await sessions.create(two.people.owner.id);
	cookie = `${name}=${value}`;
	const port = await freePort();
	origin = new URL(`http://127.0.0.1:${port}`);
	web = startNode(['build/index.js'], {
		HOST: '127.0.0.1',
		PORT: String(port),
		ORIGIN: origin.origin,
		LOG_LEVEL: 'error',
		BODY_SIZE_LIMIT: 'Infinity',
		DATABASE_URL: database.webUrl,
		FILES_FOLDER: folder
	});
	await until(() => /Listening/.test(web.out()) || !web.lives(), 20_000, web.err);
	expect(web.lives(), web.err()).toBe(true);
	// What is loaded once is loaded before anything is measured.
	expect((await send([await photoWithPlace()])).status).toBe(201);
}, BUILD_MS + 60_000);
afterAll(async () => {
	await endForSure(web);
	await database.drop();
	await rm(folder, { recursive: true });
});

/** Bytes of memory that the web process holds. */
function resident(): number {
	const status = readFileSync(`/proc/${web.pid}/status`, 'utf8');
	return Number(/VmRSS:\s+(\d+) kB/.exec(status)?.[1]) * 1024;
}

interface Sent {
	readonly path?: string;
	readonly headers?: Record<string, string>;
}
interface Told {
	readonly status: number;
	readonly body: string;
	/** Bytes handed to the socket before the answer came. */
	readonly sent: number;
}

/** Whether an answer has come whole: as long as it says, or to its last chunk. */
function isWhole(answer: string): boolean {
	const end = answer.indexOf('\r\n\r\n');
	if (end === -1) return false;
	const length = /^content-length: (\d+)/im.exec(answer.slice(0, end))?.[1];
	return length === undefined
		? answer.endsWith('0\r\n\r\n')
		: Buffer.byteLength(answer.slice(end + 4)) >= Number(length);
}

/**
 * Posts chunk after chunk until all are sent or an answer comes. On a bare socket, so that what is
 * counted as sent has left for the server and waits in no library.
 */
async function send(chunks: Iterable<Uint8Array>, { path, headers }: Sent = {}): Promise<Told> {
	const query = new URLSearchParams({ id: randomUUID(), name: 'keel.jpg' });
	const socket = connect(Number(origin.port), origin.hostname);
	let answer = '';
	const answered = new Promise<void>((resolve) => {
		socket.on('data', (data) => {
			answer += data.toString('utf8');
			if (isWhole(answer)) resolve();
		});
		socket.once('close', resolve);
		// The line is cut after a refusal; the answer has come by then, or the test fails without one.
		socket.on('error', () => undefined);
	});
	const all = {
		host: origin.host,
		cookie,
		origin: origin.origin,
		'content-type': 'image/jpeg',
		...headers
	};
	const saysLength = 'content-length' in all;
	const lines = Object.entries({
		...all,
		...(saysLength ? {} : { 'transfer-encoding': 'chunked' })
	});
	const to = path ?? `/api/v1/yards/${two.own.slug}/boats/${boat}/files?${query}`;
	const head = lines.map(([name, value]) => `${name}: ${value}\r\n`).join('');
	socket.write(`POST ${to} HTTP/1.1\r\n${head}\r\n`);
	let sent = 0;
	for (const chunk of chunks) {
		if (answer !== '' || socket.destroyed) break;
		sent += chunk.byteLength;
		if (!saysLength) socket.write(`${chunk.byteLength.toString(16)}\r\n`);
		const goesOn = socket.write(chunk);
		if (!saysLength) socket.write('\r\n');
		if (!goesOn) await Promise.race([once(socket, 'drain').catch(() => undefined), answered]);
	}
	if (answer === '' && !saysLength && !socket.destroyed) socket.write('0\r\n\r\n');
	await answered;
	socket.destroy();
	if (!isWhole(answer)) throw new Error(`No whole answer came: ${answer}. ${web.err()}`);
	return { status: Number(answer.split(' ')[1]), body: answer, sent };
}

/** Runs work and tells how far memory rose over what it was before. */
async function measured(
	name: string,
	work: () => Promise<Told>
): Promise<Told & { growth: number }> {
	const before = resident();
	let peak = before;
	const sampling = setInterval(() => (peak = Math.max(peak, resident())), 20);
	const told = await work();
	clearInterval(sampling);
	await wait(500);
	const after = resident();
	const mb = (bytes: number): string => (bytes / MEGABYTE).toFixed(0);
	process.stdout.write(
		`${name}: ${told.status}, ${mb(told.sent)} MB sent, resident ${mb(before)} before, ${mb(peak)} at most, ${mb(after)} MB after\n`
	);
	return { ...told, growth: peak - before };
}

function* jpegFor(bytes: number): Generator<Uint8Array> {
	const chunk = Buffer.alloc(MEGABYTE);
	yield Buffer.concat([Buffer.from([0xff, 0xd8, 0xff, 0xe0]), chunk]);
	for (let gone = MEGABYTE; gone < bytes; gone += MEGABYTE) yield chunk;
}

/** Nothing of a refused file is left, on disk or in the table. */
async function nothingLeft(): Promise<void> {
	await until(async () => (await readdir(join(folder, 'incoming'))).length === 0, 5_000);
	expect(await database.db.select().from(files)).toHaveLength(1);
}

describe('refused, with memory as it was', () => {
	test('a program under a picture’s name', async () => {
		const told = await measured('renamed program', () => send([program()]));
		expect(told.status).toBe(415);
		expect(told.body).toContain('keel.jpg is a program for Windows, whatever its name says.');
		expect(told.growth).toBeLessThan(MOST_GROWTH);
		await nothingLeft();
	});

	test('a picture of 200 megapixels', async () => {
		const told = await measured('200 megapixels', () => send([vastPng(20_000, 10_000)]));
		expect(told.status).toBe(413);
		expect(told.body).toContain('has 200 megapixels');
		expect(told.growth).toBeLessThan(MOST_GROWTH);
		await nothingLeft();
	});

	test('a PDF that unpacks to two gigabytes', async () => {
		const bomb = pdfWith(await packedZeros(2_000));
		expect(bomb.length).toBeLessThan(3 * MEGABYTE);
		const told = await measured('PDF of 2 GB unpacked', () => send([bomb]));
		expect(told.status).toBe(413);
		expect(told.body).toContain('unpacks to more than 400 MB');
		expect(told.growth).toBeLessThan(MOST_GROWTH);
		await nothingLeft();
	});

	test('two gigabytes in a stream that does not say how long it is', async () => {
		const told = await measured('2 GB, length unsaid', () => send(jpegFor(TWO_GIGABYTES)));
		expect(told.status).toBe(413);
		expect(told.body).toContain('keel.jpg is larger than 30 MB, the most a photo may have.');
		expect(told.sent).toBeLessThan(100 * MEGABYTE);
		expect(told.growth).toBeLessThan(MOST_GROWTH);
		await nothingLeft();
	});

	test('two gigabytes that say so', async () => {
		const headers = { 'content-length': String(TWO_GIGABYTES) };
		const told = await measured('2 GB, length said', () =>
			send(jpegFor(TWO_GIGABYTES), { headers })
		);
		expect(told.status).toBe(413);
		expect(told.body).toContain('is larger than 30 MB');
		expect(told.sent).toBeLessThan(100 * MEGABYTE);
		expect(told.growth).toBeLessThan(MOST_GROWTH);
		await nothingLeft();
	});

	test('two gigabytes in a form', async () => {
		function* form(): Generator<Uint8Array> {
			yield Buffer.from(
				'--edge\r\ncontent-disposition: form-data; name="caption"\r\n\r\nthe keel\r\n' +
					'--edge\r\ncontent-disposition: form-data; name="files"; filename="keel.jpg"\r\n' +
					'content-type: image/jpeg\r\n\r\n'
			);
			yield* jpegFor(TWO_GIGABYTES);
		}
		const told = await measured('2 GB in a form', () =>
			send(form(), {
				path: `/${two.own.slug}/boats/${boat}/files?/upload`,
				headers: { 'content-type': 'multipart/form-data; boundary=edge', accept: 'text/html' }
			})
		);
		expect(told.status).toBe(413);
		expect(told.body).toContain('keel.jpg is larger than 30 MB');
		expect(told.body).toContain('the keel');
		expect(told.sent).toBeLessThan(100 * MEGABYTE);
		expect(told.growth).toBeLessThan(MOST_GROWTH);
		await nothingLeft();
	});

	test.each([
		['said', { 'content-length': String(TWO_GIGABYTES) }],
		['unsaid', {}]
	])('two gigabytes to an address that takes no files, length %s', async (_, length) => {
		function* form(): Generator<Uint8Array> {
			yield Buffer.from('template=');
			for (let gone = 0; gone < TWO_GIGABYTES; gone += MEGABYTE) yield Buffer.alloc(MEGABYTE, 'x');
		}
		const told = await measured(`2 GB to a small form, length ${_}`, () =>
			send(form(), {
				path: `/${two.own.slug}/boats/${boat}?/queue`,
				headers: { 'content-type': 'application/x-www-form-urlencoded', ...length }
			})
		);
		expect(told.status).toBe(413);
		expect(told.body).toContain('at most 512 KiB');
		expect(told.sent).toBeLessThan(100 * MEGABYTE);
		expect(told.growth).toBeLessThan(MOST_GROWTH);
	});
});

test('a sender that goes away in the middle leaves nothing', async () => {
	const query = new URLSearchParams({ id: randomUUID(), name: 'keel.jpg' });
	const post = httpRequest(
		new URL(`/api/v1/yards/${two.own.slug}/boats/${boat}/files?${query}`, origin),
		{ method: 'POST', headers: { cookie, 'content-type': 'image/jpeg' } }
	);
	post.on('error', () => undefined);
	for (const chunk of jpegFor(3 * MEGABYTE)) post.write(chunk);
	await until(async () => (await readdir(join(folder, 'incoming'))).length === 1, 5_000);
	post.destroy();
	await nothingLeft();
	expect(web.err()).toBe('');
});

test('and after all of it a photo is still taken', async () => {
	const { status, body } = await send([await photoWithPlace(330, 200)]);
	expect(status).toBe(201);
	const id = /"id":"([^"]+)"/.exec(body)?.[1] ?? '';
	const [row] = await database.db.select().from(files).where(eq(files.id, id));
	expect(row.uploadedBy).toBe(two.people.owner.id);
});
