import { redirect } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { hoursInTwo, hoursOfYard } from '$lib/server/outlook/hours';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, isDataRequest }) => {
	// A layout's load does not run again on every navigation, so the page asks for itself.
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const now = new Date();
	// A browser that is already here is shown the bare laths first; a whole document comes whole, and
	// needs no script to be finished.
	if (isDataRequest) return hoursInTwo(db, membership, now);
	return { bare: null, hours: await hoursOfYard(db, membership, now) };
};
