import type { Problem } from '../problem';

/** A request that did not give what was asked for. */
export class ApiFailure extends Error {
	/** HTTP status; null when no answer came at all. */
	readonly status: number | null;
	/** Number under which the server's log has it; null when the server gave none. */
	readonly requestId: string | null;

	constructor(message: string, status: number | null, requestId: string | null, cause?: unknown) {
		super(message, { cause });
		this.name = 'ApiFailure';
		this.status = status;
		this.requestId = requestId;
	}
}

/** The members of a problem document (RFC 9457); none where a proxy answered with its own page. */
async function membersOf(
	response: Response
): Promise<{ readonly [Member in keyof Problem]?: unknown }> {
	try {
		const body: unknown = await response.json();
		return typeof body === 'object' && body !== null ? body : {};
	} catch {
		return {};
	}
}

const text = (value: unknown): string | null => (typeof value === 'string' ? value : null);

async function askJson<Answer>(path: string, init: RequestInit): Promise<Answer> {
	let response: Response;
	try {
		response = await fetch(path, { ...init, headers: { accept: 'application/json' } });
	} catch (cause) {
		if (init.signal?.aborted) throw cause;
		throw new ApiFailure('No answer came.', null, null, cause);
	}
	if (!response.ok) {
		const problem = await membersOf(response);
		throw new ApiFailure(
			text(problem.detail) ?? text(problem.title) ?? `The answer was ${response.status}.`,
			response.status,
			text(problem.requestId) ?? response.headers.get('x-request-id')
		);
	}
	const body: Answer = await response.json();
	return body;
}

/**
 * JSON of one of the application's own routes, in the shape of that route's schema.
 * @throws {ApiFailure} on any answer but a good one, and on none
 */
export function getJson<Answer>(path: string, signal: AbortSignal): Promise<Answer> {
	return askJson<Answer>(path, { signal });
}

/**
 * The answer to a request that changes something and needs no body.
 * @throws {ApiFailure} as `getJson` does
 */
export function postJson<Answer>(path: string): Promise<Answer> {
	return askJson<Answer>(path, { method: 'POST' });
}
