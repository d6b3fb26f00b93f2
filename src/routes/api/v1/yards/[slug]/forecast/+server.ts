import { json } from '@sveltejs/kit';
import type { Refresh } from '$lib/api/refresh';
import { requireMembership } from '$lib/server/access/roles';
import { parts } from '$lib/server/composition';
import { currentForecast } from '$lib/server/forecast/current';
import { refreshForecast } from '$lib/server/forecast/refresh';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

/** Asks the provider now. One that may not be asked again yet is not: the answer says what is known. */
export const POST: RequestHandler = api(async ({ locals, params }) => {
	const { db, config } = parts();
	const { yard } = await requireMembership(db, locals, params.slug ?? '', 'askForecast');
	const now = new Date();
	const { outcome, troubles } = await refreshForecast({ db, config }, yard, now);
	const current = await currentForecast(db, yard, now);
	const answer: Refresh = {
		outcome,
		troubles: troubles.map(({ sentence }) => sentence),
		forecast: current?.source ?? null
	};
	return json(answer);
});
