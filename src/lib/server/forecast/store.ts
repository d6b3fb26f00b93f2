import type { Hourly, Member } from '../../engine';
import type { ForecastRun, ProviderName, providerStates } from '../db/schema';

export type ProviderState = typeof providerStates.$inferSelect;

/** A run without its members. */
export type StoredRun = Omit<ForecastRun, 'members'>;
/** A run without its series. */
export type RunHead = Omit<StoredRun, 'hourly'>;
/** A run as another run's history needs it. */
export type RunHours = Pick<ForecastRun, 'issuedAt' | 'fetchedAt' | 'hourly'>;

export interface NewRun {
	yardId: string;
	provider: ProviderName;
	issuedAt: Date;
	fetchedAt: Date;
	hourly: Hourly;
	members: Member[] | null;
}

/** Where runs and what is known of the providers are kept. */
export interface ForecastStore {
	/**
	 * Runs `work` while no other process can for this yard; everything it writes appears at once,
	 * or, if it throws, not at all.
	 *
	 * @returns null at once when another process is at it
	 */
	withYardLock<T>(yardId: string, work: (store: ForecastStore) => Promise<T>): Promise<T | null>;
	states(yardId: string): Promise<ProviderState[]>;
	saveState(state: ProviderState): Promise<void>;
	/** The newest run of each provider. */
	latestRuns(yardId: string): Promise<RunHead[]>;
	/** @returns null when it has been pruned meanwhile */
	run(runId: string): Promise<StoredRun | null>;
	/**
	 * A run's ensemble members: ten times the rest of it, so read only by whoever judges in them.
	 *
	 * @returns null when it has none or has been pruned meanwhile
	 */
	members(runId: string): Promise<Member[] | null>;
	/** Runs fetched before `before` and issued since `since`, newest first, at most `limit`. */
	earlierRuns(yardId: string, since: Date, before: Date, limit: number): Promise<RunHours[]>;
	/** @returns the new run's id */
	addRun(run: NewRun): Promise<string>;
	/** Deletes what no longer serves; see `prunable`. */
	prune(yardId: string, now: Date): Promise<void>;
	/** Forgets everything of a yard, as is due when it has moved. */
	forget(yardId: string): Promise<void>;
}
