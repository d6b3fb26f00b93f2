import { z } from 'zod';
import { listOf, listQuery } from '../list';

/** Boats of a yard, by name. `q` looks into the names of boat, owner and stand. */
export const boatsQuerySchema = listQuery({
	owner: z.uuid('is not the id of a person').optional(),
	painter: z.uuid('is not the id of a person').optional(),
	stand: z.uuid('is not the id of a stand').optional()
});
export type BoatsQuery = z.infer<typeof boatsQuerySchema>;

const named = z.object({ id: z.uuid(), name: z.string() });

export const listedBoatSchema = z.object({
	id: z.uuid(),
	name: z.string(),
	stand: named.nullable(),
	owner: named.nullable(),
	/** Where the bow points, degrees from north clockwise. */
	heading: z.number(),
	hauledOn: z.iso.date().nullable(),
	launchBy: z.iso.date().nullable(),
	queuedSteps: z.int()
});
export type ListedBoat = z.infer<typeof listedBoatSchema>;
export const boatsSchema = listOf(listedBoatSchema);
