import { redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { yardDocument } from '$lib/server/yard/changeYard';
import { readHoist, readMoney } from '$lib/server/yard/hoistForm';
import { saveSettings } from '$lib/server/yard/settingsForm';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { yard } = await requireMembership(parts().db, locals, params.yard, 'changeYard');
	return { settings: yardDocument(yard) };
};

export const actions: Actions = {
	// The form of each hoist is a part of its own, named by its id; of a new one it is empty.
	hoist: (event) =>
		saveSettings(
			event,
			(form) => `hoist ${String(form.get('hoist') ?? '')}`,
			(form, { yard, user }) => readHoist(form, yard, user.windUnit)
		),
	money: (event) => saveSettings(event, 'money', readMoney)
};
