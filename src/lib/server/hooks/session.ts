import type { Handle, RequestEvent } from '@sveltejs/kit';
import { tokenRefusal } from '../access/roles';
import { useToken } from '../access/tokens';
import { parts } from '../composition';
import { onBehalfOf } from '../db/behalf';
import { ApiProblem, problemResponse } from '../http/problem';
import { countUnknownToken, limitToken, refuseGuessing } from '../http/tokenLimit';

/**
 * Puts the signed-in person on the request, both null without one, and answers it on their behalf:
 * its queries see their yards only. A program signs in with a token instead of a cookie, to the
 * API alone.
 */
export const session: Handle = async ({ event, resolve }) => {
	event.locals.user = null;
	event.locals.session = null;
	event.locals.token = null;
	const bearer = bearerOf(event);
	try {
		if (bearer === null) await takeCookie(event);
		else await takeToken(event, bearer);
	} catch (thrown) {
		if (thrown instanceof ApiProblem) return problemResponse(thrown, event.locals.requestId);
		throw thrown;
	}
	return onBehalfOf(personOf(event), async () => resolve(event));
};

const personOf = ({ locals }: RequestEvent): string | null => locals.user?.id ?? null;

/** The token a request to the API carries (RFC 6750, section 2.1); null without one. */
function bearerOf({ request, url }: RequestEvent): string | null {
	if (!url.pathname.startsWith('/api/')) return null;
	const [, token] = /^bearer +(\S+) *$/i.exec(request.headers.get('authorization') ?? '') ?? [];
	return token ?? null;
}

async function takeCookie(event: RequestEvent): Promise<void> {
	const { sessions } = parts();
	const token = event.cookies.get(sessions.cookieName);
	if (token === undefined || token === '') return;
	const found = await sessions.validate(token);
	event.locals.user = found.user;
	event.locals.session = found.session;
	const cookie = found.user === null ? sessions.blankCookie() : found.renewed;
	if (cookie !== null) event.cookies.set(cookie.name, cookie.value, cookie.attributes);
}

async function takeToken(event: RequestEvent, bearer: string): Promise<void> {
	const address = event.getClientAddress();
	await refuseGuessing(address);
	const used = await useToken(parts().db, bearer);
	if (used === null) {
		await countUnknownToken(address);
		throw new ApiProblem(401, 'There is no such token, or it is over.', undefined, {
			'www-authenticate': 'Bearer error="invalid_token"'
		});
	}
	await limitToken(used.token.id);
	const refusal = tokenRefusal(used.token, event);
	if (refusal !== null) throw new ApiProblem(refusal.status, refusal.why);
	event.locals.user = used.user;
	event.locals.token = used.token;
}
