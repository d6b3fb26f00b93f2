import { json } from '@sveltejs/kit';
import { newJobSchema, orderSchema } from '$lib/api/jobs';
import { requireBoat } from '$lib/server/boats/requireBoat';
import { parts } from '$lib/server/composition';
import { refusedProblem } from '$lib/server/http/outcome';
import { api } from '$lib/server/http/problem';
import { answerJob, asked, PRIVATE } from '$lib/server/jobs/jobAnswer';
import { orderJobs } from '$lib/server/jobs/jobEdit';
import { jobNames } from '$lib/server/jobs/jobView';
import { addJob, queueJob } from '$lib/server/jobs/queueJob';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { db } = parts();
	const { boat } = await requireBoat(db, locals, params.slug ?? '', params.boat ?? '', 'see');
	return json({ jobs: await jobNames(db, boat.id) }, { headers: PRIVATE });
});

/** Queues a usual job, or an empty one. */
export const POST: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const { membership, boat } = await requireBoat(
		db,
		locals,
		params.slug ?? '',
		params.boat ?? '',
		'queueWork'
	);
	const { template, name } = await asked(request, newJobSchema);
	const result =
		template == null
			? await addJob(db, boat.id, name ?? '')
			: await queueJob(db, membership, boat.id, template);
	if (result.outcome === 'refused') throw refusedProblem(result);
	return answerJob(db, membership, result.jobId, { outcome: 'done' }, 201);
});

/** Puts the boat's jobs in another order. */
export const PUT: RequestHandler = api(async ({ locals, params, request }) => {
	const { db } = parts();
	const { boat } = await requireBoat(db, locals, params.slug ?? '', params.boat ?? '', 'queueWork');
	const outcome = await orderJobs(db, boat.id, await asked(request, orderSchema));
	if (outcome.outcome !== 'done') throw refusedProblem(outcome);
	return json({ jobs: await jobNames(db, boat.id) }, { headers: PRIVATE });
});
