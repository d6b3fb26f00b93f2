import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { ApiProblem } from './problem';

/** Outlooks a signed-out address may ask for in a minute, in each web process. */
const POINTS = 30;
const SECONDS = 60;
const limiter = new RateLimiterMemory({ points: POINTS, duration: SECONDS });

/**
 * Counts a request of somebody who is not signed in.
 *
 * @throws {ApiProblem} 429 with `Retry-After` once there have been too many
 */
export async function limitSignedOut(address: string): Promise<void> {
	try {
		await limiter.consume(address);
	} catch (refused) {
		if (!(refused instanceof RateLimiterRes)) throw refused;
		const seconds = Math.max(1, Math.ceil(refused.msBeforeNext / 1000));
		throw new ApiProblem(429, `Ask again in ${seconds} s, or sign in.`, undefined, {
			'retry-after': String(seconds)
		});
	}
}
