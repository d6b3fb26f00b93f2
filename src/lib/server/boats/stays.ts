import { desc, eq } from 'drizzle-orm';
import type { Database } from '../db/client';
import { stays } from '../db/schema';

/** Where a boat stood, latest first. The caller has made sure that the boat is theirs to see. */
export function staysOf(db: Database, boatId: string) {
	const { id, standName, heading, since, until, personName } = stays;
	return db
		.select({ id, standName, heading, since, until, personName })
		.from(stays)
		.where(eq(stays.boatId, boatId))
		.orderBy(desc(since));
}
