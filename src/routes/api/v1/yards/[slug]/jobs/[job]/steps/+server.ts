import { stepEditSchema } from '$lib/api/jobs';
import { api } from '$lib/server/http/problem';
import { jobAt } from '$lib/server/jobs/jobAddress';
import { answerJob, asked } from '$lib/server/jobs/jobAnswer';
import { addStep } from '$lib/server/jobs/stepEdit';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job } = await jobAt(
		locals,
		{ yard: params.slug ?? '', job: params.job ?? '' },
		'queueWork'
	);
	const edit = await asked(request, stepEditSchema);
	return answerJob(db, membership, job.id, await addStep(db, membership, job.id, edit), 201);
});
