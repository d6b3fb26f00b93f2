import { DrizzleQueryError } from 'drizzle-orm/errors';
import { pino, stdSerializers, type Logger } from 'pino';

export type { Logger };

/**
 * The log of a process, JSON lines on standard output. A failed query's message holds its
 * parameters, which may be people's addresses or hashes: only its cause is written.
 */
export function createLog(level: string, process: 'web' | 'worker'): Logger {
	return pino({
		level,
		base: { process },
		serializers: {
			err: (error: unknown) => {
				const shown = error instanceof DrizzleQueryError ? error.cause : error;
				return shown instanceof Error ? stdSerializers.err(shown) : { message: 'unknown failure' };
			}
		}
	});
}
