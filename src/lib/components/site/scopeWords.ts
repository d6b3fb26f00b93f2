import type { Scope } from '$lib/api/tokens';

/** What a token that holds a scope may do, for the person who makes one. */
export const SCOPE_WORDS: Readonly<Record<Scope, string>> = {
	'hours:read': 'read hours and readings, ask for the forecast',
	'boats:read': 'read boats',
	'boats:write': 'add and change boats',
	'jobs:read': 'read jobs and steps',
	'jobs:write': 'queue and change jobs and steps',
	'files:read': 'read photos and PDFs',
	'files:write': 'add and delete photos and PDFs',
	'people:read': 'read who belongs to a yard',
	'settings:read': 'read settings and stands',
	'settings:write': 'change settings and stands',
	'changes:read': 'read who changed what'
};
