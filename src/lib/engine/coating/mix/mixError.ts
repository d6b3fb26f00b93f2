import type { TimeName } from '../times';

/** Why a mix cannot be worked out; each names what is missing or wrong, with its number. */
export type MixError =
	/** A ratio by mass is measured out by volume, or the other way, and a part has no density. */
	| { readonly code: 'densityMissing'; readonly part: string }
	| { readonly code: 'ratioSilent' }
	/** The sheet gives no way to tell how far a litre goes. */
	| { readonly code: 'spreadSilent' }
	| { readonly code: 'potLifeSilent' }
	| { readonly code: 'temperatureUnknown' }
	/** A time that stands still this cold: the mix would never be ready. */
	| { readonly code: 'standsStill'; readonly time: TimeName; readonly celsius: number }
	| {
			readonly code: 'noTimeLeft';
			readonly potLifeMinutes: number;
			readonly inductionMinutes: number;
	  }
	| { readonly code: 'tooManyPots'; readonly pots: number; readonly potLitres: number }
	| { readonly code: 'outOfRange'; readonly field: string; readonly found: number };

/** A value, or the reason there is none. */
export type Mixed<T> =
	{ readonly ok: true; readonly value: T } | { readonly ok: false; readonly error: MixError };

export const mixed = <T>(value: T): Mixed<T> => ({ ok: true, value });
export const unmixed = (error: MixError): { readonly ok: false; readonly error: MixError } => ({
	ok: false,
	error
});
