import { json } from '@sveltejs/kit';
import { newStandSchema } from '$lib/api/yard/stands';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { addStand, standOf, standsOf } from '$lib/server/ground/stands';
import { parsedBody } from '$lib/server/http/parsed';
import { api, ApiProblem } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '');
	return json({ stands: await standsOf(db, membership) });
});

export const POST: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '', 'changeYard');
	const added = await addStand(db, membership, await parsedBody(request, newStandSchema));
	if ('why' in added)
		throw new ApiProblem(409, added.why, [{ pointer: '/name', detail: added.why }]);
	return json(await standOf(db, membership, added.id), { status: 201 });
});
