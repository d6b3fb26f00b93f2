import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';

/** Letters that an address on the network, and one recipient, may cause in an hour, per web process. */
const byAddress = new RateLimiterMemory({ points: 20, duration: 3600, keyPrefix: 'address' });
const byRecipient = new RateLimiterMemory({ points: 5, duration: 3600, keyPrefix: 'recipient' });

/** Minutes to wait before another letter may be caused; null where one may be now. */
export async function mailPause(address: string, recipient: string): Promise<number | null> {
	try {
		await byAddress.consume(address);
		await byRecipient.consume(recipient);
		return null;
	} catch (refused) {
		if (!(refused instanceof RateLimiterRes)) throw refused;
		return Math.max(1, Math.ceil(refused.msBeforeNext / 60_000));
	}
}
