import { stepMoveSchema } from '$lib/api/jobs';
import { api } from '$lib/server/http/problem';
import { stepAt } from '$lib/server/jobs/jobAddress';
import { answerJob, asked } from '$lib/server/jobs/jobAnswer';
import { moveStep } from '$lib/server/jobs/stepState';
import type { RequestHandler } from './$types';

/** Takes a step from one state to another. */
export const PUT: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job, stepId } = await stepAt(
		locals,
		{ yard: params.slug ?? '', step: params.step ?? '' },
		'queueWork'
	);
	const move = await asked(request, stepMoveSchema);
	const outcome = await moveStep(db, membership, stepId, move, new Date());
	return answerJob(db, membership, job.id, outcome);
});
