import { z } from 'zod';
import { METHODS, STEP_KINDS } from '../../engine';
import { STEP_STATES } from '../jobs';
import { listOf, listQuery } from '../list';

/**
 * Steps of a yard, what changed last first. `q` looks into the names of the job, the boat, its
 * owner and its stand.
 */
export const stepsQuerySchema = listQuery({
	state: z.enum(STEP_STATES, `must be one of ${STEP_STATES.join(', ')}`).optional(),
	kind: z.enum(STEP_KINDS, `must be one of ${STEP_KINDS.join(', ')}`).optional(),
	boat: z.uuid('is not the id of a boat').optional(),
	painter: z.uuid('is not the id of a person').optional()
});
export type StepsQuery = z.infer<typeof stepsQuerySchema>;

const named = z.object({ id: z.uuid(), name: z.string() });

export const listedStepSchema = z.object({
	id: z.uuid(),
	name: z.string(),
	kind: z.enum(STEP_KINDS),
	method: z.enum(METHODS),
	/** Of work, whole crew. */
	hours: z.number(),
	state: z.enum(STEP_STATES),
	job: named,
	boat: named,
	stand: z.string().nullable(),
	painters: z.array(named),
	pinnedAt: z.iso.datetime().nullable(),
	startedAt: z.iso.datetime().nullable(),
	finishedAt: z.iso.datetime().nullable(),
	updatedAt: z.iso.datetime()
});
export type ListedStep = z.infer<typeof listedStepSchema>;
export const stepsSchema = listOf(listedStepSchema);
