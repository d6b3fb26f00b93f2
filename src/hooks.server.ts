import type { ServerInit } from '@sveltejs/kit';
import { building } from '$app/environment';
import { env } from '$env/dynamic/private';
import { composeWeb } from '$lib/server/composition';
import { refuseUnwalled } from '$lib/server/db/health';
import { bodyLimit } from '$lib/server/hooks/bodyLimit';
import { failure } from '$lib/server/hooks/failure';
import { jsonOrigin } from '$lib/server/hooks/jsonOrigin';
import { preload } from '$lib/server/hooks/preload';
import { requestId } from '$lib/server/hooks/requestId';
import { securityHeaders } from '$lib/server/hooks/securityHeaders';
import { session } from '$lib/server/hooks/session';
import { sequence } from '@sveltejs/kit/hooks';

export const init: ServerInit = async () => {
	if (building) return;
	const composition = composeWeb(env, 'required');
	process.once('sveltekit:shutdown', () => void composition.close());
	await refuseUnwalled(composition.db);
};

export const handle = sequence(requestId, securityHeaders, bodyLimit, session, jsonOrigin, preload);
export const handleError = failure;
