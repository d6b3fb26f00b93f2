import { z } from 'zod';

/** Personal access tokens: what a program may be let do in somebody's name. */

export const SCOPES = [
	'hours:read',
	'boats:read',
	'boats:write',
	'jobs:read',
	'jobs:write',
	'files:read',
	'files:write',
	'people:read',
	'settings:read',
	'settings:write',
	'changes:read'
] as const;
export type Scope = (typeof SCOPES)[number];

/** Days a token may be made for. */
export const TOKEN_DAYS = [7, 30, 90, 365] as const;

export const newTokenSchema = z.object({
	name: z
		.string()
		.trim()
		.min(1, 'Say what the token is for.')
		.max(80, 'Use at most 80 characters.'),
	scopes: z.array(z.enum(SCOPES)).min(1, 'Choose at least one thing it may do.'),
	/** The only yard it opens, as in its address; null: all of the person's. */
	yard: z.string().nullable(),
	days: z.literal(TOKEN_DAYS, 'Choose how long it lasts.')
});
export type NewToken = z.infer<typeof newTokenSchema>;
