import type { Limiter, StepKind } from '../../vocabulary';
import type { Slip } from './launch';

/** Where a plan puts one step. Instants in UTC epoch seconds. */
export interface PlannedStep {
	/** Index among the job's steps; null for an abrading that the plan puts in. */
	readonly step: number | null;
	readonly kind: StepKind;
	readonly start: number;
	readonly finish: number;
	/** Fixed by hand, taken or logged: it counts for no room or chance. */
	readonly isFixed: boolean;
	/** Least scaled room over the slots worked, and what has it; null for a fixed step. */
	readonly room: number | null;
	readonly limiter: Limiter | null;
	/**
	 * When the next coat may start after it; null where the sheet sets no such limit, or it lies past
	 * what the forecast tells.
	 */
	readonly earliestNext: number | null;
	readonly latestNext: number | null;
}

/** From when the boat may be launched: by the warmest and the coldest spot. Null: not in sight. */
export interface LaunchReady {
	readonly earliest: number | null;
	readonly latest: number | null;
	/** Reaches past the forecast, on the mean cycle of its last three days. */
	readonly isAssumed: boolean;
	/** After which a coat has stood ashore too long; null without a limit. */
	readonly closes: number | null;
}

/** Start times for every step of a job. */
export interface Plan {
	readonly steps: readonly PlannedStep[];
	/** Abradings put in because a recoat window would be missed. */
	readonly inserted: number;
	/** Least scaled room of its steps; null where all are fixed. */
	readonly room: number | null;
	/** Share of members in which all of it holds; null without members. */
	readonly holdChance: number | null;
	readonly launchReady: LaunchReady;
	readonly slip: Slip;
}

/**
 * The plans of a job: launch-ready soonest; surest; and the surest of those ready for the launch
 * chosen. Null where there is none inside the forecast (or no launch is wanted, for the last).
 */
export interface Plans {
	readonly soonest: Plan | null;
	readonly surest: Plan | null;
	readonly byDate: Plan | null;
}
