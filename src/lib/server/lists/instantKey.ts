import { sql, type AnyColumn, type SQL } from 'drizzle-orm';
import { z } from 'zod';

/** Keys of lists that begin with an instant: to the microsecond, as the database keeps it. */

export const instantText = (column: AnyColumn): SQL<string> =>
	sql<string>`to_char(${column} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"')`;

/** An instant of such a key as it comes back. */
export const instantOfKey = z.iso.datetime({ precision: 6 });
