import { fail, redirect } from '@sveltejs/kit';
import { finishFounding } from '$lib/server/access/foundYard';
import { isLive } from '$lib/server/access/links';
import { parts } from '$lib/server/composition';
import type { Actions, PageServerLoad } from './$types';

// A mail program may look at a link before its reader does: only the button follows it.
export const load: PageServerLoad = async ({ params }) => ({
	isLive: await isLive(parts().db, params.token, 'foundYard')
});

export const actions: Actions = {
	default: async ({ params, cookies, request }) => {
		const { db, sessions } = parts();
		const found = await finishFounding(db, params.token);
		if (found === null) return fail(410, { isOver: true });
		const cookie = await sessions.create(found.userId, request.headers.get('user-agent'));
		cookies.set(cookie.name, cookie.value, cookie.attributes);
		redirect(303, `/${found.slug}`);
	}
};
