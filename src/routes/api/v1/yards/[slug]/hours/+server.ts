import { json } from '@sveltejs/kit';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { api } from '$lib/server/http/problem';
import { hoursOfYard } from '$lib/server/outlook/hours';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '');
	return json(await hoursOfYard(db, membership, new Date()), {
		headers: { 'cache-control': 'private, no-store' }
	});
});
