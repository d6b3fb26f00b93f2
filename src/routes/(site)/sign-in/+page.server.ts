import { fail, redirect } from '@sveltejs/kit';
import { yardsOf } from '$lib/server/access/roles';
import { signIn, signInSchema } from '$lib/server/access/signIn';
import { parts } from '$lib/server/composition';
import type { Actions, PageServerLoad } from './$types';

/** Where a person lands: their yard, or the front page while they belong to none. */
async function homeOf(userId: string): Promise<string> {
	const [yard] = await yardsOf(parts().db, userId);
	return yard === undefined ? '/you' : `/${yard.slug}`;
}

export const load: PageServerLoad = async ({ locals }) => {
	if (locals.user !== null) redirect(303, await homeOf(locals.user.id));
	return { demo: parts().config.DEMO };
};

export const actions: Actions = {
	default: async ({ request, cookies, locals, getClientAddress }) => {
		const form = await request.formData();
		const email = String(form.get('email') ?? '');
		const parsed = signInSchema.safeParse({ email, password: form.get('password') });
		if (!parsed.success)
			return fail(400, { email, message: 'Type your e-mail and your passphrase.' });
		const { db, sessions } = parts();
		const result = await signIn(db, parsed.data, getClientAddress());
		switch (result.outcome) {
			case 'paused':
				return fail(429, {
					email,
					message: `Too many tries. Wait ${result.minutes} minutes, then try again.`
				});
			case 'refused':
				return fail(400, { email, message: 'That e-mail and passphrase do not go together.' });
			case 'signedIn': {
				// Whoever was signed in here is so no more, on the server too.
				if (locals.session !== null) await sessions.end(locals.session.id);
				const cookie = await sessions.create(result.userId, request.headers.get('user-agent'));
				cookies.set(cookie.name, cookie.value, cookie.attributes);
				redirect(303, await homeOf(result.userId));
			}
		}
	}
};
