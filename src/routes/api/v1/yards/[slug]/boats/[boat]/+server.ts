import { json } from '@sveltejs/kit';
import { boatPatchSchema, removalQuerySchema } from '$lib/api/boat';
import { boatDocument, changeBoat, removeBoat } from '$lib/server/boats/editBoat';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { requireChanged } from '$lib/server/http/changed';
import { parsedBody, parsedQuery } from '$lib/server/http/parsed';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

type Address = { slug?: string; boat?: string };
const boatAt = (locals: App.Locals, { slug = '', boat = '' }: Address, may: 'see' | 'changeBoat') =>
	requireBoat(parts().db, locals, slug, boat, may);

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { membership, boat } = await boatAt(locals, params, 'see');
	return json(await boatDocument(parts().db, membership, boat.id));
});

export const PATCH: RequestHandler = api(async ({ locals, params, request }) => {
	const { membership, boat } = await boatAt(locals, params, 'changeBoat');
	const patch = await parsedBody(request, boatPatchSchema);
	requireChanged(await changeBoat(parts().db, membership, boat.id, patch));
	return json(await boatDocument(parts().db, membership, boat.id));
});

export const DELETE: RequestHandler = api(async ({ locals, params, url }) => {
	const { membership, boat } = await boatAt(locals, params, 'changeBoat');
	const { revision, settled } = parsedQuery(url, removalQuerySchema);
	requireChanged(await removeBoat(parts().db, membership, boat.id, revision, settled));
	return new Response(null, { status: 204 });
});
