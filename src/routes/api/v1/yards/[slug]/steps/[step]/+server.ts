import { stepChangeSchema } from '$lib/api/jobs';
import { api } from '$lib/server/http/problem';
import { stepAt } from '$lib/server/jobs/jobAddress';
import { answerJob, asked } from '$lib/server/jobs/jobAnswer';
import { changeStep } from '$lib/server/jobs/stepEdit';
import type { RequestHandler } from './$types';

/** Says anew all that is said of a step. */
export const PUT: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job, stepId } = await stepAt(
		locals,
		{ yard: params.slug ?? '', step: params.step ?? '' },
		'queueWork'
	);
	const { revision, step } = await asked(request, stepChangeSchema);
	const outcome = await changeStep(db, membership, stepId, revision, step);
	return answerJob(db, membership, job.id, outcome);
});
