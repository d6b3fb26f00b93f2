import type { Handle } from '@sveltejs/kit';
import { parts } from '../composition';
import { onBehalfOf } from '../db/behalf';

/**
 * Puts the signed-in person on the request, both null without one, and answers it on their behalf:
 * its queries see their yards only.
 */
export const session: Handle = async ({ event, resolve }) => {
	const { sessions } = parts();
	event.locals.user = null;
	event.locals.session = null;
	const token = event.cookies.get(sessions.cookieName);
	if (token !== undefined && token !== '') {
		const found = await sessions.validate(token);
		event.locals.user = found.user;
		event.locals.session = found.session;
		const cookie = found.user === null ? sessions.blankCookie() : found.renewed;
		if (cookie !== null) event.cookies.set(cookie.name, cookie.value, cookie.attributes);
	}
	return onBehalfOf(event.locals.user?.id ?? null, async () => resolve(event));
};
