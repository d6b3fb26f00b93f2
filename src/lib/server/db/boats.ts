import { asc, type SQL } from 'drizzle-orm';
import type { Database } from './client';
import { boats } from './schema';

/** Names of some boats, for a choice among them. */
export function boatNames(db: Database, which: SQL | undefined) {
	return db
		.select({ id: boats.id, name: boats.name })
		.from(boats)
		.where(which)
		.orderBy(asc(boats.name));
}
