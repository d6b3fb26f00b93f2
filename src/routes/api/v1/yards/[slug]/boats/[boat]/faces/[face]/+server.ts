import { json } from '@sveltejs/kit';
import { facePatchSchema, removalQuerySchema } from '$lib/api/boat';
import { boatDocument } from '$lib/server/boats/editBoat';
import { changeFace, removeFace } from '$lib/server/boats/editFace';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { requireChanged } from '$lib/server/http/changed';
import { parsedBody, parsedId, parsedQuery } from '$lib/server/http/parsed';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

type Address = { slug?: string; boat?: string };
const boatAt = (locals: App.Locals, { slug = '', boat = '' }: Address) =>
	requireBoat(parts().db, locals, slug, boat, 'changeBoat');

export const PATCH: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const { membership, boat } = await boatAt(locals, params);
	const patch = await parsedBody(request, facePatchSchema);
	const id = parsedId(params.face);
	requireChanged(await changeFace(db, boat.id, id, patch));
	const whole = await boatDocument(db, membership, boat.id);
	return json(whole?.faces.find((face) => face.id === id) ?? null);
});

export const DELETE: RequestHandler = api(async ({ locals, params, url }) => {
	const { boat } = await boatAt(locals, params);
	const { revision, settled } = parsedQuery(url, removalQuerySchema);
	requireChanged(await removeFace(parts().db, boat.id, parsedId(params.face), revision, settled));
	return new Response(null, { status: 204 });
});
