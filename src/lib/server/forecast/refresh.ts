import type { Database } from '../db/client';
import type { ProviderName, Yard } from '../db/schema';
import type { ForecastConfig } from './config';
import type { TroubleCode } from './trouble';

/** What a refresh needs to know of a yard. */
export type ForecastYard = Pick<
	Yard,
	'id' | 'latitude' | 'longitude' | 'elevation' | 'forecastProvider'
>;

/** What a refresh works with; see `forecastDeps` for the usual ones. */
export interface ForecastDeps {
	db: Database;
	config: ForecastConfig;
}

export interface ProviderTrouble {
	provider: ProviderName;
	code: TroubleCode;
	sentence: string;
}

/** How a refresh ended. `troubles` lists what went wrong on the way, in the order it was tried. */
export type RefreshResult = { troubles: ProviderTrouble[] } & (
	| { outcome: 'stored'; provider: ProviderName; runId: string; issuedAt: Date }
	/** The provider says that the stored run is still its latest. */
	| { outcome: 'confirmed'; provider: ProviderName; runId: string; issuedAt: Date }
	/** The provider may not be asked again yet; the stored run is still good. */
	| { outcome: 'notDue'; provider: ProviderName; until: Date }
	/** Another process is refreshing this yard. */
	| { outcome: 'busy' }
	/** No provider answered; the last good run stays. */
	| { outcome: 'lastGood'; provider: ProviderName; runId: string; issuedAt: Date }
	/** No provider answered and nothing was ever stored. */
	| { outcome: 'none' }
);

/**
 * Fetches a forecast for a yard: its own provider first, then the other one, else the last good run
 * stays. Safe to call from many processes at once.
 */
export declare function refreshForecast(
	deps: ForecastDeps,
	yard: ForecastYard,
	now: Date
): Promise<RefreshResult>;
