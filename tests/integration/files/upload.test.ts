import { randomUUID } from 'node:crypto';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { deflateSync } from 'node:zlib';
import exifr from 'exifr';
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import sharp from 'sharp';
import type { File } from '../../../src/lib/api/files';
import type { SignedInUser } from '../../../src/lib/server/access/sessions';
import { composeWeb, parts } from '../../../src/lib/server/composition';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import { changes, files, keptBlobs } from '../../../src/lib/server/db/schema';
import { sweepFiles } from '../../../src/lib/server/files/sweep';
import {
	GET as LIST,
	POST
} from '../../../src/routes/api/v1/yards/[slug]/boats/[boat]/files/+server';
import {
	DELETE,
	GET as ONE
} from '../../../src/routes/api/v1/yards/[slug]/boats/[boat]/files/[file]/+server';
import { GET as READ } from '../../../src/routes/[yard]/files/[file]/[size]/+server';
import { packedZeros, pdfWith, photoWithPlace, program, vastPng } from '../../fixtures/files';
import { layTwoYards, type TwoYards } from '../../fixtures/twoYards';
import { createTestDatabase } from '../../setup/database';

let database: Awaited<ReturnType<typeof createTestDatabase>>;
let two: TwoYards;
let folder: string;
let boat: string;

beforeAll(async () => {
	folder = await mkdtemp(join(tmpdir(), 'yardglass-files-'));
	database = await createTestDatabase();
	composeWeb(
		{
			DATABASE_URL: database.webUrl,
			ORIGIN: 'http://127.0.0.1',
			LOG_LEVEL: 'silent',
			FILES_FOLDER: folder
		},
		'required'
	);
	two = await layTwoYards(database.db);
	boat = two.boatOf.get(two.own.step) ?? '';
});
afterAll(async () => {
	await parts().close();
	await database.drop();
	await rm(folder, { recursive: true });
});

interface Asked {
	user?: SignedInUser;
	slug?: string;
	boat?: string;
	file?: string;
	size?: string;
	method?: string;
	query?: Record<string, string>;
	headers?: Record<string, string>;
	body?: Uint8Array;
}
/** What a handler of the API answers somebody, by default the owner on their own boat. */
async function ask(handler: (event: never) => unknown, asked: Asked = {}): Promise<Response> {
	const { user = two.people.owner, slug = two.own.slug, method = 'GET' } = asked;
	const url = new URL('http://127.0.0.1/x');
	url.search = new URLSearchParams(asked.query).toString();
	const params = {
		slug,
		yard: slug,
		boat: asked.boat ?? boat,
		file: asked.file ?? '',
		size: asked.size ?? ''
	};
	const headers = { 'content-type': 'application/octet-stream', ...asked.headers };
	const body = asked.body === undefined ? undefined : Buffer.from(asked.body);
	const request = new Request(url, { method, headers, body });
	const locals = { user, session: null, requestId: 'test' };
	const event = { url, params, locals, request } as never;
	return onBehalfOf(user.id, async () => (await handler(event)) as Response);
}

async function send(body: Uint8Array, asked: Asked & { id?: string; name?: string } = {}) {
	const { id = randomUUID(), name = 'keel.jpg', ...rest } = asked;
	const query = { id, name, caption: 'the keel, blasted' };
	const answer = await ask(POST, { method: 'POST', body, query, ...rest });
	return { status: answer.status, body: (await answer.json()) as File & { detail: string } };
}
const read = (file: string, size: string, asked: Asked = {}) => ask(READ, { file, size, ...asked });
/** Whatever lies in the folder of files. */
async function lying(): Promise<string[]> {
	const entries = await readdir(folder, { recursive: true, withFileTypes: true });
	return entries
		.filter((it) => it.isFile())
		.map(({ parentPath, name }) => join(parentPath, name))
		.sort();
}
const rowsOf = (sha256: string) => database.db.select().from(files).where(eq(files.sha256, sha256));

