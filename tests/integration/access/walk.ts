import { isActionFailure, isHttpError, isRedirect, type RequestEvent } from '@sveltejs/kit';
import type { SignedInUser } from '../../../src/lib/server/access/sessions';
import { parts } from '../../../src/lib/server/composition';
import { onBehalfOf } from '../../../src/lib/server/db/behalf';
import type { Answer, Row } from './routeTable';

/** One way into the product: a load, an action or a method of a route. */
export interface Door {
	/** As the table of routes names it. */
	readonly name: string;
	readonly route: string;
	readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
	readonly open: (event: RequestEvent) => unknown;
}

const METHODS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const;
type Module = Record<string, unknown>;
type Handler = (event: RequestEvent) => unknown;

const isHandler = (value: unknown): value is Handler => typeof value === 'function';

const modules = import.meta.glob<Module>(
	'../../../src/routes/**/+{server,page.server,layout.server}.ts'
);
const pages = import.meta.glob('../../../src/routes/**/+page.svelte', { query: '?raw' });

/** `/(site)/sign-in` of the path of a file in it. */
const routeOf = (path: string): string => {
	const folder = path.replace('../../../src/routes', '').replace(/\/\+[^/]*$/, '');
	return folder === '' ? '/' : folder;
};

function doorsOf(path: string, module: Module): Door[] {
	const route = routeOf(path);
	const doors: Door[] = [];
	for (const method of METHODS) {
		const handler = module[method];
		if (isHandler(handler))
			doors.push({ name: `${method} ${route}`, route, method, open: handler });
	}
	if (isHandler(module.load)) {
		const kind = path.endsWith('+layout.server.ts') ? 'layout' : 'load';
		doors.push({ name: `${kind} ${route}`, route, method: 'GET', open: module.load });
	}
	for (const [name, action] of Object.entries(module.actions ?? {}))
		if (isHandler(action))
			doors.push({ name: `action ${name} ${route}`, route, method: 'POST', open: action });
	return doors;
}

/** Every door of the route tree, from its files. */
export async function everyDoor(): Promise<Door[]> {
	const found = await Promise.all(
		Object.entries(modules).map(async ([path, load]) => doorsOf(path, await load()))
	);
	return found.flat();
}

/** Routes whose page has no server code of its own. */
export function staticPages(): string[] {
	const served = new Set(Object.keys(modules).map(routeOf));
	return Object.keys(pages)
		.map(routeOf)
		.filter((route) => !served.has(route));
}

/** The event of a request at a door, as the hooks would hand it on. */
function eventAt(
	door: Door,
	{ query = '' }: Row,
	params: Record<string, string>,
	user: SignedInUser | null
) {
	const { ORIGIN } = parts().config;
	const path = door.route
		.replaceAll(/\/\([^)]*\)/g, '')
		.replaceAll(/\[([^\]]*)\]/g, (_, name: string) => params[name] ?? '');
	const url = new URL(`${path}?${query}`, ORIGIN);
	const event = {
		url,
		params,
		route: { id: door.route },
		locals: { user, session: null, requestId: 'walk' },
		cookies: { get: () => undefined, set: () => undefined, delete: () => undefined },
		depends: () => undefined,
		parent: () => Promise.resolve({}),
		setHeaders: () => undefined,
		getClientAddress: () => '127.0.0.1',
		fetch: () => Promise.reject(new Error('a load asks nobody')),
		request: new Request(
			url,
			door.method === 'GET'
				? {}
				: {
						method: door.method,
						headers: { 'content-type': 'application/x-www-form-urlencoded' },
						body: ''
					}
		)
	};
	return event as unknown as RequestEvent;
}

const ANSWERS: Readonly<Record<number, Answer>> = {
	400: 'asked wrongly',
	401: 'sign in',
	403: 'not allowed',
	404: 'not found',
	410: 'not found',
	415: 'asked wrongly'
};
function answerOfStatus(status: number): Answer {
	const answer = status < 400 ? 'let in' : ANSWERS[status];
	if (answer === undefined) throw new Error(`answered with ${status}`);
	return answer;
}

/** What somebody is told at a door. */
export async function knock(
	door: Door,
	row: Row,
	params: Record<string, string>,
	user: SignedInUser | null
): Promise<Answer> {
	try {
		const event = eventAt(door, row, params, user);
		const told = await onBehalfOf(user?.id ?? null, async () => door.open(event));
		if (told instanceof Response) return answerOfStatus(told.status);
		return isActionFailure(told) ? answerOfStatus(told.status) : 'let in';
	} catch (thrown) {
		if (isRedirect(thrown)) return thrown.location.startsWith('/sign-in') ? 'sign in' : 'moved on';
		if (isHttpError(thrown)) return answerOfStatus(thrown.status);
		throw thrown;
	}
}
