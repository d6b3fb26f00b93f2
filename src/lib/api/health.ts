import { z } from 'zod';

/** Whether the installation can serve, and how its parts do. */
export const healthSchema = z.object({
	/** `ok`: all well; `degraded`: serving, but something needs a look; `down`: not serving. */
	status: z.enum(['ok', 'degraded', 'down']),
	database: z.enum(['ok', 'down']),
	providers: z.array(
		z.object({
			provider: z.string(),
			lastSuccessAt: z.iso.datetime().nullable(),
			/** True while the circuit keeps requests back after repeated failures. */
			circuitOpen: z.boolean()
		})
	),
	queue: z
		.object({
			waiting: z.int(),
			failed: z.int(),
			workerSeenAt: z.iso.datetime().nullable()
		})
		.nullable()
});
export type Health = z.infer<typeof healthSchema>;