describe('a photo', () => {
	test('is kept upright, without where it was taken, and with smaller copies', async () => {
		const sent = await photoWithPlace(2000, 1500);
		expect((await exifr.gps(sent)).latitude).toBeCloseTo(37.0167, 3);
		const { status, body } = await send(sent, { name: '../../C:\\Sand\\keel\u202egpj.exe' });
		expect(status).toBe(201);
		expect(body).toMatchObject({
			kind: 'photo',
			mediaType: 'image/jpeg',
			width: 1500,
			height: 2000,
			name: 'keelgpj.jpg',
			caption: 'the keel, blasted',
			uploadedBy: two.people.owner.name,
			mayDelete: true
		});
		const original = Buffer.from(await (await read(body.id, 'original')).arrayBuffer());
		expect(original.length).toBe(body.bytes);
		expect(await exifr.gps(original)).toBeUndefined();
		expect(await exifr.parse(original)).toBeUndefined();
		const { exif, xmp, iptc, orientation } = await sharp(original).metadata();
		expect([exif, xmp, iptc, orientation]).toEqual([undefined, undefined, undefined, undefined]);
		for (const [size, height] of [
			['320', 320],
			['1280', 1280]
		] as const) {
			const answer = await read(body.id, size);
			expect(answer.headers.get('content-type')).toBe('image/webp');
			const copy = await sharp(Buffer.from(await answer.arrayBuffer())).metadata();
			expect(copy).toMatchObject({ format: 'webp', height });
			expect(copy.exif).toBeUndefined();
		}
	});

	test('is written down as who added what to which boat', async () => {
		const { body } = await send(await photoWithPlace(100, 80));
		const [change] = await database.db.select().from(changes).where(eq(changes.rowId, body.id));
		expect(change).toMatchObject({
			subject: 'files',
			action: 'INSERT',
			personName: two.people.owner.name,
			boatId: boat
		});
	});

	test.each(['png', 'webp', 'avif'] as const)('may be %s', async (format) => {
		const base = sharp({ create: { width: 90, height: 60, channels: 3, background: 'teal' } });
		const { status, body } = await send(await base[format]().toBuffer(), { name: `a.${format}` });
		expect(status).toBe(201);
		expect(body).toMatchObject({ kind: 'photo', width: 90, height: 60 });
	});

	test('sent again under its id is there once, and another under that id is refused', async () => {
		const id = randomUUID();
		const photo = await photoWithPlace(120, 90);
		const first = await send(photo, { id });
		const again = await send(photo, { id });
		expect([first.status, again.status]).toEqual([201, 200]);
		expect(again.body.id).toBe(id);
		expect(await rowsOf(first.body.sha256)).toHaveLength(1);
		const other = await send(await photoWithPlace(121, 90), { id });
		expect(other.status).toBe(409);
		expect(other.body.detail).toMatch(/make a new one for each file/);
		const foreign = await send(photo, {
			id,
			slug: two.other.slug,
			boat: two.boatOf.get(two.other.step) ?? '',
			user: two.other.manager
		});
		expect(foreign.status).toBe(409);
	});

	test('sent by two at once under one id is there once', async () => {
		const id = randomUUID();
		const photo = await photoWithPlace(122, 90);
		const both = await Promise.all([send(photo, { id }), send(photo, { id })]);
		expect(both.map(({ status }) => status).sort()).toEqual([200, 201]);
	});
});

describe('equal bytes', () => {
	test('lie once in a yard, apart from another yard’s, and go with the last file', async () => {
		const photo = await photoWithPlace(150, 90);
		const [one, second] = [await send(photo), await send(photo)];
		const theirs = await send(photo, {
			slug: two.other.slug,
			boat: two.boatOf.get(two.other.step) ?? '',
			user: two.other.manager
		});
		expect(second.body.sha256).toBe(one.body.sha256);
		const originals = async () =>
			(await lying()).filter((path) => path.endsWith(`${one.body.sha256}/original`));
		expect(await originals()).toHaveLength(2);
		const inTwoHours = new Date(Date.now() + 2 * 3_600_000);
		const sweep = () => sweepFiles({ ...parts(), db: database.db }, inTwoHours);
		for (const [file, left] of [
			[one, 2],
			[second, 1]
		] as const) {
			const gone = await ask(DELETE, { method: 'DELETE', file: file.body.id });
			expect(gone.status).toBe(204);
			await sweep();
			expect(await originals()).toHaveLength(left);
		}
		const kept = await read(theirs.body.id, 'original', {
			slug: two.other.slug,
			user: two.other.manager
		});
		expect(kept.status).toBe(200);
		const asked = await database.pool.query(
			`select 1 from graphile_worker.jobs where task_identifier = 'sweepFiles'`
		);
		expect(asked.rowCount).toBe(1);
		const noted = await database.db
			.select()
			.from(keptBlobs)
			.where(eq(keptBlobs.sha256, one.body.sha256));
		expect(noted).toHaveLength(1);
	});

	test('are put again where a sweep has just deleted them', async () => {
		const photo = await photoWithPlace(151, 90);
		const first = await send(photo);
		await ask(DELETE, { method: 'DELETE', file: first.body.id });
		const later = new Date(Date.now() + 2 * 3_600_000);
		const [, again] = await Promise.all([
			sweepFiles({ ...parts(), db: database.db }, later),
			send(photo)
		]);
		expect((await read(again.body.id, 'original')).status).toBe(200);
	});
});

