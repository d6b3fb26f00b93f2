import { error } from '@sveltejs/kit';
import { z } from 'zod';
import { FILE_SIZES } from '$lib/api/files';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { fileOf } from '$lib/server/files/list';
import { serveFile } from '$lib/server/files/serve';
import type { RequestHandler } from './$types';

const addressSchema = z.object({ file: z.uuid(), size: z.enum(FILE_SIZES) });

export const GET: RequestHandler = async ({ locals, params, request }) => {
	const { db, storage } = parts();
	const membership = await requireMembership(db, locals, params.yard);
	const address = addressSchema.safeParse(params);
	const found = address.success ? await fileOf(db, membership, address.data.file) : null;
	const answer =
		found === null || !address.success
			? null
			: await serveFile(storage, found.file, address.data.size, request);
	if (answer === null) error(404, 'There is no such file, or it is not yours to see.');
	return answer;
};
