import { redirect } from '@sveltejs/kit';
import { parts } from '$lib/server/composition';
import type { RequestHandler } from './$types';

/** Ends this device's session. A form post, so that the framework checks where it comes from. */
export const POST: RequestHandler = async ({ locals, cookies }) => {
	const { sessions } = parts();
	if (locals.session !== null) await sessions.end(locals.session.id);
	const cookie = sessions.blankCookie();
	cookies.set(cookie.name, cookie.value, cookie.attributes);
	redirect(303, '/sign-in');
};
