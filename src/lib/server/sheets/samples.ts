import { SAMPLE_SHEETS, type SampleName } from '../../engine';
import { sheets } from '../db/schema';
import type { Writer } from '../mail/outbox';

const SAMPLES = Object.keys(SAMPLE_SHEETS) as SampleName[];

/** Lays the sample sheets into a yard's library, marked as samples; returns their ids by name. */
export async function laySamples(db: Writer, yardId: string): Promise<Map<SampleName, string>> {
	const rows = await db
		.insert(sheets)
		.values(SAMPLES.map((key) => ({ yardId, key, sheet: SAMPLE_SHEETS[key] })))
		.returning({ id: sheets.id });
	return new Map(SAMPLES.map((key, i) => [key, rows[i].id]));
}
