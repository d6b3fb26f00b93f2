import { z } from 'zod';

/** A problem document (RFC 9457). `errors` names each field by JSON pointer (RFC 6901). */
export const problemSchema = z.object({
	type: z.string(),
	title: z.string(),
	status: z.int(),
	detail: z.string().optional(),
	/** Number of the request, for asking for help. */
	requestId: z.string().optional(),
	errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional()
});
export type Problem = z.infer<typeof problemSchema>;
