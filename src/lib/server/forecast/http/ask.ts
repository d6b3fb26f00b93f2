import { parseJson, readText } from './body';
import { backoff } from './backoff';
import { freshUntil, parseHttpDate, parseRetryAfter } from './dates';
import { sharedAgent, type HttpTools } from './tools';
import type { Validators } from '../provider';
import { ForecastTrouble } from '../trouble';

export interface Ask {
	url: URL;
	/** As a person would name it; in every trouble's sentence. */
	provider: string;
	userAgent: string;
	validators: Validators;
	attempts: number;
}

/** An answer to use: a new body, or the word that the last one still holds. */
export type Answer = {
	/** UTC epoch seconds; null where the provider does not say. */
	expiresAt: number | null;
	/** The provider's clock when it answered, UTC epoch seconds; null where it does not say. */
	date: number | null;
	validators: Validators;
} & (
	| { kind: 'unchanged' }
	| {
			kind: 'body';
			/** Parsed JSON, of unknown shape. */
			body: unknown;
			/** Status 203: this version of the service is about to end. */
			deprecated: boolean;
	  }
);

/** A failed try; `waitUntil` is the earliest instant, in ms, that the provider allows. */
interface Failure {
	trouble: ForecastTrouble;
	again: boolean;
	waitUntil: number | null;
}

/**
 * GET with conditional headers, retried on what may pass (no answer, 5xx, a short 429), within one
 * time limit for everything.
 *
 * `globalThis.fetch` is looked up at each try, so that whatever stands in for it then is used.
 *
 * @throws {ForecastTrouble} when no try gave an answer to use
 */
export async function askJson(ask: Ask, tools: HttpTools): Promise<Answer> {
	const deadline = tools.clock() + tools.overallTimeout;
	for (let attempt = 1; ; attempt++) {
		const left = Math.min(tools.attemptTimeout, deadline - tools.clock());
		const result = await tryOnce(ask, Math.max(1, left), tools);
		if (!('trouble' in result)) return result;
		const { trouble, again, waitUntil } = result;
		if (!again || attempt >= ask.attempts) throw trouble;
		const jittered = tools.clock() + backoff(attempt, tools.random());
		const next = Math.max(jittered, waitUntil ?? 0);
		if (next >= deadline) throw trouble;
		await tools.sleep(next - tools.clock());
	}
}

async function tryOnce(ask: Ask, timeout: number, tools: HttpTools): Promise<Answer | Failure> {
	const headers = new Headers({ accept: 'application/json', 'user-agent': ask.userAgent });
	if (ask.validators.etag !== null) headers.set('if-none-match', ask.validators.etag);
	if (ask.validators.lastModified !== null)
		headers.set('if-modified-since', ask.validators.lastModified);
	// `dispatcher` is undici's addition to fetch; the DOM's type does not know it.
	const init = {
		headers,
		signal: AbortSignal.timeout(Math.ceil(timeout)),
		dispatcher: sharedAgent()
	} as RequestInit;
	try {
		const response = await globalThis.fetch(ask.url, init);
		const failure = await judge(response, ask.provider, tools.clock());
		if (failure !== null) return failure;
		return await read(response, ask, Math.floor(tools.clock() / 1000));
	} catch (error) {
		if (error instanceof ForecastTrouble) return { trouble: error, again: false, waitUntil: null };
		return { trouble: noAnswer(error, ask.provider, timeout), again: true, waitUntil: null };
	}
}

async function read(response: Response, ask: Ask, now: number): Promise<Answer> {
	const head = {
		expiresAt: freshUntil(response.headers, now),
		date: parseHttpDate(response.headers.get('date')),
		// A 304 may leave out what has not changed.
		validators: {
			etag: response.headers.get('etag') ?? (response.status === 304 ? ask.validators.etag : null),
			lastModified:
				response.headers.get('last-modified') ??
				(response.status === 304 ? ask.validators.lastModified : null)
		}
	};
	if (response.status === 304) {
		if (ask.validators.etag === null && ask.validators.lastModified === null)
			throw new ForecastTrouble(
				'wrongFormat',
				`${ask.provider} answers "not modified" to a request that was not conditional.`
			);
		return { ...head, kind: 'unchanged' };
	}
	const body = parseJson(await readText(response, ask.provider), ask.provider);
	return { ...head, kind: 'body', body, deprecated: response.status === 203 };
}

/** @returns null for an answer to use (200, 203, or 304 to a conditional request) */
async function judge(response: Response, provider: string, nowMs: number): Promise<Failure | null> {
	const { status } = response;
	if (status === 200 || status === 203 || status === 304) return null;
	const reason = await reasonGiven(response);
	const retryAt = parseRetryAfter(response.headers.get('retry-after'), Math.floor(nowMs / 1000));
	const waitUntil = retryAt === null ? null : retryAt * 1000;
	if (status === 429)
		return {
			trouble: new ForecastTrouble(
				'rateLimited',
				`${provider} asks us to wait before the next request${reason}.`,
				retryAt
			),
			// Without a time to wait for, asking again at once is what a limit is there to stop.
			again: retryAt !== null,
			waitUntil
		};
	if (status >= 500)
		return {
			trouble: new ForecastTrouble(
				'providerFault',
				`${provider} has a fault of its own (HTTP ${status})${reason}.`,
				retryAt
			),
			again: true,
			waitUntil
		};
	return {
		trouble: new ForecastTrouble(
			'refused',
			`${provider} refuses the request (HTTP ${status})${reason}.`
		),
		again: false,
		waitUntil: null
	};
}

/** The reason that Open-Meteo gives as `{"error": true, "reason": …}`, ready to be appended. */
async function reasonGiven(response: Response): Promise<string> {
	try {
		const body: unknown = JSON.parse(await readText(response, '', 64 * 1024));
		if (typeof body !== 'object' || body === null || !('reason' in body)) return '';
		return typeof body.reason === 'string'
			? `: ${body.reason.slice(0, 200).replace(/[.\s]+$/, '')}`
			: '';
	} catch {
		// Most errors come as HTML or nothing; the status alone has to do.
		return '';
	}
}

function noAnswer(error: unknown, provider: string, timeout: number): ForecastTrouble {
	const timedOut =
		error instanceof Error && (error.name === 'TimeoutError' || /TIMEOUT/.test(causeCode(error)));
	return timedOut
		? new ForecastTrouble(
				'timeout',
				`${provider} did not answer within ${Math.max(1, Math.round(timeout / 1000))} s.`,
				null,
				{ cause: error }
			)
		: new ForecastTrouble('unreachable', `${provider} cannot be reached.`, null, { cause: error });
}

function causeCode(error: Error): string {
	const { cause } = error;
	return typeof cause === 'object' && cause !== null && 'code' in cause ? String(cause.code) : '';
}
