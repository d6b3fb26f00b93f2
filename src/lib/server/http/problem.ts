import { isHttpError, isRedirect, type RequestEvent } from '@sveltejs/kit';
import type { ZodError } from 'zod';
import type { Problem } from '../../api/problem';
import { parts } from '../composition';

const TITLES: Readonly<Record<number, string>> = {
	400: 'The request cannot be understood',
	401: 'Sign in first',
	403: 'Not allowed',
	404: 'Not found',
	405: 'Not a method of this address',
	409: 'Not as things stand',
	413: 'Too large',
	415: 'Not a media type of this address',
	429: 'Too many requests',
	500: 'Something went wrong on our side',
	503: 'Not able to answer now'
};

/** What went wrong with a request of a program, as a value to throw. */
export class ApiProblem extends Error {
	override readonly name = 'ApiProblem';
	constructor(
		readonly status: number,
		detail: string,
		readonly errors?: Problem['errors'],
		readonly headers: Record<string, string> = {}
	) {
		super(detail);
	}
}

/** The answer that tells a problem. */
export function problemResponse(problem: ApiProblem, requestId: string): Response {
	const body: Problem = {
		type: 'about:blank',
		title: TITLES[problem.status] ?? 'The request failed',
		status: problem.status,
		detail: problem.message,
		requestId,
		...(problem.errors === undefined ? {} : { errors: problem.errors })
	};
	return Response.json(body, {
		status: problem.status,
		headers: { ...problem.headers, 'content-type': 'application/problem+json' }
	});
}

const pointerOf = (path: readonly PropertyKey[]): string =>
	path.map((part) => `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');

/** A 400 that names each field a schema refused. */
export function invalid(error: ZodError): ApiProblem {
	const errors = error.issues.flatMap((issue) =>
		issue.code === 'unrecognized_keys'
			? issue.keys.map((key) => ({
					pointer: pointerOf([...issue.path, key]),
					detail: 'is not a field of this request'
				}))
			: [{ pointer: pointerOf(issue.path), detail: issue.message }]
	);
	const [first] = errors;
	const more = errors.length > 1 ? `, and ${errors.length - 1} more` : '';
	return new ApiProblem(
		400,
		`${first?.pointer ?? '/'}: ${first?.detail ?? 'is wrong'}${more}.`,
		errors
	);
}

/**
 * Runs a handler of `/api`; whatever it throws becomes a problem document. What was not foreseen
 * is logged under the request's number and told as no more than that.
 */
export function api<Event extends RequestEvent>(
	handler: (event: Event) => Promise<Response>
): (event: Event) => Promise<Response> {
	return async (event) => {
		const { requestId } = event.locals;
		try {
			return await handler(event);
		} catch (thrown) {
			if (isRedirect(thrown)) throw thrown;
			if (thrown instanceof ApiProblem) return problemResponse(thrown, requestId);
			if (isHttpError(thrown))
				return problemResponse(new ApiProblem(thrown.status, thrown.body.message), requestId);
			parts().log.error({ err: thrown, requestId, path: event.url.pathname }, 'request failed');
			return problemResponse(
				new ApiProblem(500, 'It is logged under the number of this request.'),
				requestId
			);
		}
	};
}
