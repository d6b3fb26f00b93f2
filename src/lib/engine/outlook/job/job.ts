import type { Face, Shelter } from '../face/face';
import type { SurfaceReading } from '../face/readings';
import type { Step } from '../hours/step';
import type { LaunchWish } from '../plan/launch';

/** One face of a boat as a step finds it. */
export interface FaceUnder {
	/** Names the face across the steps of a job, whatever stands over it. */
	readonly id: string;
	readonly face: Face;
	readonly shelter: Shelter;
	/** Measured surface temperatures of it. */
	readonly readings?: readonly SurfaceReading[];
}

/**
 * A step of a job. `startAt` alone: its start is fixed, by hand or because it was taken or begun;
 * with `finishedAt`: it is done and logged. UTC epoch seconds.
 */
export interface JobStep {
	readonly step: Step;
	readonly faces: readonly FaceUnder[];
	readonly startAt?: number;
	readonly finishedAt?: number;
}

/** A queue of steps on one boat, in order, and when it should be launched. */
export interface Job {
	readonly steps: readonly JobStep[];
	readonly launch: LaunchWish;
}
