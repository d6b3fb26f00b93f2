import { onDuty } from './behalf';
import type { Database } from './client';

type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

/** A transaction of accounts' own work: with people who are not signed in, or not of the yard yet. */
export function inAccounts<T>(db: Database, work: (tx: Transaction) => Promise<T>): Promise<T> {
	return onDuty('accounts', () => db.transaction(work));
}
