import type { Role } from '../../../src/lib/server/db/schema';

/**
 * Who is let in where: every load, action and method of the built route tree. A route that is not
 * here fails the walk.
 */

/**
 * What a handler says to somebody. `asked wrongly` is past the question of who may, too: where the
 * same request would be refused to another, it is told as refused.
 */
export type Answer =
	'let in' | 'asked wrongly' | 'sign in' | 'not found' | 'not allowed' | 'moved on';

export interface Row {
	readonly signedOut: Answer;
	/** On what one belongs to: one's own yard, a boat one may see. */
	readonly own: Readonly<Record<Role, Answer>>;
	/** By an address of a yard one does not belong to; null where the address names no yard. */
	readonly otherYard: Answer | null;
	/** On a boat of one's yard that only the manager sees; null where the address names no boat's. */
	readonly otherBoat: Readonly<Record<Role, Answer>> | null;
	/** What is asked, where an empty request would be refused before anybody looks for whom. */
	readonly query?: string;
}

const everyRole = (answer: Answer): Record<Role, Answer> => ({
	manager: answer,
	painter: answer,
	owner: answer
});

/** Open to everybody, signed in or not. */
const OPEN: Row = {
	signedOut: 'let in',
	own: everyRole('let in'),
	otherYard: null,
	otherBoat: null
};
/** The same, asked without the fields it needs. */
const EMPTY_FORM: Row = {
	...OPEN,
	signedOut: 'asked wrongly',
	own: everyRole('asked wrongly')
};
/** For everybody of the yard. */
const OF_YARD: Row = {
	signedOut: 'sign in',
	own: everyRole('let in'),
	otherYard: 'not found',
	otherBoat: null
};
/** About one boat: for who may see it. */
const OF_BOAT: Row = {
	...OF_YARD,
	otherBoat: { manager: 'let in', painter: 'not found', owner: 'not found' }
};

/** The same, asked without what it needs. */
const BOAT_ASKED_WRONGLY: Row = {
	...OF_BOAT,
	own: everyRole('asked wrongly'),
	otherBoat: { manager: 'asked wrongly', painter: 'not found', owner: 'not found' }
};
/** For managers and owners, who take plans for boats they may see. */
const OF_WHO_PLANS: Row = {
	...OF_YARD,
	own: { manager: 'let in', painter: 'not allowed', owner: 'let in' },
	otherBoat: { manager: 'let in', painter: 'not found', owner: 'not found' }
};
const OF_WHO_PLANS_ASKED_WRONGLY: Row = {
	...OF_WHO_PLANS,
	own: { manager: 'asked wrongly', painter: 'not allowed', owner: 'asked wrongly' },
	otherBoat: { manager: 'asked wrongly', painter: 'not found', owner: 'not found' }
};
/** Behind a link from a mail: who holds none is told that it is over. */
const LINK_OVER: Row = { ...OPEN, signedOut: 'not found', own: everyRole('not found') };
/** For whoever is signed in, about themselves. */
const OWN_ACCOUNT: Row = { ...OPEN, signedOut: 'sign in' };
/** For managers and owners, who ask people to the yard. */
const OF_WHO_ASKS: Row = {
	...OF_YARD,
	own: { manager: 'let in', painter: 'not allowed', owner: 'let in' }
};

/** For managers, who alone settle how the yard is. */
const OF_MANAGER: Row = {
	...OF_YARD,
	own: { manager: 'let in', painter: 'not allowed', owner: 'not allowed' }
};
const MANAGER_ASKED_WRONGLY: Row = {
	...OF_YARD,
	own: { manager: 'asked wrongly', painter: 'not allowed', owner: 'not allowed' }
};

/** For who changes boats: managers any, owners their own. */
const CHANGE_BOAT_ASKED_WRONGLY: Row = {
	...OF_BOAT,
	own: { manager: 'asked wrongly', painter: 'not allowed', owner: 'asked wrongly' },
	otherBoat: { manager: 'asked wrongly', painter: 'not found', owner: 'not found' }
};

