import { json } from '@sveltejs/kit';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { staysOf } from '$lib/server/boats/stays';
import { parts } from '$lib/server/composition';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { db } = parts();
	const { boat } = await requireBoat(db, locals, params.slug ?? '', params.boat ?? '', 'see');
	return json({ stays: await staysOf(db, boat.id) });
});
