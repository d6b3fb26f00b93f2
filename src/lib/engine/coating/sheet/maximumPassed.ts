import { z } from 'zod';

const grit = z
	.strictObject({
		from: z.number().int().min(16).max(5000),
		to: z.number().int().min(16).max(5000)
	})
	.optional();
const wash = z.enum(['detergent', 'freshWater']);

/** What the tin asks for once its overcoat maximum has passed. */
export const maximumPassedSchema = z.discriminatedUnion('do', [
	z.strictObject({ do: z.literal('abrade'), grit, wet: z.boolean().optional() }),
	z.strictObject({ do: z.literal('washAndAbrade'), wash, grit }),
	/** A thin coat of the same, µm wet, left so many minutes before the full coat. */
	z.strictObject({
		do: z.literal('tackCoat'),
		wash: wash.optional(),
		wetFilm: z.strictObject({ from: z.number().positive(), to: z.number().positive() }).optional(),
		waitMinutes: z.number().nonnegative().max(43_200)
	}),
	z.strictObject({ do: z.literal('freshTieCoat') })
]);
export type MaximumPassed = z.infer<typeof maximumPassedSchema>;
