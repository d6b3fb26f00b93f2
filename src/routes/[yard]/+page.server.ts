import { redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { hoursOfYard } from '$lib/server/outlook/hours';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	// A layout's load does not run again on every navigation, so the page asks for itself.
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	return { hours: await hoursOfYard(db, membership, new Date()) };
};
