import { json } from '@sveltejs/kit';
import { outlookRequestSchema } from '$lib/api/outlook/request';
import { jsonBody } from '$lib/server/http/body';
import { api, invalid } from '$lib/server/http/problem';
import { limitSignedOut } from '$lib/server/http/rateLimit';
import { answerOutlook } from '$lib/server/outlook/stateless';
import type { RequestHandler } from './$types';

/** Sixty members of eighteen days, every variable. */
const MOST_BYTES = 6_000_000;

export const POST: RequestHandler = api(async ({ locals, request, getClientAddress }) => {
	if (locals.user === null) await limitSignedOut(getClientAddress());
	const parsed = outlookRequestSchema.safeParse(await jsonBody(request, MOST_BYTES));
	if (!parsed.success) throw invalid(parsed.error);
	return json(answerOutlook(parsed.data));
});
