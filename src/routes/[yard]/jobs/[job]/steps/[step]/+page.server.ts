import { error, fail, redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { refusal } from '$lib/server/http/outcome';
import { jobAt, signedInOrAway } from '$lib/server/jobs/jobAddress';
import { jobView } from '$lib/server/jobs/jobView';
import { stepChoices } from '$lib/server/jobs/stepChoices';
import { addStep, changeStep } from '$lib/server/jobs/stepEdit';
import { readStepForm } from '$lib/server/jobs/stepForm';
import { localOfInstant } from '$lib/time/dates';
import type { Actions, PageServerLoad } from './$types';

/** The address of a step that is not there yet. */
const NEW = 'new';

export const load: PageServerLoad = async ({ locals, params }) => {
	signedInOrAway(locals);
	const { db, membership, job, boat } = await jobAt(locals, params, 'queueWork');
	const view = await jobView(db, membership, job.id);
	const step = view?.steps.find(({ id }) => id === params.step) ?? null;
	if (params.step !== NEW && step === null) error(404, 'There is no such step in this job.');
	return {
		job: { id: job.id, name: job.name, boat: boat.name },
		step:
			step === null
				? null
				: {
						...step,
						pinnedLocal:
							step.pinnedAt === null ? '' : localOfInstant(membership.yard.timeZone, step.pinnedAt)
					},
		choices: await stepChoices(db, membership, boat.id, step?.sheet?.id ?? null)
	};
};

export const actions: Actions = {
	default: async ({ locals, params, request }) => {
		const { db, membership, job } = await jobAt(locals, params, 'queueWork');
		const form = await request.formData();
		const { edit, values, errors } = readStepForm(form, membership.yard.timeZone);
		if (edit === null) return fail(400, { values, errors, message: '', revision: null });
		const id = z.uuid().safeParse(params.step);
		if (params.step !== NEW && !id.success) error(404, 'There is no such step in this job.');
		const outcome = id.success
			? await changeStep(db, membership, id.data, Number(form.get('revision')), edit)
			: await addStep(db, membership, job.id, edit);
		if (outcome.outcome !== 'done') return refusal(outcome, values);
		redirect(303, `/${params.yard}/jobs/${job.id}`);
	}
};
