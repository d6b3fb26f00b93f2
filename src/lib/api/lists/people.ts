import { z } from 'zod';
import { listOf, listQuery } from '../list';
import { ROLES } from '../roles';

/** People of a yard, by name. `q` looks into names and e-mail addresses. */
export const peopleQuerySchema = listQuery({
	role: z.enum(ROLES, `must be one of ${ROLES.join(', ')}`).optional()
});
export type PeopleQuery = z.infer<typeof peopleQuerySchema>;

export const listedPersonSchema = z.object({
	id: z.uuid(),
	name: z.string(),
	email: z.string(),
	role: z.enum(ROLES)
});
export type ListedPerson = z.infer<typeof listedPersonSchema>;
export const peopleSchema = listOf(listedPersonSchema);
