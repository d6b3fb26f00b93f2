import { json } from '@sveltejs/kit';
import { newFaceSchema } from '$lib/api/boat';
import { boatDocument } from '$lib/server/boats/editBoat';
import { addFace } from '$lib/server/boats/editFace';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { parsedBody } from '$lib/server/http/parsed';
import { api, ApiProblem } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const { slug = '', boat: boatId = '' } = params;
	const { membership, boat } = await requireBoat(db, locals, slug, boatId, 'changeBoat');
	const face = await parsedBody(request, newFaceSchema);
	const added = await addFace(db, boat.id, { area: null, ...face });
	if ('why' in added) throw new ApiProblem(409, added.why);
	const whole = await boatDocument(db, membership, boat.id);
	return json(whole?.faces.find(({ id }) => id === added.id) ?? null, { status: 201 });
});
