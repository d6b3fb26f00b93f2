import { json } from '@sveltejs/kit';
import { answerPlanSchema } from '$lib/api/plans';
import { refusedProblem } from '$lib/server/http/outcome';
import { api } from '$lib/server/http/problem';
import { jobAt } from '$lib/server/jobs/jobAddress';
import { asked, PRIVATE } from '$lib/server/jobs/jobAnswer';
import { jobPlans } from '$lib/server/plans/jobPlans';
import { answerPlan } from '$lib/server/plans/takePlan';
import type { RequestHandler } from './$types';

/** What a person named in the plan in force says to their step of it. */
export const PUT: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job } = await jobAt(
		locals,
		{ yard: params.slug ?? '', job: params.job ?? '' },
		'see'
	);
	const said = await asked(request, answerPlanSchema);
	const now = new Date();
	const outcome = await answerPlan(db, membership, job.id, said, now);
	if (outcome.outcome !== 'done') throw refusedProblem(outcome);
	return json(await jobPlans(db, membership, job.id, now), { headers: PRIVATE });
});
