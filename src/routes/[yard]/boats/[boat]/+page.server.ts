import { fail, redirect } from '@sveltejs/kit';
import { mayDo, type Permission } from '$lib/server/access/roles';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { staysOf } from '$lib/server/boats/stays';
import { parts } from '$lib/server/composition';
import { filesOfBoat } from '$lib/server/files/list';
import { jobsOfBoat, queueJob } from '$lib/server/jobs/queueJob';
import { JOB_TEMPLATES } from '$lib/server/jobs/templates';
import { faceWords } from '$lib/server/outlook/engineInput';
import type { Actions, PageServerLoad } from './$types';

async function boatAt(
	locals: App.Locals,
	params: { yard: string; boat: string },
	permission: Permission
) {
	const { db } = parts();
	return { db, ...(await requireBoat(db, locals, params.yard, params.boat, permission)) };
}

export const load: PageServerLoad = async ({ locals, params }) => {
	if (locals.user === null) redirect(303, '/sign-in');
	const { db, membership, boat } = await boatAt(locals, params, 'see');
	const { faces, ...told } = boat;
	return {
		boat: { ...told, faces: faces.map(faceWords) },
		stays: await staysOf(db, boat.id),
		mayChange: mayDo(membership.role, 'changeBoat'),
		steps: await jobsOfBoat(db, boat.id),
		files: await filesOfBoat(db, membership, boat.id),
		templates: JOB_TEMPLATES.map(({ code, name }) => ({ code, name }))
	};
};

export const actions: Actions = {
	queue: async ({ locals, params, request }) => {
		const { db, membership, boat } = await boatAt(locals, params, 'queueWork');
		const form = await request.formData();
		const result = await queueJob(db, membership, boat.id, String(form.get('template') ?? ''));
		if (result.outcome === 'refused') return fail(400, { message: result.why });
		redirect(303, `/${params.yard}/boats/${boat.id}`);
	}
};
