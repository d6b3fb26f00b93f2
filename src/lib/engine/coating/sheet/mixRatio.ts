import { z } from 'zod';

const partSchema = z.strictObject({
	/** What is on the tin: base, hardener, resin. */
	name: z.string().min(1).max(80),
	/** Share of the mix, in the unit of `by`; only the ratio counts. */
	share: z.number().positive().max(1000),
	/** kg/L, where the sheet states it. */
	density: z.number().min(0.5).max(5).optional()
});

/** The parts of a coating and how they are measured out; a one-part coating has one part. */
export const mixRatioSchema = z.strictObject({
	by: z.enum(['volume', 'mass']),
	parts: z.array(partSchema).min(1).max(4),
	/** Litres of mix that the sheet's pot life is stated for: a larger pot heats itself and dies sooner. */
	potLitres: z.number().positive().max(200).optional()
});
export type MixRatio = z.infer<typeof mixRatioSchema>;
