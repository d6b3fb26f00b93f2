import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { isLive } from '$lib/server/access/links';
import { resetPassphrase } from '$lib/server/access/resetPassphrase';
import { passphraseSchema, passphraseWeakness } from '$lib/server/access/strength';
import { parts } from '$lib/server/composition';
import { readForm } from '$lib/server/http/form';
import type { Actions, PageServerLoad } from './$types';

const resetForm = z.object({ passphrase: passphraseSchema });

export const load: PageServerLoad = async ({ params }) => ({
	isLive: await isLive(parts().db, params.token, 'resetPassphrase')
});

export const actions: Actions = {
	default: async ({ params, cookies, request }) => {
		const { db, sessions } = parts();
		const userAgent = request.headers.get('user-agent');
		const { data, trouble } = await readForm(request, resetForm);
		if (trouble !== null) return fail(400, { error: trouble.errors.passphrase, isOver: false });
		const weakness = passphraseWeakness(data.passphrase, []);
		if (weakness !== null) return fail(400, { error: weakness, isOver: false });
		const userId = await resetPassphrase(db, sessions, params.token, data.passphrase);
		if (userId === null) return fail(410, { error: undefined, isOver: true });
		const cookie = await sessions.create(userId, userAgent);
		cookies.set(cookie.name, cookie.value, cookie.attributes);
		// The sign-in page sends a signed-in person to their yard.
		redirect(303, '/sign-in');
	}
};
