import { postJson } from './request';

/** What came of asking the provider at once. */
export interface ForecastAsked {
	/** What went wrong, in sentences; empty when all went well. */
	readonly troubles: readonly string[];
}

/** Asks the yard's forecast provider now, instead of at the next hour. */
export function askForecast(slug: string): Promise<ForecastAsked> {
	return postJson<ForecastAsked>(`/api/v1/yards/${encodeURIComponent(slug)}/forecast`);
}
