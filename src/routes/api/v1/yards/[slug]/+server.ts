import { json } from '@sveltejs/kit';
import { yardPatchSchema } from '$lib/api/yard/settings';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { requireChanged } from '$lib/server/http/changed';
import { parsedBody } from '$lib/server/http/parsed';
import { api } from '$lib/server/http/problem';
import { changeYard, yardDocument } from '$lib/server/yard/changeYard';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { yard } = await requireMembership(parts().db, locals, params.slug ?? '');
	return json(yardDocument(yard));
});

/** Changes what the body names and leaves the rest. */
export const PATCH: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const slug = params.slug ?? '';
	const membership = await requireMembership(db, locals, slug, 'changeYard');
	requireChanged(await changeYard(db, membership, await parsedBody(request, yardPatchSchema)));
	return json(yardDocument((await requireMembership(db, locals, slug)).yard));
});
