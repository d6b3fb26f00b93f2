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

export interface FetchRequest {
	place: ForecastPlace;
	/** UTC epoch seconds. */
	now: number;
	/** From the last answer that is still stored; both null when there is none. */
	validators: Validators;
	/** 1 = ask once, without retrying (a half-open circuit's probe). */
	attempts: number;
}

/** A provider's good answer. Instants in UTC epoch seconds. */
export type FetchAnswer = {
	/** Not to be asked again before this; null when the provider does not say. */
	expiresAt: number | null;
	validators: Validators;
} & (
	| { kind: 'unchanged' }
	| {
			kind: 'forecast';
			forecast: Forecast;
			/** What is lacking in an otherwise good forecast, in a sentence; null when nothing is. */
			shortfall: string | null;
	  }
);

/** Credit as a provider's terms ask, shown beside whatever was made from its data. */
export interface Attribution {
	text: string;
	url: string;
}

/** One public weather service. */
export interface Provider {
	readonly name: ProviderName;
	/** As a person would name it. */
	readonly label: string;
	readonly attribution: Attribution;
	/** What the free use allows and what paid or heavy use would need, in a sentence. */
	readonly terms: string;
	/**
	 * Asks the service for a place and brings its answer into the canonical form.
	 *
	 * @throws {ForecastTrouble} when it does not answer, or answers with anything but a sound forecast
	 */
	fetch(request: FetchRequest): Promise<FetchAnswer>;
}
