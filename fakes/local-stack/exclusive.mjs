import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

const POLL_MS = 300;

function holderLives(folder) {
	try {
		process.kill(Number(readFileSync(join(folder, 'pid'), 'utf8')), 0);
		return true;
	} catch (error) {
		return error.code === 'EPERM';
	}
}

/** Takes a lock (a folder made in one act); null where a living process holds it. */
export function takeLock(folder) {
	for (let attempt = 0; attempt < 2; attempt++) {
		try {
			mkdirSync(folder);
			writeFileSync(join(folder, 'pid'), String(process.pid));
			return { release: () => rmSync(folder, { recursive: true, force: true }) };
		} catch (error) {
			if (error.code !== 'EEXIST') throw error;
			if (holderLives(folder)) return null;
			// Left by a process that was killed.
			rmSync(folder, { recursive: true, force: true });
		}
	}
	return null;
}

/** Runs work while nobody else with the same lock does, waiting as long as it takes. */
export async function exclusively(folder, work) {
	let lock = takeLock(folder);
	while (lock === null) {
		await wait(POLL_MS);
		lock = takeLock(folder);
	}
	try {
		return await work();
	} finally {
		lock.release();
	}
}