describe('what is refused leaves nothing behind', () => {
	let before: string[];
	beforeEach(async () => {
		before = await lying();
	});
	async function refused(body: Uint8Array, name: string): Promise<[number, string]> {
		const answer = await send(body, { name });
		expect(await lying()).toEqual(before);
		return [answer.status, answer.body.detail];
	}

	test('a program under a picture’s name', async () => {
		const [status, why] = await refused(program(), 'keel.jpg');
		expect(status).toBe(415);
		expect(why).toMatch(/^keel\.jpg is a program for Windows, whatever its name says\./);
	});

	test('a picture of 200 megapixels', async () => {
		const vast = vastPng(20_000, 10_000);
		expect(vast.length).toBeLessThan(50_000);
		const [status, why] = await refused(vast, 'vast.png');
		expect(status).toBe(413);
		expect(why).toMatch(/has 200 megapixels \(20000 × 10000\); at most 64 are taken/);
	});

	test('a picture that moves, one cut off, text, and nothing at all', async () => {
		const frame = { width: 20, height: 20, channels: 3 as const };
		const frames = await Promise.all(
			['teal', 'coral'].map((background) =>
				sharp({ create: { ...frame, background } })
					.png()
					.toBuffer()
			)
		);
		const moving = await sharp(frames, { join: { animated: true } })
			.webp()
			.toBuffer();
		expect(await refused(moving, 'a.webp')).toEqual([
			415,
			'a.webp holds 2 pictures; send one that does not move.'
		]);
		const cut = (await photoWithPlace(800, 600)).subarray(0, 3000);
		expect(await refused(cut, 'cut.jpg')).toEqual([
			400,
			'cut.jpg is broken or cut off: the picture in it cannot be read.'
		]);
		expect((await refused(Buffer.from('<svg onload="x()"/>'), 'a.png'))[0]).toBe(415);
		expect(await refused(Buffer.from('hello'), 'a.txt')).toEqual([
			415,
			'a.txt is neither a picture nor a PDF, whatever its name says. Photos (JPEG, PNG, WebP, AVIF) and PDFs are taken.'
		]);
	});

	test('a PDF that unpacks to far more than it is, also packed twice', async () => {
		const packed = await packedZeros(450);
		expect(packed.length).toBeLessThan(600_000);
		for (const bomb of [
			pdfWith(packed),
			pdfWith(deflateSync(packed), '[/FlateDecode /FlateDecode]'),
			// A false end before the rest of the packed bytes stops nobody.
			pdfWith(packed, '5 0 R')
		]) {
			const [status, why] = await refused(bomb, 'sheet.pdf');
			expect(status).toBe(413);
			expect(why).toMatch(/^sheet\.pdf is small but unpacks to more than 400 MB/);
		}
	});

	test('a PDF packed in more layers than any writer makes', async () => {
		let packed: Buffer = Buffer.from('yard');
		for (let i = 0; i < 6; i++) packed = deflateSync(packed);
		expect((await refused(pdfWith(packed), 'deep.pdf'))[0]).toBe(413);
	});

	test('a photo and a PDF larger than they may be', async () => {
		const large = Buffer.concat([await photoWithPlace(), Buffer.alloc(30_000_000)]);
		expect(await refused(large, 'large.jpg')).toEqual([
			413,
			'large.jpg is larger than 30 MB, the most a photo may have. Nothing of it was kept.'
		]);
		const long = pdfWith(Buffer.alloc(20_500_000));
		expect(await refused(long, 'long.pdf')).toEqual([
			413,
			'long.pdf is larger than 20 MB, the most a PDF may have. Nothing of it was kept.'
		]);
	});
});

