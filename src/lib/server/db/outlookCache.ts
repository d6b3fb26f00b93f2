import { inArray, lt } from 'drizzle-orm';
import { z } from 'zod';
import type { Database } from './client';
import { outlooks } from './schema';

/** Hours of one step over the page's axis, as they are kept: one code or number a slot. */
export const keptHoursSchema = z.object({
	/** base64 of codes of STATES and of LIMITERS. */
	state: z.string(),
	limiter: z.string(),
	/** base64 of Float32, little end first; NaN unknown. */
	room: z.string(),
	durationSlots: z.int(),
	flags: z.array(z.string()),
	/** What is missing, per slot that is shut for want of data: [from, to, words]. */
	missing: z.array(z.tuple([z.int(), z.int(), z.string()]))
});
export type KeptHours = z.infer<typeof keptHoursSchema>;

/** Kept hours by their keys; what does not read as this version writes it is passed over. */
export async function keptHours(db: Database, keys: string[]): Promise<Map<string, KeptHours>> {
	if (keys.length === 0) return new Map();
	const rows = await db
		.select({ key: outlooks.key, hours: outlooks.hours })
		.from(outlooks)
		.where(inArray(outlooks.key, keys));
	const kept = new Map<string, KeptHours>();
	for (const { key, hours } of rows) {
		const parsed = keptHoursSchema.safeParse(hours);
		if (parsed.success) kept.set(key, parsed.data);
	}
	return kept;
}

/** Keeps hours; another process that computed the same key first wins. */
export async function keepHours(
	db: Database,
	entries: { key: string; stepId: string; hours: KeptHours }[]
): Promise<void> {
	if (entries.length > 0) await db.insert(outlooks).values(entries).onConflictDoNothing();
}

/** Throws away what was kept before an instant: it can be computed again at any time. */
export async function forgetHoursBefore(db: Database, before: Date): Promise<void> {
	await db.delete(outlooks).where(lt(outlooks.createdAt, before));
}
