import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { finishFounding, founderSchema, foundingOf } from '$lib/server/access/foundYard';
import { hashPassword } from '$lib/server/access/passwords';
import { passphraseSchema, passphraseWeakness } from '$lib/server/access/strength';
import { parts } from '$lib/server/composition';
import { readForm } from '$lib/server/http/form';
import type { Actions, PageServerLoad } from './$types';

const founderForm = z.object({ name: founderSchema.shape.name, passphrase: passphraseSchema });

// A mail program may look at a link before its reader does: only the button follows it.
export const load: PageServerLoad = async ({ params }) => ({
	founding: await foundingOf(parts().db, params.token)
});

const over = () => fail(410, { values: {}, errors: {}, isOver: true });

export const actions: Actions = {
	default: async ({ params, cookies, request }) => {
		const { db, sessions } = parts();
		const userAgent = request.headers.get('user-agent');
		const founding = await foundingOf(db, params.token);
		if (founding === null) return over();
		const read = await readForm(request, founderForm);
		if (read.trouble !== null) return fail(400, { ...read.trouble, isOver: false });
		const { name, passphrase } = read.data;
		const weakness = passphraseWeakness(passphrase, [name, founding.email, founding.yard]);
		if (weakness !== null)
			return fail(400, { values: read.values, errors: { passphrase: weakness }, isOver: false });
		const passwordHash = await hashPassword(passphrase);
		const found = await finishFounding(db, params.token, { name, passwordHash });
		if (found === null) return over();
		const cookie = await sessions.create(found.userId, userAgent);
		cookies.set(cookie.name, cookie.value, cookie.attributes);
		redirect(303, `/${found.slug}`);
	}
};