describe('a PDF', () => {
	const sheet = pdfWith(deflateSync(Buffer.from('BT (mix well) Tj ET')));

	test('is kept as it came, saved and not shown, and given in parts', async () => {
		const { status, body } = await send(sheet, { name: 'Epoxy – sheet.pdf' });
		expect(status).toBe(201);
		expect(body).toMatchObject({ kind: 'pdf', width: null, bytes: sheet.length });
		expect(Object.keys(body.addresses)).toEqual(['original']);
		const answer = await read(body.id, 'original');
		expect(Buffer.from(await answer.arrayBuffer()).equals(sheet)).toBe(true);
		expect(Object.fromEntries(answer.headers)).toMatchObject({
			'content-type': 'application/pdf',
			'content-disposition': "attachment; filename*=UTF-8''Epoxy%20%E2%80%93%20sheet.pdf",
			'content-security-policy': expect.stringContaining('sandbox'),
			'x-content-type-options': 'nosniff',
			'cache-control': 'private, no-cache'
		});
		const etag = answer.headers.get('etag') ?? '';
		const part = await read(body.id, 'original', { headers: { range: 'bytes=5-7' } });
		expect(part.status).toBe(206);
		expect(part.headers.get('content-range')).toBe(`bytes 5-7/${sheet.length}`);
		expect(await part.text()).toBe('1.7');
		const end = await read(body.id, 'original', { headers: { range: 'bytes=-6' } });
		expect(await end.text()).toBe('%%EOF\n');
		const beyond = await read(body.id, 'original', { headers: { range: 'bytes=99999999-' } });
		expect(beyond.status).toBe(416);
		const other = await read(body.id, 'original', {
			headers: { range: 'bytes=5-7', 'if-range': '"another"' }
		});
		expect(other.status).toBe(200);
		const known = await read(body.id, 'original', { headers: { 'if-none-match': etag } });
		expect(known.status).toBe(304);
		await expect(read(body.id, '320')).rejects.toMatchObject({ status: 404 });
	});
});

describe('who may', () => {
	let mine: File;
	beforeAll(async () => {
		mine = (await send(await photoWithPlace(160, 90), { user: two.people.painter })).body;
	});
	const foreignBoat = () => two.boatOf.get(two.own.stepOfAnother) ?? '';

	test('read: everybody who sees the boat, and nobody else', async () => {
		for (const user of Object.values(two.people)) {
			expect((await read(mine.id, '320', { user })).status).toBe(200);
			const list = (await (await ask(LIST, { user })).json()) as { files: File[] };
			expect(list.files.map(({ id }) => id)).toContain(mine.id);
		}
		const { manager } = two.people;
		const theirs = await send(await photoWithPlace(161, 90), {
			user: manager,
			boat: foreignBoat()
		});
		for (const user of [two.people.owner, two.people.painter]) {
			await expect(read(theirs.body.id, 'original', { user })).rejects.toMatchObject({
				status: 404
			});
			const one = await ask(ONE, { user, boat: foreignBoat(), file: theirs.body.id });
			expect(one.status).toBe(404);
			const through = await ask(ONE, { user, file: theirs.body.id });
			expect(through.status).toBe(404);
		}
		const stranger = two.other.manager;
		await expect(read(mine.id, '320', { user: stranger })).rejects.toMatchObject({ status: 404 });
		await expect(
			read(mine.id, '320', { user: stranger, slug: two.other.slug })
		).rejects.toMatchObject({ status: 404 });
	});

	test('add: nobody to a boat they may not see', async () => {
		const photo = await photoWithPlace(162, 90);
		expect((await send(photo, { user: two.people.painter, boat: foreignBoat() })).status).toBe(404);
		expect((await send(photo, { user: two.other.manager })).status).toBe(404);
	});

	test('delete: who added it, and a manager', async () => {
		const drop = (user: SignedInUser, file: string) =>
			ask(DELETE, { method: 'DELETE', user, file });
		expect((await drop(two.people.owner, mine.id)).status).toBe(403);
		expect((await drop(two.people.painter, mine.id)).status).toBe(204);
		expect((await drop(two.people.painter, mine.id)).status).toBe(404);
		const other = await send(await photoWithPlace(163, 90));
		expect((await drop(two.people.manager, other.body.id)).status).toBe(204);
		const [left] = await database.db
			.select()
			.from(changes)
			.where(and(eq(changes.rowId, other.body.id), eq(changes.action, 'DELETE')));
		expect(left).toMatchObject({ personName: two.people.manager.name });
	});
});
