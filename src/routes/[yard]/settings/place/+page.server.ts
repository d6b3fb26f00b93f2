import { redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { timeZoneAt } from '$lib/server/access/timeZone';
import { parts } from '$lib/server/composition';
import { yardDocument } from '$lib/server/yard/changeYard';
import { readPlace } from '$lib/server/yard/placeForm';
import { saveSettings } from '$lib/server/yard/settingsForm';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { yard } = await requireMembership(parts().db, locals, params.yard, 'changeYard');
	return {
		settings: yardDocument(yard),
		placeZone: timeZoneAt(yard.latitude, yard.longitude),
		zones: Intl.supportedValuesOf('timeZone')
	};
};

export const actions: Actions = {
	place: (event) => saveSettings(event, 'place', readPlace)
};
