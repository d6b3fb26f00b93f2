import { fail, redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { CREDITS } from '$lib/server/forecast/credit';
import { giveKey, keyOfYard, takeKey } from '$lib/server/forecast/keys';
import { readForm } from '$lib/server/http/form';
import { yardDocument } from '$lib/server/yard/changeYard';
import { keyForm, readSource } from '$lib/server/yard/forecastForm';
import { answerOf, saveSettings } from '$lib/server/yard/settingsForm';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db, config } = parts();
	const membership = await requireMembership(db, locals, params.yard, 'changeYard');
	return {
		settings: yardDocument(membership.yard),
		providers: Object.entries(CREDITS).map(([name, credit]) => ({ name, ...credit })),
		key: await keyOfYard(db, membership),
		mayKeepKeys: config.KEYS_SECRET !== undefined
	};
};

export const actions: Actions = {
	source: (event) => saveSettings(event, 'source', readSource),
	key: async ({ locals, params, request }) => {
		const { db, config } = parts();
		const membership = await requireMembership(db, locals, params.yard, 'changeYard');
		const said = answerOf('key');
		const { data, trouble } = await readForm(request, keyForm);
		if (trouble !== null) return fail(400, { ...said, ...trouble, saved: false });
		if (config.KEYS_SECRET === undefined)
			return fail(409, {
				...said,
				saved: false,
				message: 'This installation keeps no keys: whoever runs it sets KEYS_SECRET first.'
			});
		await giveKey(db, membership, config.KEYS_SECRET, data.key);
		return said;
	},
	takeKey: async ({ locals, params }) => {
		const { db } = parts();
		await takeKey(db, await requireMembership(db, locals, params.yard, 'changeYard'));
		return answerOf('key');
	}
};
