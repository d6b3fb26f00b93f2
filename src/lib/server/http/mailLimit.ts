import { takeTry, type TryLimit } from '../access/tries';
import type { Database } from '../db/client';

/** Letters that an address on the network, and one recipient, may cause in an hour. */
const BY_ADDRESS: TryLimit = { kind: 'mail from', most: 20, minutes: 60 };
const BY_RECIPIENT: TryLimit = { kind: 'mail to', most: 5, minutes: 60 };

/** Minutes to wait before another letter may be caused; null where one may be now. */
export async function mailPause(
	db: Database,
	address: string,
	recipient: string
): Promise<number | null> {
	return (
		(await takeTry(db, BY_ADDRESS, address)) ??
		(await takeTry(db, BY_RECIPIENT, recipient.toLowerCase()))
	);
}
