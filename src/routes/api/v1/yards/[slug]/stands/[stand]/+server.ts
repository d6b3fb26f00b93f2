import { json } from '@sveltejs/kit';
import { removalQuerySchema } from '$lib/api/boat';
import { standPatchSchema } from '$lib/api/yard/stands';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { changeStand, removeStand, standOf } from '$lib/server/ground/stands';
import { requireChanged } from '$lib/server/http/changed';
import { parsedBody, parsedId, parsedQuery } from '$lib/server/http/parsed';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

export const PATCH: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '', 'changeYard');
	const patch = await parsedBody(request, standPatchSchema);
	const id = parsedId(params.stand);
	requireChanged(await changeStand(db, membership, id, patch));
	return json(await standOf(db, membership, id));
});

export const DELETE: RequestHandler = api(async ({ locals, params, url }) => {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '', 'changeYard');
	const { revision, settled } = parsedQuery(url, removalQuerySchema);
	requireChanged(await removeStand(db, membership, parsedId(params.stand), revision, settled));
	return new Response(null, { status: 204 });
});
