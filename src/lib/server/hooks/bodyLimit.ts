import { error, text, type Handle, type RequestEvent } from '@sveltejs/kit';
import { problemResponse, ApiProblem } from '../http/problem';
import { hangUpSoon } from '../http/sentBody';

/** The most that any address but those of files takes, as the framework's own server would. */
export const MOST_BODY_BYTES = 512 * 1024;

/** Where files come in. They are read as a stream, by handlers that keep limits of their own. */
const TAKES_FILES: readonly (readonly [route: string, method: string, action: string])[] = [
	['/api/v1/yards/[slug]/boats/[boat]/files', 'POST', ''],
	['/[yard]/boats/[boat]/files', 'POST', '?/upload']
];
const takesFiles = ({ route, request, url }: RequestEvent): boolean =>
	TAKES_FILES.some(
		([id, method, action]) =>
			id === route.id && method === request.method && (action === '' || url.search === action)
	);

const SENTENCE = `This address takes at most ${MOST_BODY_BYTES / 1024} KiB.`;

/** The same request with a body that breaks off once it is larger than it may be. */
function limited(request: Request, body: ReadableStream<Uint8Array>): Request {
	const reader = body.getReader();
	let bytes = 0;
	const held = new ReadableStream<Uint8Array>({
		async pull(controller) {
			const chunk = await reader.read();
			if (chunk.done) return controller.close();
			bytes += chunk.value.byteLength;
			if (bytes <= MOST_BODY_BYTES) return controller.enqueue(chunk.value);
			reader.releaseLock();
			hangUpSoon(body);
			try {
				error(413, SENTENCE);
			} catch (tooLarge) {
				controller.error(tooLarge);
			}
		},
		cancel: (reason) => reader.cancel(reason)
	});
	return new Request(request, { body: held, duplex: 'half' } as RequestInit);
}

/**
 * Holds every address to the size of what it takes. The server below lets everything pass
 * (`BODY_SIZE_LIMIT=Infinity`), since its one limit for all would either cut photos off or let
 * forms of their size into memory.
 */
export const bodyLimit: Handle = async ({ event, resolve }) => {
	const { request } = event;
	const { body } = request;
	if (body === null || takesFiles(event)) return resolve(event);
	if (Number(request.headers.get('content-length') ?? 0) > MOST_BODY_BYTES) {
		hangUpSoon(body);
		return event.url.pathname.startsWith('/api/')
			? problemResponse(new ApiProblem(413, SENTENCE), event.locals.requestId)
			: text(SENTENCE, { status: 413 });
	}
	event.request = limited(request, body);
	return resolve(event);
};
