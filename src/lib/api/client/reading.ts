import type { Reading } from '../reading';
import { getJson } from './request';

const MINUTE = 60_000;

/**
 * Key and fetcher of the reading of one quarter-hour.
 * @param slotStart epoch ms at which the quarter-hour begins
 */
export function readingQuery(slug: string, stepId: string, slotStart: number) {
	const at = new Date(slotStart).toISOString();
	const path = `/api/v1/yards/${encodeURIComponent(slug)}/steps/${encodeURIComponent(stepId)}/reading`;
	return {
		queryKey: ['reading', slug, stepId, at] as const,
		queryFn: ({ signal }: { signal: AbortSignal }) =>
			getJson<Reading>(`${path}?${new URLSearchParams({ at })}`, signal),
		staleTime: 5 * MINUTE
	};
}
