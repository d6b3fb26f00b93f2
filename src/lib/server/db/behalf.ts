import { AsyncLocalStorage } from 'node:async_hooks';

/** What the web process may do beyond the yards of the person who asks, each for its own tables. */
export type Duty =
	/** Finding accounts, sessions, links and invitations of people who are not signed in. */
	| 'accounts'
	/** Telling how the providers answer, over all yards. */
	| 'health';

/** On whose behalf queries run; the database's row-level security goes by it. */
export interface Behalf {
	readonly personId: string | null;
	readonly duty: Duty | null;
}

const NOBODY: Behalf = { personId: null, duty: null };
const storage = new AsyncLocalStorage<Behalf>();

/** On whose behalf this code runs. */
export const behalf = (): Behalf => storage.getStore() ?? NOBODY;

/**
 * Runs work on behalf of a person: its queries see that person's yards and no others. Null: none.
 *
 * Queries are only sent when they are awaited, so the work is awaited within.
 */
export function onBehalfOf<T>(personId: string | null, work: () => PromiseLike<T>): Promise<T> {
	return storage.run({ personId, duty: null }, async () => await work());
}

/**
 * Runs work that must see past the person who asks. A transaction keeps the behalf it was begun
 * with, so a duty goes round it, never into it.
 */
export function onDuty<T>(duty: Duty, work: () => PromiseLike<T>): Promise<T> {
	return storage.run({ ...behalf(), duty }, async () => await work());
}
