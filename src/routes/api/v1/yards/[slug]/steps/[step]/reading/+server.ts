import { error, json } from '@sveltejs/kit';
import { readingQuerySchema } from '$lib/api/reading';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { api, invalid } from '$lib/server/http/problem';
import { readingOf } from '$lib/server/outlook/reading';
import { z } from 'zod';
import type { RequestHandler } from './$types';

const stepId = z.uuid();

export const GET: RequestHandler = api(async ({ locals, params, url }) => {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '');
	const query = readingQuerySchema.safeParse({ at: url.searchParams.get('at') ?? undefined });
	if (!query.success) throw invalid(query.error);
	const id = stepId.safeParse(params.step);
	const reading = id.success
		? await readingOf(db, membership, id.data, new Date(query.data.at), new Date())
		: null;
	if (reading === null) error(404, 'There is no such hour of such a step here.');
	return json(reading, { headers: { 'cache-control': 'private, no-store' } });
});
