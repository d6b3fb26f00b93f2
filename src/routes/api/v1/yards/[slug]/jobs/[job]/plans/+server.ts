import { json } from '@sveltejs/kit';
import { takePlanSchema } from '$lib/api/plans';
import { refusedProblem } from '$lib/server/http/outcome';
import { api, ApiProblem } from '$lib/server/http/problem';
import { jobAt } from '$lib/server/jobs/jobAddress';
import { asked, PRIVATE } from '$lib/server/jobs/jobAnswer';
import { jobPlans } from '$lib/server/plans/jobPlans';
import { letGo, takePlan } from '$lib/server/plans/takePlan';
import type { RequestHandler } from './$types';

const at = ({ slug = '', job = '' }: { slug?: string; job?: string }) => ({ yard: slug, job });

export const GET: RequestHandler = api(async ({ locals, params }) => {
	const { db, membership, job } = await jobAt(locals, at(params), 'see');
	return json(await jobPlans(db, membership, job.id, new Date()), { headers: PRIVATE });
});

/** Takes a plan as it was shown, in place of the one in force. */
export const POST: RequestHandler = api(async ({ locals, params, request }) => {
	const { db, membership, job } = await jobAt(locals, at(params), 'takePlan');
	const choice = await asked(request, takePlanSchema);
	const now = new Date();
	const outcome = await takePlan(db, membership, job.id, choice, now);
	if (outcome.outcome !== 'done') throw refusedProblem(outcome);
	return json(await jobPlans(db, membership, job.id, now), { status: 201, headers: PRIVATE });
});

/** Lets go of the plan in force. */
export const DELETE: RequestHandler = api(async ({ locals, params }) => {
	const { db, membership, job } = await jobAt(locals, at(params), 'takePlan');
	if (!(await letGo(db, membership, job.id, new Date())))
		throw new ApiProblem(404, 'No plan of this job is in force.');
	return new Response(null, { status: 204 });
});
