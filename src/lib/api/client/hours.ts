import type { Hours } from '../hours';
import { getJson } from './request';

const MINUTE = 60_000;

/** Hours on their way that have been waited for: the next ones are asked for. */
const waitedFor = new WeakSet<Promise<Hours>>();

/**
 * Key and fetcher of a yard's Hours page, asked for again every few minutes.
 *
 * @param coming - hours already on their way with the page, taken in place of the first request
 */
export function hoursQuery(slug: string, coming: Promise<Hours> | null = null) {
	return {
		queryKey: ['hours', slug] as const,
		queryFn: ({ signal }: { signal: AbortSignal }) => {
			if (coming !== null && !waitedFor.has(coming)) {
				waitedFor.add(coming);
				return coming;
			}
			return getJson<Hours>(`/api/v1/yards/${encodeURIComponent(slug)}/hours`, signal);
		},
		staleTime: MINUTE,
		refetchInterval: 5 * MINUTE
	};
}
