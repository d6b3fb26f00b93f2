import { z } from 'zod';
import { listOf, listQuery } from '../list';

/** Stands of a yard, in the yard's order. `q` looks into their names. */
export const standsQuerySchema = listQuery({});
export type StandsQuery = z.infer<typeof standsQuerySchema>;

export const listedStandSchema = z.object({
	id: z.uuid(),
	name: z.string(),
	/** Metres from the plan's lower left corner; null: not drawn yet. */
	x: z.number().nullable(),
	y: z.number().nullable(),
	/** Boats on it that one may see. */
	boats: z.array(z.object({ id: z.uuid(), name: z.string() }))
});
export type ListedStand = z.infer<typeof listedStandSchema>;
export const standsSchema = listOf(listedStandSchema);
