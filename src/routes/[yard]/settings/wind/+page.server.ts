import { redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { yardDocument } from '$lib/server/yard/changeYard';
import { saveSettings } from '$lib/server/yard/settingsForm';
import { readGusts, readSand } from '$lib/server/yard/windForm';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { yard } = await requireMembership(parts().db, locals, params.yard, 'changeYard');
	return { settings: yardDocument(yard) };
};

export const actions: Actions = {
	gusts: (event) =>
		saveSettings(event, 'gusts', (form, { yard, user }) => readGusts(form, yard, user.windUnit)),
	sand: (event) => saveSettings(event, 'sand', readSand)
};
