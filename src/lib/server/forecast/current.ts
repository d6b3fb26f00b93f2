import type { ForecastSource } from '../../api/hours';
import type { Forecast } from '../../engine';
import type { Database } from '../db/client';
import type { ForecastYard } from './refresh';

export interface CurrentForecast {
	/** The stored run, with up to 48 h of history from earlier runs before it. */
	forecast: Forecast;
	/** Identifies the run: the same id and the same history give the same outlook. */
	runId: string;
	source: ForecastSource;
}

/** The forecast a yard works with now; null when none was ever stored. */
export declare function currentForecast(
	db: Database,
	yard: ForecastYard,
	now: Date
): Promise<CurrentForecast | null>;
