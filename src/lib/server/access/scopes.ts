import type { Scope } from '../../api/tokens';

/**
 * What a token must hold at each method of the API. One that is not here takes no tokens; a test
 * looks for one that was forgotten. `open`: what needs nobody needs no scope.
 */
const YARD = '/api/v1/yards/[slug]';
export const ROUTE_SCOPES: Readonly<Record<string, Scope | 'open'>> = {
	'GET /api/v1/health': 'open',
	'GET /api/v1/openapi.json': 'open',
	'POST /api/v1/outlook': 'open',
	[`GET ${YARD}/hours`]: 'hours:read',
	[`GET ${YARD}/steps/[step]/reading`]: 'hours:read',
	[`POST ${YARD}/forecast`]: 'hours:read',
	[`GET ${YARD}/boats`]: 'boats:read',
	[`GET ${YARD}/boats.csv`]: 'boats:read',
	[`GET ${YARD}/boats/[boat]/files`]: 'files:read',
	[`POST ${YARD}/boats/[boat]/files`]: 'files:write',
	[`GET ${YARD}/boats/[boat]/files/[file]`]: 'files:read',
	[`DELETE ${YARD}/boats/[boat]/files/[file]`]: 'files:write',
	[`GET ${YARD}/boats/[boat]/jobs`]: 'jobs:read',
	[`POST ${YARD}/boats/[boat]/jobs`]: 'jobs:write',
	[`PUT ${YARD}/boats/[boat]/jobs`]: 'jobs:write',
	[`GET ${YARD}/jobs/[job]`]: 'jobs:read',
	[`PATCH ${YARD}/jobs/[job]`]: 'jobs:write',
	[`PUT ${YARD}/jobs/[job]/order`]: 'jobs:write',
	[`POST ${YARD}/jobs/[job]/steps`]: 'jobs:write',
	[`PUT ${YARD}/steps/[step]`]: 'jobs:write',
	[`PUT ${YARD}/steps/[step]/state`]: 'jobs:write',
	[`GET ${YARD}/jobs/[job]/plans`]: 'jobs:read',
	[`POST ${YARD}/jobs/[job]/plans`]: 'jobs:write',
	[`DELETE ${YARD}/jobs/[job]/plans`]: 'jobs:write',
	[`PUT ${YARD}/jobs/[job]/plan/answer`]: 'jobs:write',
	[`GET ${YARD}/steps`]: 'jobs:read',
	[`GET ${YARD}/steps.csv`]: 'jobs:read',
	[`GET ${YARD}/stands.csv`]: 'settings:read',
	[`DELETE ${YARD}/boats/[boat]/faces/[face]`]: 'boats:write',
	[`DELETE ${YARD}/boats/[boat]`]: 'boats:write',
	[`DELETE ${YARD}/stands/[stand]`]: 'settings:write',
	[`GET ${YARD}/boats/[boat]/stays`]: 'boats:read',
	[`GET ${YARD}/boats/[boat]`]: 'boats:read',
	[`GET ${YARD}/stands`]: 'settings:read',
	[`GET ${YARD}`]: 'settings:read',
	[`PATCH ${YARD}/boats/[boat]/faces/[face]`]: 'boats:write',
	[`PATCH ${YARD}/boats/[boat]`]: 'boats:write',
	[`PATCH ${YARD}/stands/[stand]`]: 'settings:write',
	[`PATCH ${YARD}`]: 'settings:write',
	[`POST ${YARD}/boats/[boat]/faces`]: 'boats:write',
	[`POST ${YARD}/stands`]: 'settings:write',
	[`GET ${YARD}/changes`]: 'changes:read',
	[`GET ${YARD}/changes.csv`]: 'changes:read',
	[`GET ${YARD}/people`]: 'people:read',
	[`GET ${YARD}/people.csv`]: 'people:read'
};
