import { createHash } from 'node:crypto';

/** Refreshes are spread over this much of the hour; the rest is for those that are late. */
const SPREAD_SECONDS = 50 * 60;

/**
 * Seconds after the full hour at which a yard is refreshed: the same every hour, even over yards,
 * so that a provider is never asked for all of them at once.
 */
export function refreshOffsetSeconds(yardId: string): number {
	const digest = createHash('sha256').update(yardId).digest();
	return Math.floor((digest.readUInt32BE(0) / 2 ** 32) * SPREAD_SECONDS);
}
