import { z } from 'zod';
import { forecastSourceSchema } from './hours';

/** What came of asking the provider now. */
export const refreshSchema = z.object({
	outcome: z.enum(['stored', 'confirmed', 'notDue', 'busy', 'lastGood', 'none']),
	/** What went wrong on the way, a sentence each. */
	troubles: z.array(z.string()),
	forecast: forecastSourceSchema.nullable()
});
export type Refresh = z.infer<typeof refreshSchema>;
