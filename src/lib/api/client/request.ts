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

/** What of a problem document (RFC 9457) a person can use. */
interface Problem {
	readonly title?: unknown;
	readonly detail?: unknown;
	readonly requestId?: unknown;
}

async function problemOf(response: Response): Promise<Problem> {
	try {
		const body: unknown = await response.json();
		return typeof body === 'object' && body !== null ? body : {};
	} catch {
		// A proxy's page, or nothing: the status says enough.
		return {};
	}
}

const text = (value: unknown): string | null => (typeof value === 'string' ? value : null);

/**
 * JSON of one of the application's own routes, in the shape of that route's schema.
 * @throws {ApiFailure} on any answer but a good one, and on none
 */
export async function getJson<Answer>(path: string, signal: AbortSignal): Promise<Answer> {
	let response: Response;
	try {
		response = await fetch(path, { signal, headers: { accept: 'application/json' } });
	} catch (cause) {
		if (signal.aborted) throw cause;
		throw new ApiFailure('No answer came.', null, null, cause);
	}
	if (!response.ok) {
		const problem = await problemOf(response);
		throw new ApiFailure(
			text(problem.detail) ?? text(problem.title) ?? `The answer was ${response.status}.`,
			response.status,
			text(problem.requestId) ?? response.headers.get('x-request-id')
		);
	}
	const body: Answer = await response.json();
	return body;
}
