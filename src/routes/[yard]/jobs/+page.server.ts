import { redirect } from '@sveltejs/kit';
import { STEP_STATES } from '$lib/api/jobs';
import { stepsQuerySchema } from '$lib/api/lists/steps';
import { STEP_KINDS } from '$lib/engine';
import { requireMembership } from '$lib/server/access/roles';
import { peopleIn } from '$lib/server/boats/boats';
import { parts } from '$lib/server/composition';
import { asPage, readListQuery } from '$lib/server/http/list';
import { stepList } from '$lib/server/lists/steps';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, url }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const page = await asPage(async () =>
		stepList.page(db, membership, readListQuery(url, stepsQuerySchema))
	);
	return {
		steps: page.items,
		next: page.next,
		painters: membership.role === 'manager' ? await peopleIn(db, membership, 'painter') : null,
		states: [...STEP_STATES],
		kinds: [...STEP_KINDS]
	};
};
