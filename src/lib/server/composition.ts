import { createSessions, type Sessions } from './access/sessions';
import { readConfig, type Config } from './config';
import { createDatabase, type Database } from './db/client';
import { storageOf } from './files/storage/choose';
import type { FileStorage } from './files/storage/storage';
import { createLog, type Logger } from './log';

/** What a process is made of; made once at its start, handed to whatever serves a request. */
export interface Composition {
	readonly config: Config;
	readonly db: Database;
	readonly log: Logger;
	readonly sessions: Sessions;
	readonly storage: FileStorage;
	readonly close: () => Promise<void>;
}

/** Builds the parts from the environment. Throws ConfigError on a bad value. */
export function compose(
	environment: Record<string, string | undefined>,
	process: 'web' | 'worker',
	walls?: 'required'
): Composition {
	const config = readConfig(environment);
	const storage = storageOf(config);
	const { db, pool } = createDatabase(config.DATABASE_URL, walls);
	return {
		config,
		db,
		log: createLog(config.LOG_LEVEL, process),
		sessions: createSessions(db, { secure: config.ORIGIN.startsWith('https:') }),
		storage,
		close: async () => {
			storage.close();
			await pool.end();
		}
	};
}

let web: Composition | null = null;

/** Makes the web process's parts; called by the `init` hook, before the first request. */
export function composeWeb(
	environment: Record<string, string | undefined>,
	walls?: 'required'
): Composition {
	web = compose(environment, 'web', walls);
	return web;
}

/** The web process's parts. */
export function parts(): Composition {
	if (web === null) throw new Error('The web process has not been composed yet.');
	return web;
}
