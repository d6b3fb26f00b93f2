import { WET_STEP_KINDS, type StepKind } from '../../vocabulary';
import type { Step } from '../hours/step';
import type { FaceConditions } from '../weather/slots';
import type { Candidates } from './chain';

/** One face of a boat as a step meets it. */
export interface StepFace {
	/** Names the face across the steps of a job, whatever stands over it. */
	readonly id: string;
	/** Two entries where the part has two sides. */
	readonly sides: readonly FaceConditions[];
}

/** A step of a chain, with the faces it works on and the starts it may take. */
export interface PlanStep {
	readonly step: Step;
	readonly faces: readonly StepFace[];
	readonly candidates: Candidates;
	/** Fixed by hand, taken or logged. */
	readonly isFixed: boolean;
	/** Exact length of the work in slots. */
	readonly duration: number;
	/** Positions of the launch slots it keeps to, rising; null for a step that keeps to none. */
	readonly launchSlots: Float64Array | null;
}

/** Steps that lay something that has to cure before the next of them. */
export const isCoat = (kind: StepKind): boolean => WET_STEP_KINDS.includes(kind);

const CLEARING: readonly StepKind[] = ['abrade', 'blast', 'strip'];

/** Steps that clear a passed maximum: they take the old surface off. */
export const clearsMaximum = (kind: StepKind): boolean => CLEARING.includes(kind);

/** Steps that wait until the boat may go in. */
export const waitsForLaunchReady = (kind: StepKind): boolean =>
	kind === 'lift' || kind === 'launch';
