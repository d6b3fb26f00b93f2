import type { HandleServerError } from '@sveltejs/kit';
import { parts } from '../composition';

/** Logs what was not foreseen under the request's number; the browser gets a fixed sentence and it. */
export const failure: HandleServerError = ({ error, event, status, message }) => {
	const { requestId } = event.locals;
	if (status < 500) return { message, requestId };
	parts().log.error(
		{ err: error, requestId, path: event.url.pathname, method: event.request.method },
		'request failed'
	);
	return { message: 'Something went wrong on our side.', requestId };
};
