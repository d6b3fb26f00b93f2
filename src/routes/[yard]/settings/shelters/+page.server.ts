import { redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { yardDocument } from '$lib/server/yard/changeYard';
import { saveSettings } from '$lib/server/yard/settingsForm';
import { readShelters } from '$lib/server/yard/shelterForm';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { yard } = await requireMembership(parts().db, locals, params.yard, 'changeYard');
	return { settings: yardDocument(yard) };
};

export const actions: Actions = {
	shelters: (event) => saveSettings(event, 'shelters', readShelters)
};
