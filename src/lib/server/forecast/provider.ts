import type { Forecast } from '../../engine';
import type { ProviderName } from '../db/schema';

/** The place a forecast is asked for. Degrees, metres above sea level. */
export interface ForecastPlace {
	latitude: number;
	longitude: number;
	elevation: number;
}

/** What makes a request conditional; null where the provider gave none. */
export interface Validators {
	etag: string | null;
	lastModified: string | null;
}
export const NO_VALIDATORS: Validators = { etag: null, lastModified: null };

export interface FetchRequest {
	place: ForecastPlace;
	/** UTC epoch seconds. */
	now: number;
	/** Of the last answer, while it is still stored. */
	validators: Validators;
	/** How often to try; 1 is the probe of a half-open circuit. */
	attempts: number;
}

/** A provider's good answer. Instants in UTC epoch seconds. */
export type FetchAnswer = {
	/** Not to be asked again before this; null where the provider does not say. */
	expiresAt: number | null;
	validators: Validators;
} & (
	| { kind: 'unchanged' }
	| {
			kind: 'forecast';
			forecast: Forecast;
			/** What an otherwise good forecast lacks, in a sentence; null when nothing. */
			shortfall: string | null;
	  }
);

/** One public weather service. */
export interface Provider {
	readonly name: ProviderName;
	/**
	 * Asks the service for a place and brings its answer into the canonical form.
	 *
	 * @throws {ForecastTrouble} when it does not answer, or answers with anything but a sound forecast
	 */
	fetch(request: FetchRequest): Promise<FetchAnswer>;
}
