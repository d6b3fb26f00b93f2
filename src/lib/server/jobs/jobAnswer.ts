import { json } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Membership } from '../access/roles';
import type { Database } from '../db/client';
import { jsonBody } from '../http/body';
import { refusedProblem } from '../http/outcome';
import { ApiProblem, invalid } from '../http/problem';
import { jobView } from './jobView';
import type { Outcome } from './outcome';

/** What a request about a job may weigh. */
const MOST_BYTES = 64 * 1024;
/** What is somebody's own is kept nowhere on the way. */
export const PRIVATE = { 'cache-control': 'private, no-store' };

/**
 * What a request says, by its schema.
 *
 * @throws {ApiProblem} 400 naming each field, 413, 415
 */
export async function asked<Schema extends z.ZodType>(
	request: Request,
	schema: Schema
): Promise<z.infer<Schema>> {
	const parsed = schema.safeParse(await jsonBody(request, MOST_BYTES));
	if (!parsed.success) throw invalid(parsed.error);
	return parsed.data;
}

/** The job as it is after what was asked of it. */
export async function answerJob(
	db: Database,
	membership: Membership,
	jobId: string,
	outcome: Outcome,
	status = 200
): Promise<Response> {
	if (outcome.outcome !== 'done') throw refusedProblem(outcome);
	const view = await jobView(db, membership, jobId);
	if (view === null) throw new ApiProblem(404, 'That is not there any more.');
	return json(view, { status, headers: PRIVATE });
}
