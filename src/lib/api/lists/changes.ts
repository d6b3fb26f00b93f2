import { z } from 'zod';
import { listOf, listQuery } from '../list';

/** What was changed in a yard, the newest first. `q` looks into who did it. Days are by dates of the yard's zone. */
const day = z.iso.date('must be a date, as 2027-03-28');
export const changesQuerySchema = listQuery({
	person: z.uuid('is not the id of a person').optional(),
	boat: z.uuid('is not the id of a boat').optional(),
	/** Kind of thing that was changed. */
	subject: z.string().max(40).optional(),
	from: day.optional(),
	/** The last day, included. */
	to: day.optional()
});
export type ChangesQuery = z.infer<typeof changesQuerySchema>;

export const listedChangeSchema = z.object({
	id: z.int(),
	at: z.iso.datetime(),
	/** Null: the product itself. */
	person: z.string().nullable(),
	boat: z.object({ id: z.uuid(), name: z.string() }).nullable(),
	subject: z.string(),
	action: z.enum(['INSERT', 'UPDATE', 'DELETE']),
	/** What was done, in words. */
	sentence: z.string(),
	before: z.record(z.string(), z.unknown()).nullable(),
	after: z.record(z.string(), z.unknown()).nullable()
});
export type ListedChange = z.infer<typeof listedChangeSchema>;
export const changesSchema = listOf(listedChangeSchema);
