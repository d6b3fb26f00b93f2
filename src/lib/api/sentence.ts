import { z } from 'zod';

/** A sentence as spans, so that a screen can set times and boats apart. Joined text reads as written. */
export const sentenceSchema = z.array(
	z.object({
		text: z.string(),
		/** `time`: a time to act on; `boat`: a boat's name; `quantity`: a number with its unit. */
		role: z.enum(['plain', 'time', 'boat', 'quantity'])
	})
);
export type Sentence = z.infer<typeof sentenceSchema>;
