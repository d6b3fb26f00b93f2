import { Agent } from 'undici';

/** What the client takes from the world outside; tests put their own in. */
export interface HttpTools {
	/** Milliseconds since 1970. */
	clock(): number;
	sleep(milliseconds: number): Promise<void>;
	/** Uniform in [0, 1). */
	random(): number;
	/** Milliseconds for one try, headers and body together. */
	attemptTimeout: number;
	/** Milliseconds for all tries and the waits between them. */
	overallTimeout: number;
}

/** A true answer takes well under a second; a refresh holds a lock, so it must end soon. */
export const HTTP_TOOLS: HttpTools = {
	clock: Date.now,
	sleep: (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds)),
	random: Math.random,
	attemptTimeout: 8_000,
	overallTimeout: 20_000
};

const CONNECT_TIMEOUT_MS = 5_000;

let agent: Agent | undefined;

/** One pool of connections per process, made at the first request. */
export function sharedAgent(): Agent {
	agent ??= new Agent({ connections: 4, connect: { timeout: CONNECT_TIMEOUT_MS } });
	return agent;
}
