import { error, json } from '@sveltejs/kit';
import { z } from 'zod';
import { mayDeleteFile, requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { removeFile } from '$lib/server/files/addFile';
import { fileOf, told } from '$lib/server/files/list';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

async function fileAt(locals: App.Locals, params: { slug?: string; boat?: string; file?: string }) {
	const { db } = parts();
	const membership = await requireMembership(db, locals, params.slug ?? '');
	const id = z.uuid().safeParse(params.file);
	const found = id.success ? await fileOf(db, membership, id.data) : null;
	if (found === null || found.file.boatId !== params.boat)
		error(404, 'There is no such file of such a boat, or it is not yours to see.');
	return { membership, ...found };
}

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { membership, file, by } = await fileAt(locals, params);
	return json(told(membership, file, by), { headers: { 'cache-control': 'private, no-store' } });
});

export const DELETE: RequestHandler = api(async ({ locals, params }) => {
	const { membership, file } = await fileAt(locals, params);
	if (!mayDeleteFile(membership, file))
		error(403, 'Whoever added it or a manager of the yard deletes it.');
	await removeFile(parts().db, file);
	return new Response(null, { status: 204 });
});
