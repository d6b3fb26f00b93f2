import type { Handle } from '@sveltejs/kit';
import { parts } from '../composition';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses a change asked for by another site's page with this site's cookie. The framework checks
 * form posts; this covers the rest, which a browser marks with `Origin` as well. A token comes with
 * no page by itself: whoever sends one means to.
 */
export const jsonOrigin: Handle = ({ event, resolve }) => {
	const origin = event.request.headers.get('origin');
	const foreign = origin !== null && origin !== new URL(parts().config.ORIGIN).origin;
	if (
		!SAFE.has(event.request.method) &&
		foreign &&
		event.locals.user !== null &&
		event.locals.token === null
	)
		return new Response('This request came from another site.', { status: 403 });
	return resolve(event);
};
