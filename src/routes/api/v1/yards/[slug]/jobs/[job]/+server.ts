import { jobEditSchema } from '$lib/api/jobs';
import { api } from '$lib/server/http/problem';
import { jobAt } from '$lib/server/jobs/jobAddress';
import { answerJob, asked } from '$lib/server/jobs/jobAnswer';
import { changeJob } from '$lib/server/jobs/jobEdit';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { db, membership, job } = await jobAt(
		locals,
		{ yard: params.slug ?? '', job: params.job ?? '' },
		'see'
	);
	return answerJob(db, membership, job.id, { outcome: 'done' });
});

export const PATCH: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job } = await jobAt(
		locals,
		{ yard: params.slug ?? '', job: params.job ?? '' },
		'queueWork'
	);
	const edit = await asked(request, jobEditSchema);
	return answerJob(db, membership, job.id, await changeJob(db, membership, job.id, edit));
});
