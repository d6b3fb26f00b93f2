import { fail } from '@sveltejs/kit';
import { z } from 'zod';
import { founderSchema } from '$lib/server/access/foundYard';
import { requestReset } from '$lib/server/access/resetPassphrase';
import { parts } from '$lib/server/composition';
import { readForm } from '$lib/server/http/form';
import { mailPause } from '$lib/server/http/mailLimit';
import type { Actions } from './$types';

const forgotForm = z.object({ email: founderSchema.shape.email });

export const actions: Actions = {
	default: async ({ request, getClientAddress }) => {
		const { db } = parts();
		const read = await readForm(request, forgotForm);
		if (read.trouble !== null) return fail(400, { ...read.trouble, message: '', sentTo: null });
		const { email } = read.data;
		const minutes = await mailPause(db, getClientAddress(), email);
		if (minutes !== null)
			return fail(429, {
				values: read.values,
				errors: {},
				message: `Too many letters from here. Wait ${minutes} minutes, then try again.`,
				sentTo: null
			});
		await requestReset(db, email);
		return { values: read.values, errors: {}, message: '', sentTo: email };
	}
};
