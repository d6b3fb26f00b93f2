import { redirect } from '@sveltejs/kit';
import { changesQuerySchema } from '$lib/api/lists/changes';
import { peopleIn } from '$lib/server/boats/boats';
import { requireMembership, visibleBoats } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { boatNames } from '$lib/server/db/boats';
import { asPage, readListQuery } from '$lib/server/http/list';
import { changeList } from '$lib/server/lists/changes';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, url }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.yard, 'seeChanges');
	const page = await asPage(async () =>
		changeList.page(db, membership, readListQuery(url, changesQuerySchema))
	);
	const [managers, painters, owners] = await Promise.all([
		peopleIn(db, membership, 'manager'),
		peopleIn(db, membership, 'painter'),
		peopleIn(db, membership, 'owner')
	]);
	return {
		changes: page.items,
		next: page.next,
		people: [...managers, ...painters, ...owners],
		boats: await boatNames(db, visibleBoats(db, membership))
	};
};
