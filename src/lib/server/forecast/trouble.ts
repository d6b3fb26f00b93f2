/** What can go wrong between a provider and the store. Closed: callers switch on it. */
export const TROUBLE_CODES = [
	/** No answer: refused connection, unknown host, broken transfer. */
	'unreachable',
	/** No answer within the time allowed. */
	'timeout',
	/** Asked to wait (429), beyond what a refresh can wait for. */
	'rateLimited',
	/** The provider's own fault (5xx). */
	'providerFault',
	/** The provider refuses the request (other 4xx): asking again will not help. */
	'refused',
	/** More bytes than any true answer has. */
	'tooLarge',
	/** Not JSON: cut short, or not JSON at all (NaN is not JSON). */
	'notJson',
	/** JSON, but not the format documented. */
	'wrongFormat',
	/** Declares another unit than was asked for. */
	'wrongUnits',
	/** Hours out of order, doubled, or not on the hour. */
	'badTimes',
	/** A series shorter or longer than its hours. */
	'wrongLength',
	/** A value no weather has. */
	'implausible',
	/** Issued too long ago, or in the future, or for other days than were asked for. */
	'staleIssue',
	/** Too many failures lately: not asked until the circuit half-opens. */
	'circuitOpen',
	/** The provider's terms ask for a contact address and none is configured. */
	'noContact'
] as const;
export type TroubleCode = (typeof TROUBLE_CODES)[number];

/**
 * An expected failure of a provider. `message` is a whole sentence that a person can read; it names
 * the provider and what is wrong.
 */
export class ForecastTrouble extends Error {
	readonly code: TroubleCode;

	constructor(code: TroubleCode, sentence: string, options?: ErrorOptions) {
		super(sentence, options);
		this.name = 'ForecastTrouble';
		this.code = code;
	}
}
