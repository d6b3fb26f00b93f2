import { redirect } from '@sveltejs/kit';
import { mayDo, requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { CREDITS } from '$lib/server/forecast/credit';
import { yardDocument } from '$lib/server/yard/changeYard';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { yard, role } = await requireMembership(parts().db, locals, params.yard);
	return {
		settings: yardDocument(yard),
		provider: CREDITS[yard.forecastProvider].label,
		mayChange: mayDo(role, 'changeYard')
	};
};
