import { SAMPLE_SHEETS } from '../../engine';
import { sheets } from '../db/schema';
import type { Writer } from '../mail/outbox';

/** Lays the sample sheets into a yard's library, marked as samples; returns their ids by name. */
export async function laySamples(db: Writer, yardId: string): Promise<Map<string, string>> {
	const samples = Object.entries(SAMPLE_SHEETS);
	const rows = await db
		.insert(sheets)
		.values(
			samples.map(([, { name, limits, times, hazards }]) => ({
				yardId,
				name,
				sample: true,
				limits,
				times,
				hazards
			}))
		)
		.returning({ id: sheets.id });
	return new Map(samples.map(([key], i) => [key, rows[i].id]));
}
