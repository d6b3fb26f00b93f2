import type { RequestEvent } from '@sveltejs/kit';
import type { SignedInUser } from '../../../src/lib/server/access/sessions';

export interface Asked {
	url?: string;
	method?: string;
	params?: Record<string, string>;
	user?: SignedInUser | null;
	headers?: Record<string, string>;
	body?: string;
	address?: string;
}

/** The parts of a request event that handlers of the API look at. */
export function eventOf<Event extends RequestEvent>(asked: Asked): Event {
	const url = new URL(asked.url ?? 'http://127.0.0.1/api/v1');
	const event = {
		url,
		params: asked.params ?? {},
		locals: { user: asked.user ?? null, session: null, requestId: 'test' },
		getClientAddress: () => asked.address ?? '127.0.0.1',
		request: new Request(url, {
			method: asked.method ?? 'GET',
			headers: asked.headers ?? {},
			...(asked.body === undefined ? {} : { body: asked.body })
		})
	};
	return event as unknown as Event;
}

/** Status, media type and body of an answer. */
export async function told(response: Response | Promise<Response>) {
	const answer = await response;
	return {
		status: answer.status,
		type: answer.headers.get('content-type') ?? '',
		headers: answer.headers,
		body: await answer.json()
	};
}
