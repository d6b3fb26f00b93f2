/**
 * HTTP dates and delays. All instants are UTC epoch seconds.
 * RFC 9110 §5.6.7 (dates), §10.2.3 (Retry-After); RFC 9111 §4.2.1 (freshness), §5.3 (Expires).
 */

/** An HTTP date; null when absent or not a date. */
export function parseHttpDate(value: string | null): number | null {
	// A bare number is no HTTP date, though Date.parse would take it for a year.
	if (value === null || !/[A-Za-z]/.test(value)) return null;
	const ms = Date.parse(value);
	return Number.isNaN(ms) ? null : Math.floor(ms / 1000);
}

/**
 * When to ask again, from a Retry-After header in seconds or as an HTTP date.
 *
 * @returns null when absent or unreadable
 */
export function parseRetryAfter(value: string | null, now: number): number | null {
	if (value === null) return null;
	const trimmed = value.trim();
	return /^\d+$/.test(trimmed) ? now + Number(trimmed) : parseHttpDate(trimmed);
}

/**
 * Until when an answer is fresh, on our own clock: the lifetime (Expires − Date) counted from now,
 * so that a provider whose clock differs from ours is neither hammered nor ignored.
 *
 * @returns null when there is no readable Expires; at the earliest `now`
 */
export function freshUntil(headers: Headers, now: number): number | null {
	const expires = parseHttpDate(headers.get('expires'));
	if (expires === null) return null;
	const lifetime = expires - (parseHttpDate(headers.get('date')) ?? now);
	return now + Math.max(0, lifetime);
}
