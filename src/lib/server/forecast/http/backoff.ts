const BASE_MS = 500;
const CAP_MS = 5_000;

/**
 * Wait before the next try: exponential with full jitter, so that many processes that failed
 * together do not come back together. Numbers are defaults, no source.
 *
 * @param failed - tries that have failed so far, from 1
 * @param random - uniform in [0, 1)
 * @returns milliseconds
 */
export function backoff(failed: number, random: number): number {
	return random * Math.min(CAP_MS, BASE_MS * 2 ** (failed - 1));
}
