import { randomUUID } from 'node:crypto';
import type { Handle } from '@sveltejs/kit';

/** A number for each request, in the log and in front of whoever asks for help. */
export const requestId: Handle = async ({ event, resolve }) => {
	event.locals.requestId = randomUUID().slice(0, 8);
	const response = await resolve(event);
	response.headers.set('x-request-id', event.locals.requestId);
	return response;
};
