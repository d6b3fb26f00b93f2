import { json } from '@sveltejs/kit';
import { newFileQuerySchema } from '$lib/api/files';
import type { Permission } from '$lib/server/access/roles';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { addSentFile } from '$lib/server/files/addSentFile';
import { filesOfBoat, told } from '$lib/server/files/list';
import { api, ApiProblem, invalid } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

const boatAt = (
	locals: App.Locals,
	{ slug = '', boat = '' }: { slug?: string; boat?: string },
	permission: Permission
) => requireBoat(parts().db, locals, slug, boat, permission);

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { membership, boat } = await boatAt(locals, params, 'see');
	const files = await filesOfBoat(parts().db, membership, boat.id);
	return json({ files }, { headers: { 'cache-control': 'private, no-store' } });
});

/** Takes the bytes of one file as the body. Sending the same again under its id changes nothing. */
export const POST: RequestHandler = api(async ({ locals, params, request, url }) => {
	const { membership, boat } = await boatAt(locals, params, 'addFile');
	const query = newFileQuerySchema.safeParse(Object.fromEntries(url.searchParams));
	if (!query.success) throw invalid(query.error);
	if (request.body === null)
		throw new ApiProblem(400, 'Send the bytes of the file as the body, with a content-type.');
	const { file, isNew } = await addSentFile(
		parts(),
		membership,
		{ boatId: boat.id },
		query.data,
		request
	);
	return json(told(membership, file, membership.user.name), { status: isNew ? 201 : 200 });
});
