import { readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { and, eq, lt, notExists, sql } from 'drizzle-orm';
import type { Composition } from '../composition';
import { files, keptBlobs } from '../db/schema';
import { incomingFolder } from './addFile';
import { keysOf } from './keys';

/** Between noting bytes and writing the row of their file lies less than this. */
const SETTLED_MS = 3_600_000;
/** A web process that ended in the middle of a file left it; none takes this long. */
const ABANDONED_MS = 86_400_000;

/**
 * Deletes bytes that no file has any more, and what a process left half received.
 *
 * @returns how many were deleted
 */
export async function sweepFiles(
	{ db, config, storage }: Pick<Composition, 'db' | 'config' | 'storage'>,
	now: Date
): Promise<number> {
	await forgetAbandoned(incomingFolder(config.FILES_FOLDER), now);
	let swept = 0;
	for (;;) {
		const one = await db.transaction(async (tx) => {
			const [blob] = await tx
				.select()
				.from(keptBlobs)
				.where(
					and(
						lt(keptBlobs.keptAt, new Date(now.getTime() - SETTLED_MS)),
						notExists(
							tx
								.select({ one: sql`1` })
								.from(files)
								.where(and(eq(files.yardId, keptBlobs.yardId), eq(files.sha256, keptBlobs.sha256)))
						)
					)
				)
				.limit(1)
				.for('update', { skipLocked: true });
			if (blob === undefined) return false;
			// Held meanwhile, so that who adds the same bytes waits, and puts them again.
			for (const key of keysOf(blob)) await storage.delete(key);
			await tx
				.delete(keptBlobs)
				.where(and(eq(keptBlobs.yardId, blob.yardId), eq(keptBlobs.sha256, blob.sha256)));
			return true;
		});
		if (!one) return swept;
		swept += 1;
	}
}

async function forgetAbandoned(folder: string, now: Date): Promise<void> {
	const names = await readdir(folder).catch(() => []);
	for (const name of names) {
		const path = join(folder, name);
		const { mtimeMs } = await stat(path).catch(() => ({ mtimeMs: Infinity }));
		if (now.getTime() - mtimeMs > ABANDONED_MS) await rm(path, { recursive: true, force: true });
	}
}
