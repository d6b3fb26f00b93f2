import { json } from '@sveltejs/kit';
import { parts } from '$lib/server/composition';
import { healthOf } from '$lib/server/http/health';
import { api } from '$lib/server/http/problem';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = api(async () => {
	const health = await healthOf(parts().db, new Date());
	return json(health, {
		status: health.status === 'down' ? 503 : 200,
		headers: { 'cache-control': 'no-store' }
	});
});
