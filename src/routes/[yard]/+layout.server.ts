import { redirect } from '@sveltejs/kit';
import { requireMembership, visibleBoats, yardsOf } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { queuedStepCount } from '$lib/server/db/queue';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const { yard, role, user } = await requireMembership(db, locals, params.yard);
	const all = await yardsOf(db, user.id);
	// How many laths the page of another yard will have, for while it is fetched.
	const yards = await Promise.all(
		all.map(async ({ id, ...it }) => ({
			...it,
			steps:
				id === yard.id
					? null
					: await queuedStepCount(db, visibleBoats(db, { yard: { id }, role: it.role, user }))
		}))
	);
	return {
		yard: { slug: yard.slug, name: yard.name, timeZone: yard.timeZone },
		role,
		user: { name: user.name, windUnit: user.windUnit, temperatureUnit: user.temperatureUnit },
		yards
	};
};
