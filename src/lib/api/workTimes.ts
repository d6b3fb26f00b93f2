import { z } from 'zod';

const DATE_SENTENCE = 'Type a date like 2026-05-25.';

/** Days on which somebody is not there, both included. */
export const absenceSchema = z
	.object({
		from: z.iso.date(DATE_SENTENCE),
		to: z.iso.date(DATE_SENTENCE),
		note: z.string().trim().max(120, 'Use at most 120 characters.')
	})
	.refine(({ from, to }) => from <= to, {
		path: ['to'],
		error: 'The last day comes before the first.'
	});
export type NewAbsence = z.infer<typeof absenceSchema>;
