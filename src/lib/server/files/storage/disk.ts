import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, rename, rm, rmdir, stat } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import type { Readable } from 'node:stream';
import { checkKey, type FileStorage } from './storage';

const isMissing = (error: unknown): boolean =>
	error instanceof Error && 'code' in error && error.code === 'ENOENT';

async function bytesOf(path: string): Promise<number | null> {
	try {
		return (await stat(path)).size;
	} catch (error) {
		if (isMissing(error)) return null;
		throw error;
	}
}

/** So that the new name outlives a power cut, as the bytes do. */
async function syncFolder(path: string): Promise<void> {
	const folder = await open(path, 'r');
	try {
		await folder.sync();
	} finally {
		await folder.close();
	}
}

/**
 * Files in a folder of this machine. Written under another name, brought to the disk, then
 * renamed: what stands under a key is whole.
 */
export function diskStorage(root: string): FileStorage {
	const kept = join(root, 'kept');
	const pathOf = (key: string): string => join(kept, checkKey(key));
	return {
		async put(key, source) {
			const path = pathOf(key);
			const unfinished = `${path}.${randomUUID()}.part`;
			await mkdir(dirname(path), { recursive: true });
			const file = await open(unfinished, 'wx');
			try {
				for await (const chunk of source as AsyncIterable<Uint8Array>) await file.appendFile(chunk);
				await file.sync();
				await file.close();
				await rename(unfinished, path);
				await syncFolder(dirname(path));
			} catch (error) {
				await file.close().catch(() => undefined);
				await rm(unfinished, { force: true });
				throw error;
			}
		},
		async get(key, range) {
			const path = pathOf(key);
			const bytes = await bytesOf(path);
			if (bytes === null) return null;
			const within = range === undefined ? {} : { start: range.first, end: range.last };
			const stream: Readable = createReadStream(path, within);
			return { stream, bytes };
		},
		size: async (key) => bytesOf(pathOf(key)),
		async delete(key) {
			const path = pathOf(key);
			await rm(path, { force: true });
			// Folders left empty go as well; one that is not, or has gone meanwhile, stays so.
			for (let folder = dirname(path); relative(kept, folder) !== ''; folder = dirname(folder)) {
				try {
					await rmdir(folder);
				} catch {
					return;
				}
			}
		},
		close: () => undefined
	};
}
