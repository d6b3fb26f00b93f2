import { error, fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { mayDeleteFile } from '$lib/server/access/roles';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { removeFile } from '$lib/server/files/addFile';
import { addFormFiles } from '$lib/server/files/addFormFiles';
import { fileOf, filesOfBoat } from '$lib/server/files/list';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db } = parts();
	const { membership, boat } = await requireBoat(db, locals, params.yard, params.boat, 'see');
	return {
		boat: { id: boat.id, name: boat.name },
		files: await filesOfBoat(db, membership, boat.id)
	};
};

export const actions: Actions = {
	/** For browsers without scripts; with them files go to the API, one by one. */
	upload: async ({ locals, params, request }) => {
		const { membership, boat } = await requireBoat(
			parts().db,
			locals,
			params.yard,
			params.boat,
			'addFile'
		);
		const { troubles, status, caption } = await addFormFiles(
			parts(),
			membership,
			{ boatId: boat.id },
			request
		);
		if (troubles.length > 0) return fail(status, { troubles, caption });
		redirect(303, `/${params.yard}/boats/${boat.id}#photos`);
	},
	delete: async ({ locals, params, request }) => {
		const { db } = parts();
		const { membership, boat } = await requireBoat(db, locals, params.yard, params.boat, 'see');
		const id = z.uuid().safeParse((await request.formData()).get('file'));
		const found = id.success ? await fileOf(db, membership, id.data) : null;
		if (found === null || found.file.boatId !== boat.id)
			return fail(400, { troubles: ['That file is not there any more.'], caption: '' });
		if (!mayDeleteFile(membership, found.file))
			error(403, 'Whoever added it or a manager of the yard deletes it.');
		await removeFile(db, found.file);
		redirect(303, `/${params.yard}/boats/${boat.id}#photos`);
	}
};
