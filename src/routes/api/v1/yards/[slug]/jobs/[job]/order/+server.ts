import { orderSchema } from '$lib/api/jobs';
import { api } from '$lib/server/http/problem';
import { jobAt } from '$lib/server/jobs/jobAddress';
import { answerJob, asked } from '$lib/server/jobs/jobAnswer';
import { orderSteps } from '$lib/server/jobs/jobEdit';
import type { RequestHandler } from './$types';

export const PUT: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job } = await jobAt(
		locals,
		{ yard: params.slug ?? '', job: params.job ?? '' },
		'queueWork'
	);
	const order = await asked(request, orderSchema);
	return answerJob(db, membership, job.id, await orderSteps(db, membership, job.id, order));
});
