import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { ApiProblem } from './problem';

/** Requests of one token, and unknown tokens from one address, in a minute and web process. */
const byToken = new RateLimiterMemory({ points: 300, duration: 60, keyPrefix: 'token' });
const unknown = new RateLimiterMemory({ points: 20, duration: 60, keyPrefix: 'unknown' });

function tooMany(refused: unknown): ApiProblem {
	if (!(refused instanceof RateLimiterRes)) throw refused;
	const seconds = Math.max(1, Math.ceil(refused.msBeforeNext / 1000));
	return new ApiProblem(429, `Ask again in ${seconds} s.`, undefined, {
		'retry-after': String(seconds)
	});
}

/** Counts a request of a token. Throws {@link ApiProblem} 429 once there were too many. */
export async function limitToken(id: string): Promise<void> {
	await byToken.consume(id).catch((refused: unknown) => {
		throw tooMany(refused);
	});
}

/** Throws {@link ApiProblem} 429 for an address that has tried too many unknown tokens. */
export async function refuseGuessing(address: string): Promise<void> {
	const tried = await unknown.get(address);
	if (tried !== null && tried.remainingPoints <= 0) throw tooMany(tried);
}

/** Counts an unknown token of an address. */
export async function countUnknownToken(address: string): Promise<void> {
	await unknown.penalty(address, 1);
}
