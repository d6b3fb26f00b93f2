import type { ForecastTrouble, TroubleCode } from './trouble';

/**
 * A circuit per yard and provider, kept in the database so that all processes share it: after
 * `FAILURES_TO_OPEN` failed refreshes in a row the provider is left alone for a while, then asked
 * once (half open); that answer closes the circuit, another failure opens it for twice as long.
 * Numbers are defaults, no source.
 */
export interface Circuit {
	failures: number;
	/** Not to be asked before this; null or past: may be asked. */
	openUntil: Date | null;
}

export const FAILURES_TO_OPEN = 3;
const FIRST_OPEN_MS = 30 * 60_000;
const LONGEST_OPEN_MS = 2 * 3_600_000;
/** After a limit that named no time. */
const UNNAMED_WAIT_MS = 15 * 60_000;
/** Tries within one refresh while the circuit is closed. */
const ATTEMPTS = 3;

/** The provider does what it should; the fault is ours, and waiting does not mend it. */
const NOT_COUNTED: readonly TroubleCode[] = ['noContact', 'circuitOpen'];

export const CLOSED: Circuit = { failures: 0, openUntil: null };

export const isOpen = ({ openUntil }: Circuit, now: Date): boolean =>
	openUntil !== null && openUntil > now;

/** Tries that a refresh may make: one while half open. */
export const attemptsAllowed = ({ failures }: Circuit): number =>
	failures >= FAILURES_TO_OPEN ? 1 : ATTEMPTS;

/** The circuit after a failed refresh. */
export function afterFailure(circuit: Circuit, trouble: ForecastTrouble, now: Date): Circuit {
	if (NOT_COUNTED.includes(trouble.code)) return circuit;
	// A refused request stays refused: no point in trying the same thing three times.
	const failures =
		trouble.code === 'refused'
			? Math.max(FAILURES_TO_OPEN, circuit.failures + 1)
			: circuit.failures + 1;
	const waits: number[] = [];
	if (failures >= FAILURES_TO_OPEN)
		waits.push(Math.min(LONGEST_OPEN_MS, FIRST_OPEN_MS * 2 ** (failures - FAILURES_TO_OPEN)));
	if (trouble.retryAt !== null) waits.push(trouble.retryAt * 1000 - now.getTime());
	else if (trouble.code === 'rateLimited') waits.push(UNNAMED_WAIT_MS);
	return {
		failures,
		openUntil: waits.length === 0 ? null : new Date(now.getTime() + Math.max(...waits))
	};
}
