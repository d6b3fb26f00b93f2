/** What can go wrong between a provider and the store. Closed: callers switch on it. */
export const TROUBLE_CODES = [
	/** No answer: refused connection, unknown host, broken transfer. */
	'unreachable',
	/** No answer within the time allowed. */
	'timeout',
	/** Asked to wait (429) for longer than a refresh can. */
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
	/** Hours out of order, doubled, not on the hour, or not in UTC. */
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
	override readonly name = 'ForecastTrouble';

	/**
	 * @param code - for the program
	 * @param sentence - for a person
	 * @param retryAt - UTC epoch seconds before which the provider asked not to be asked again
	 */
	constructor(
		readonly code: TroubleCode,
		sentence: string,
		readonly retryAt: number | null = null,
		options?: ErrorOptions
	) {
		super(sentence, options);
	}
}
