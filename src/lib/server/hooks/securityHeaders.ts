import type { Handle } from '@sveltejs/kit';

const HEADERS = {
	'x-content-type-options': 'nosniff',
	'referrer-policy': 'same-origin',
	'permissions-policy': 'camera=(self), geolocation=(), microphone=()',
	'cross-origin-opener-policy': 'same-origin'
} as const;

/** Headers beside the page's content policy, which svelte.config.js sets. */
export const securityHeaders: Handle = async ({ event, resolve }) => {
	const response = await resolve(event);
	for (const [name, value] of Object.entries(HEADERS)) response.headers.set(name, value);
	return response;
};
