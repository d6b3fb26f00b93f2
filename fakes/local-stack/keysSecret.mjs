import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** What seals the yards' keys in a data folder: made once, so that those kept stay readable. */
export function keysSecret(dataFolder) {
	const file = join(dataFolder, 'keys-secret');
	mkdirSync(dataFolder, { recursive: true });
	try {
		writeFileSync(file, randomBytes(32).toString('base64url'), { flag: 'wx', mode: 0o600 });
	} catch (error) {
		if (error.code !== 'EEXIST') throw error;
	}
	return readFileSync(file, 'utf8');
}
