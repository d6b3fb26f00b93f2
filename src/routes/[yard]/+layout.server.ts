import { redirect } from '@sveltejs/kit';
import { requireMembership, yardsOf } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const { yard, role, user } = await requireMembership(db, locals, params.yard);
	return {
		yard: { slug: yard.slug, name: yard.name, timeZone: yard.timeZone },
		role,
		user: { name: user.name, windUnit: user.windUnit, temperatureUnit: user.temperatureUnit },
		yards: await yardsOf(db, user.id)
	};
};
