import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { founderSchema } from '$lib/server/access/foundYard';
import { acceptInvitation, invitationOf, joinWithNewAccount } from '$lib/server/access/invitations';
import { hashPassword } from '$lib/server/access/passwords';
import { passphraseSchema, passphraseWeakness } from '$lib/server/access/strength';
import { parts } from '$lib/server/composition';
import { readForm } from '$lib/server/http/form';
import type { Actions, PageServerLoad } from './$types';

const joinForm = z.object({ name: founderSchema.shape.name, passphrase: passphraseSchema });

export const load: PageServerLoad = async ({ params, locals }) => {
	const invitation = await invitationOf(parts().db, params.token);
	return {
		invitation,
		isTheirs:
			locals.user !== null && invitation?.email.toLowerCase() === locals.user.email.toLowerCase(),
		signedInAs: locals.user?.email ?? null
	};
};

const over = () => fail(410, { values: {}, errors: {}, isOver: true });

export const actions: Actions = {
	/** Joins with the account one is signed in with. */
	accept: async ({ params, locals }) => {
		const { db } = parts();
		const invitation = await invitationOf(db, params.token);
		if (locals.user === null || invitation === null) return over();
		if (!(await acceptInvitation(db, params.token, locals.user))) return over();
		redirect(303, `/${invitation.slug}`);
	},
	/** Joins with a new account. */
	join: async ({ params, request, cookies }) => {
		const { db, sessions } = parts();
		const userAgent = request.headers.get('user-agent');
		const invitation = await invitationOf(db, params.token);
		if (invitation === null) return over();
		const read = await readForm(request, joinForm);
		if (read.trouble !== null) return fail(400, { ...read.trouble, isOver: false });
		const { name, passphrase } = read.data;
		const weakness = passphraseWeakness(passphrase, [name, invitation.email, invitation.yard]);
		if (weakness !== null)
			return fail(400, { values: read.values, errors: { passphrase: weakness }, isOver: false });
		const passwordHash = await hashPassword(passphrase);
		const userId = await joinWithNewAccount(db, params.token, { name, passwordHash });
		if (userId === null) return over();
		const cookie = await sessions.create(userId, userAgent);
		cookies.set(cookie.name, cookie.value, cookie.attributes);
		redirect(303, `/${invitation.slug}`);
	}
};