/** By what the walk calls them: method, `load` or `action <name>`, then the route. */
export const ROUTES: Readonly<Record<string, Row>> = {
	'load /(site)/sign-in': { ...OPEN, own: everyRole('moved on') },
	'action default /(site)/sign-in': EMPTY_FORM,
	'load /(site)/new': OPEN,
	'action default /(site)/new': EMPTY_FORM,
	'load /(site)/found/[token]': OPEN,
	'action default /(site)/found/[token]': LINK_OVER,
	'action default /(site)/forgot': EMPTY_FORM,
	'load /(site)/reset/[token]': OPEN,
	'action default /(site)/reset/[token]': EMPTY_FORM,
	'load /(site)/invitation/[token]': OPEN,
	'action accept /(site)/invitation/[token]': LINK_OVER,
	'action join /(site)/invitation/[token]': LINK_OVER,
	'load /(site)/you': OWN_ACCOUNT,
	'action passphrase /(site)/you': { ...OWN_ACCOUNT, own: everyRole('asked wrongly') },
	'action makeToken /(site)/you': { ...OWN_ACCOUNT, own: everyRole('asked wrongly') },
	'action withdrawToken /(site)/you': { ...OWN_ACCOUNT, own: everyRole('moved on') },
	'action endOthers /(site)/you': { ...OWN_ACCOUNT, own: everyRole('moved on') },
	'action endDevice /(site)/you': { ...OWN_ACCOUNT, own: everyRole('moved on') },
	// Leads to sign-in whoever asks: there is nothing to refuse.
	'POST /(site)/sign-out': { ...OPEN, signedOut: 'sign in', own: everyRole('sign in') },
	'layout /[yard]': OF_YARD,
	'load /[yard]': OF_YARD,
	'load /[yard]/boats': OF_YARD,
	'action default /[yard]/boats': {
		...OF_YARD,
		own: { manager: 'asked wrongly', painter: 'not allowed', owner: 'asked wrongly' }
	},
	'load /[yard]/boats/[boat]': OF_BOAT,
	'action queue /[yard]/boats/[boat]': BOAT_ASKED_WRONGLY,
	'load /[yard]/boats/[boat]/edit': {
		...OF_BOAT,
		own: { manager: 'let in', painter: 'not allowed', owner: 'let in' },
		otherBoat: { manager: 'let in', painter: 'not found', owner: 'not found' }
	},
	'action boat /[yard]/boats/[boat]/edit': CHANGE_BOAT_ASKED_WRONGLY,
	'action painters /[yard]/boats/[boat]/edit': CHANGE_BOAT_ASKED_WRONGLY,
	'action addFace /[yard]/boats/[boat]/edit': CHANGE_BOAT_ASKED_WRONGLY,
	'action face /[yard]/boats/[boat]/edit': CHANGE_BOAT_ASKED_WRONGLY,
	'action remove /[yard]/boats/[boat]/edit': CHANGE_BOAT_ASKED_WRONGLY,
	'load /[yard]/ground': OF_YARD,
	'action plan /[yard]/ground': MANAGER_ASKED_WRONGLY,
	'action add /[yard]/ground': MANAGER_ASKED_WRONGLY,
	'action stand /[yard]/ground': MANAGER_ASKED_WRONGLY,
	'action move /[yard]/ground': MANAGER_ASKED_WRONGLY,
	'load /[yard]/settings': OF_YARD,
	'load /[yard]/settings/place': OF_MANAGER,
	'action place /[yard]/settings/place': MANAGER_ASKED_WRONGLY,
	'load /[yard]/settings/hours': OF_MANAGER,
	'action work /[yard]/settings/hours': MANAGER_ASKED_WRONGLY,
	'action quiet /[yard]/settings/hours': MANAGER_ASKED_WRONGLY,
	'action holidays /[yard]/settings/hours': MANAGER_ASKED_WRONGLY,
	'load /[yard]/settings/wind': OF_MANAGER,
	'action gusts /[yard]/settings/wind': MANAGER_ASKED_WRONGLY,
	'action sand /[yard]/settings/wind': MANAGER_ASKED_WRONGLY,
	'load /[yard]/settings/hoists': OF_MANAGER,
	'action hoist /[yard]/settings/hoists': MANAGER_ASKED_WRONGLY,
	'action money /[yard]/settings/hoists': MANAGER_ASKED_WRONGLY,
	'load /[yard]/settings/shelters': OF_MANAGER,
	'action shelters /[yard]/settings/shelters': MANAGER_ASKED_WRONGLY,
	'load /[yard]/settings/forecast': OF_MANAGER,
	'action source /[yard]/settings/forecast': MANAGER_ASKED_WRONGLY,
	'action key /[yard]/settings/forecast': MANAGER_ASKED_WRONGLY,
	'action takeKey /[yard]/settings/forecast': OF_MANAGER,
	'load /[yard]/jobs/[job]': OF_BOAT,
	'action change /[yard]/jobs/[job]': BOAT_ASKED_WRONGLY,
	'action order /[yard]/jobs/[job]': BOAT_ASKED_WRONGLY,
	'action move /[yard]/jobs/[job]': BOAT_ASKED_WRONGLY,
	'action take /[yard]/jobs/[job]': OF_WHO_PLANS_ASKED_WRONGLY,
	'action letGo /[yard]/jobs/[job]': OF_WHO_PLANS,
	'action answer /[yard]/jobs/[job]': BOAT_ASKED_WRONGLY,
	'load /[yard]/jobs/[job]/steps/[step]': OF_BOAT,
	'action default /[yard]/jobs/[job]/steps/[step]': BOAT_ASKED_WRONGLY,
	'load /[yard]/settings/times': OF_YARD,
	'action hours /[yard]/settings/times': OF_YARD,
	'action yardHours /[yard]/settings/times': OF_YARD,
	'action absence /[yard]/settings/times': {
		...OF_YARD,
		own: everyRole('asked wrongly')
	},
	'action remove /[yard]/settings/times': OF_YARD,
	'GET /api/v1/yards/[slug]/boats/[boat]/jobs': OF_BOAT,
	'POST /api/v1/yards/[slug]/boats/[boat]/jobs': BOAT_ASKED_WRONGLY,
	'PUT /api/v1/yards/[slug]/boats/[boat]/jobs': BOAT_ASKED_WRONGLY,
	'GET /api/v1/yards/[slug]/jobs/[job]': OF_BOAT,
	'PATCH /api/v1/yards/[slug]/jobs/[job]': BOAT_ASKED_WRONGLY,
	'PUT /api/v1/yards/[slug]/jobs/[job]/order': BOAT_ASKED_WRONGLY,
	'POST /api/v1/yards/[slug]/jobs/[job]/steps': BOAT_ASKED_WRONGLY,
	'PUT /api/v1/yards/[slug]/steps/[step]': BOAT_ASKED_WRONGLY,
	'PUT /api/v1/yards/[slug]/steps/[step]/state': BOAT_ASKED_WRONGLY,
	'GET /api/v1/yards/[slug]/jobs/[job]/plans': OF_BOAT,
	'POST /api/v1/yards/[slug]/jobs/[job]/plans': OF_WHO_PLANS_ASKED_WRONGLY,
	'DELETE /api/v1/yards/[slug]/jobs/[job]/plans': {
		...OF_WHO_PLANS,
		own: { manager: 'not found', painter: 'not allowed', owner: 'not found' },
		otherBoat: { manager: 'not found', painter: 'not found', owner: 'not found' }
	},
	'PUT /api/v1/yards/[slug]/jobs/[job]/plan/answer': BOAT_ASKED_WRONGLY,
	'load /[yard]/settings/people': OF_WHO_ASKS,
	'action invite /[yard]/settings/people': {
		...OF_WHO_ASKS,
		own: { manager: 'asked wrongly', painter: 'not allowed', owner: 'asked wrongly' }
	},
	'action takeBack /[yard]/settings/people': {
		...OF_YARD,
		own: { manager: 'let in', painter: 'not allowed', owner: 'not allowed' }
	},
	'load /[yard]/boats/[boat]/files': OF_BOAT,
	'action upload /[yard]/boats/[boat]/files': BOAT_ASKED_WRONGLY,
	'action delete /[yard]/boats/[boat]/files': BOAT_ASKED_WRONGLY,
	'GET /[yard]/files/[file]/[size]': OF_BOAT,
	'GET /api/v1/yards/[slug]': OF_YARD,
	'PATCH /api/v1/yards/[slug]': MANAGER_ASKED_WRONGLY,
	'GET /api/v1/yards/[slug]/stands': OF_YARD,
	'POST /api/v1/yards/[slug]/stands': MANAGER_ASKED_WRONGLY,
	'PATCH /api/v1/yards/[slug]/stands/[stand]': MANAGER_ASKED_WRONGLY,
	'DELETE /api/v1/yards/[slug]/stands/[stand]': MANAGER_ASKED_WRONGLY,
	'GET /api/v1/yards/[slug]/boats/[boat]': OF_BOAT,
	'PATCH /api/v1/yards/[slug]/boats/[boat]': CHANGE_BOAT_ASKED_WRONGLY,
	'DELETE /api/v1/yards/[slug]/boats/[boat]': CHANGE_BOAT_ASKED_WRONGLY,
	'POST /api/v1/yards/[slug]/boats/[boat]/faces': CHANGE_BOAT_ASKED_WRONGLY,
	'PATCH /api/v1/yards/[slug]/boats/[boat]/faces/[face]': CHANGE_BOAT_ASKED_WRONGLY,
	'DELETE /api/v1/yards/[slug]/boats/[boat]/faces/[face]': CHANGE_BOAT_ASKED_WRONGLY,
	'GET /api/v1/yards/[slug]/boats/[boat]/stays': OF_BOAT,
	'GET /api/v1/yards/[slug]/boats/[boat]/files': OF_BOAT,
	'POST /api/v1/yards/[slug]/boats/[boat]/files': BOAT_ASKED_WRONGLY,
	'GET /api/v1/yards/[slug]/boats/[boat]/files/[file]': OF_BOAT,
	// None of them has added it.
	'DELETE /api/v1/yards/[slug]/boats/[boat]/files/[file]': {
		...OF_BOAT,
		own: { manager: 'let in', painter: 'not allowed', owner: 'not allowed' }
	},
	'GET /api/v1/yards/[slug]/boats': OF_YARD,
	'GET /api/v1/yards/[slug]/boats.csv': OF_YARD,
	'GET /api/v1/yards/[slug]/steps': OF_YARD,
	'GET /api/v1/yards/[slug]/steps.csv': OF_YARD,
	'GET /api/v1/yards/[slug]/people': OF_MANAGER,
	'GET /api/v1/yards/[slug]/people.csv': OF_MANAGER,
	'GET /api/v1/yards/[slug]/stands.csv': OF_YARD,
	'GET /api/v1/yards/[slug]/changes': OF_MANAGER,
	'GET /api/v1/yards/[slug]/changes.csv': OF_MANAGER,
	'load /[yard]/changes': OF_MANAGER,
	'load /[yard]/jobs': OF_YARD,
	'GET /api/v1/health': OPEN,

	'GET /api/v1/openapi.json': OPEN,
	'GET /schemas/sheet-1.json': OPEN,
	'POST /api/v1/outlook': EMPTY_FORM,
	'POST /api/v1/yards/[slug]/forecast': OF_YARD,
	'GET /api/v1/yards/[slug]/hours': OF_YARD,
	'GET /api/v1/yards/[slug]/steps/[step]/reading': {
		...OF_BOAT,
		query: `at=${new Date().toISOString()}`
	}
};

/** Pages without server code of their own: nothing to refuse beyond what their layouts do. */
export const STATIC_PAGES: readonly string[] = ['/(site)'];
