import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startStorageFake, type StorageFake } from '../../../fakes/storage/server';
import { readConfig } from '../../../src/lib/server/config';
import { storageOf } from '../../../src/lib/server/files/storage/choose';
import type { FileStorage } from '../../../src/lib/server/files/storage/storage';

const BUCKET = 'pictures';
const KEY_ID = 'tests';
const NEEDED = {
	DATABASE_URL: 'postgresql://yard@127.0.0.1/yard',
	ORIGIN: 'http://127.0.0.1'
};
/** Over two parts of an upload to S3. */
const LARGE = Buffer.alloc(11 * 1024 * 1024, 'large ');

let folder: string;
let fake: StorageFake;
beforeAll(async () => {
	folder = await mkdtemp(join(tmpdir(), 'yardglass-files-'));
	fake = await startStorageFake({ bucket: BUCKET, accessKeyId: KEY_ID });
});
afterAll(async () => {
	await fake.close();
	await rm(folder, { recursive: true });
});

const s3 = () =>
	storageOf(
		readConfig({
			...NEEDED,
			FILES_STORAGE: 's3',
			S3_ENDPOINT: fake.url,
			S3_BUCKET: BUCKET,
			S3_ACCESS_KEY_ID: KEY_ID,
			S3_SECRET_ACCESS_KEY: 'not verified'
		})
	);
const disk = () => storageOf(readConfig({ ...NEEDED, FILES_FOLDER: folder }));

/** Names of everything in the storage, finished or not. */
const STORAGES: [string, () => FileStorage, () => Promise<string[]>][] = [
	[
		'disk',
		disk,
		async () => {
			const entries = await readdir(folder, { recursive: true, withFileTypes: true });
			return entries.filter((entry) => entry.isFile()).map(({ name }) => name);
		}
	],
	[
		's3',
		s3,
		() => {
			const { keys, unfinished } = fake.state();
			return Promise.resolve([...keys, ...Array<string>(unfinished).fill('unfinished')]);
		}
	]
];

async function read(storage: FileStorage, key: string, range?: { first: number; last: number }) {
	const got = await storage.get(key, range);
	return got === null ? null : { bytes: got.bytes, body: await buffer(got.stream) };
}

describe.each(STORAGES)('%s', (_, open, everything) => {
	let storage: FileStorage;
	beforeAll(() => {
		storage = open();
	});
	afterAll(() => storage.close());

	test('gives back what was put, whole and in part, and knows its size', async () => {
		await storage.put(
			'yard/abc/original',
			Readable.from([Buffer.from('pitch '), Buffer.from('pine')])
		);
		expect((await read(storage, 'yard/abc/original'))?.body.toString()).toBe('pitch pine');
		const part = await read(storage, 'yard/abc/original', { first: 6, last: 8 });
		expect(part?.body.toString()).toBe('pin');
		expect(part?.bytes).toBe(10);
		expect(await storage.size('yard/abc/original')).toBe(10);
	});

	test('keeps something larger than a part', async () => {
		await storage.put('yard/large/original', Readable.from([LARGE]));
		const got = await read(storage, 'yard/large/original');
		expect(got?.body.equals(LARGE)).toBe(true);
		await storage.delete('yard/large/original');
	});

	test('putting again replaces', async () => {
		await storage.put('yard/abc/320', Readable.from([Buffer.from('first and long')]));
		await storage.put('yard/abc/320', Readable.from([Buffer.from('second')]));
		expect((await read(storage, 'yard/abc/320'))?.body.toString()).toBe('second');
	});

	test('what is not there is null, and deleting it does nothing', async () => {
		expect(await storage.get('yard/none/original')).toBeNull();
		expect(await storage.size('yard/none/original')).toBeNull();
		await storage.delete('yard/none/original');
	});

	test.each([
		['early', 1],
		['after the first part', LARGE.length]
	])('a source that fails %s leaves nothing', async (_when, after) => {
		const before = await everything();
		function* failing() {
			yield LARGE.subarray(0, after);
			throw new Error('the sender went away');
		}
		await expect(storage.put('yard/def/original', Readable.from(failing()))).rejects.toThrow(
			'the sender went away'
		);
		expect(await storage.get('yard/def/original')).toBeNull();
		expect(await everything()).toEqual(before);
	});

	test('after deleting nothing is left', async () => {
		await storage.delete('yard/abc/original');
		await storage.delete('yard/abc/320');
		expect(await storage.get('yard/abc/original')).toBeNull();
		expect(await everything()).toEqual([]);
	});

	test('a key that could lead elsewhere is refused', async () => {
		for (const key of ['../out', '/etc/x', 'yard//x', 'yard/../x', 'Yard/x', ''])
			await expect(storage.size(key)).rejects.toThrow('is no key of a stored file');
	});
});

describe('a store that fails', () => {
	let storage: FileStorage;
	beforeAll(async () => {
		storage = s3();
		await storage.put('yard/abc/original', Readable.from([LARGE]));
	});
	afterAll(async () => {
		fake.setFaults([]);
		await storage.delete('yard/abc/original');
		storage.close();
	});

	test('for a moment is asked again', async () => {
		fake.setFaults([{ kind: 'serverError', times: 2 }]);
		expect(await storage.size('yard/abc/original')).toBe(LARGE.length);
	});

	test('for good says so', async () => {
		fake.setFaults([{ kind: 'serverError' }]);
		await expect(storage.get('yard/abc/original')).rejects.toMatchObject({ name: 'SlowDown' });
	});

	test('in the middle of an object does not give it for whole', async () => {
		fake.setFaults([{ kind: 'brokenOff', times: 1 }]);
		await expect(read(storage, 'yard/abc/original')).rejects.toThrow();
	});

	test('in the middle of an upload leaves none unfinished', async () => {
		fake.setFaults([{ kind: 'laterPartsRefused' }]);
		await expect(storage.put('yard/def/original', Readable.from([LARGE]))).rejects.toThrow();
		expect(fake.state()).toEqual({ keys: ['yard/abc/original'], unfinished: 0 });
	});

	test('to know the key is told from a missing object', async () => {
		fake.setFaults([{ kind: 'denied' }]);
		await expect(storage.get('yard/none/original')).rejects.toMatchObject({ name: 'AccessDenied' });
	});
});

test('S3 without what it needs is refused, and each missing key named', () => {
	const config = readConfig({ ...NEEDED, FILES_STORAGE: 's3', S3_BUCKET: BUCKET });
	expect(() => storageOf(config)).toThrow(
		/FILES_STORAGE is s3, and S3_ACCESS_KEY_ID is missing; S3_SECRET_ACCESS_KEY is missing/
	);
});
