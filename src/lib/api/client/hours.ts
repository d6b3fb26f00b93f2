import type { Hours } from '../hours';
import { getJson } from './request';

const MINUTE = 60_000;

/** Key and fetcher of a yard's Hours page, asked for again every few minutes. */
export function hoursQuery(slug: string) {
	return {
		queryKey: ['hours', slug] as const,
		queryFn: ({ signal }: { signal: AbortSignal }) =>
			getJson<Hours>(`/api/v1/yards/${encodeURIComponent(slug)}/hours`, signal),
		staleTime: MINUTE,
		refetchInterval: 5 * MINUTE
	};
}
