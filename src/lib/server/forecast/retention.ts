const HOUR_MS = 3_600_000;

/**
 * How long runs are kept, and why. Every run for 60 h: the history of a forecast reaches 48 h back
 * and a run fetched some hours before the window's start can still fill it. Then one run in six
 * hours up to ten days: scoring compares readings with what was forecast 24, 48 and 72 h before,
 * to which six hours are near enough, and a reading may come from a phone that was offline for
 * days. The newest run of each provider is never deleted: it may be the last good one. That is
 * some 90 runs a yard, about 30 MB with members.
 */
export const KEEP_ALL_MS = 60 * HOUR_MS;
export const KEEP_THINNED_MS = 240 * HOUR_MS;
export const THINNED_SPACING_MS = 6 * HOUR_MS;

/**
 * Runs that no longer serve.
 *
 * @param runs - of one yard and one provider, newest first
 */
export function prunable<R extends { fetchedAt: Date }>(runs: readonly R[], now: Date): R[] {
	const kept = new Set<number>();
	return runs.filter(({ fetchedAt }, i) => {
		const age = now.getTime() - fetchedAt.getTime();
		if (i === 0 || age <= KEEP_ALL_MS) return false;
		if (age > KEEP_THINNED_MS) return true;
		const bin = Math.floor(fetchedAt.getTime() / THINNED_SPACING_MS);
		if (kept.has(bin)) return true;
		kept.add(bin);
		return false;
	});
}
