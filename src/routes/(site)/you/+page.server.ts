import { fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { yardsOf } from '$lib/server/access/roles';
import { changePassphrase } from '$lib/server/access/resetPassphrase';
import { passphraseSchema, passphraseWeakness } from '$lib/server/access/strength';
import { parts } from '$lib/server/composition';
import { makeToken, tokensOf, withdrawToken } from '$lib/server/access/tokens';
import { readForm } from '$lib/server/http/form';
import { newTokenSchema, SCOPES, TOKEN_DAYS } from '$lib/api/tokens';
import type { Actions, PageServerLoad } from './$types';

const changeForm = z.object({
	currentPassphrase: z.string().min(1, 'Type the passphrase you have now.'),
	passphrase: passphraseSchema
});

export const load: PageServerLoad = async ({ locals }) => {
	const { user, session } = locals;
	if (user === null) redirect(303, '/sign-in');
	const { db, sessions } = parts();
	return {
		person: { name: user.name, email: user.email },
		yards: (await yardsOf(db, user.id)).map(({ slug, name, role }) => ({ slug, name, role })),
		devices: await sessions.devicesOf(user.id, session?.id ?? null),
		tokens: await tokensOf(db, user.id),
		scopes: [...SCOPES],
		tokenDays: [...TOKEN_DAYS]
	};
};

export const actions: Actions = {
	passphrase: async ({ locals, request, cookies }) => {
		const { user } = locals;
		if (user === null) redirect(303, '/sign-in');
		const { db, sessions } = parts();
		const userAgent = request.headers.get('user-agent');
		const { data, trouble } = await readForm(request, changeForm);
		if (trouble !== null) return fail(400, { errors: trouble.errors, changed: false });
		const weakness = passphraseWeakness(data.passphrase, [user.name, user.email]);
		if (weakness !== null) return fail(400, { errors: { passphrase: weakness }, changed: false });
		const given = { current: data.currentPassphrase, next: data.passphrase };
		const shown = await changePassphrase(db, sessions, user.id, given);
		if (shown !== 'right')
			return fail(shown === 'wrong' ? 400 : 429, {
				errors: {
					currentPassphrase:
						shown === 'wrong'
							? 'That is not the passphrase you have now.'
							: `Too many tries. Wait ${shown.minutes} minutes, then try again.`
				},
				changed: false
			});
		// All devices were signed out: this one comes back under a new token.
		const cookie = await sessions.create(user.id, userAgent);
		cookies.set(cookie.name, cookie.value, cookie.attributes);
		return { errors: {}, changed: true };
	},
	makeToken: async ({ locals, request }) => {
		if (locals.user === null) redirect(303, '/sign-in');
		const form = await request.formData();
		const said = {
			name: String(form.get('name') ?? ''),
			scopes: form.getAll('scope').map(String),
			yard: String(form.get('yard') ?? ''),
			days: Number(form.get('days'))
		};
		const parsed = newTokenSchema.safeParse({ ...said, yard: said.yard || null });
		const refused = (errors: Record<string, string>) =>
			fail(400, { errors: {}, changed: false, token: { said, errors, made: null } });
		if (!parsed.success)
			return refused(
				Object.fromEntries(
					parsed.error.issues.map(({ path, message }) => [String(path[0]), message])
				)
			);
		const result = await makeToken(parts().db, locals.user.id, parsed.data);
		if (result.outcome === 'refused') return refused({ [result.field]: result.why });
		return { errors: {}, changed: false, token: { said: null, errors: {}, made: result.token } };
	},
	withdrawToken: async ({ locals, request }) => {
		if (locals.user === null) redirect(303, '/sign-in');
		const id = z.uuid().safeParse((await request.formData()).get('token'));
		if (id.success) await withdrawToken(parts().db, locals.user.id, id.data);
		redirect(303, '/you');
	},
	endOthers: async ({ locals }) => {
		const { user, session } = locals;
		if (user === null) redirect(303, '/sign-in');
		if (session !== null) await parts().sessions.endOthers(user.id, session.id);
		redirect(303, '/you');
	},
	endDevice: async ({ locals, request }) => {
		if (locals.user === null) redirect(303, '/sign-in');
		const form = await request.formData();
		await parts().sessions.endDevice(locals.user.id, String(form.get('device') ?? ''));
		redirect(303, '/you');
	}
};
