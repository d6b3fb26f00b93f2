import { isCoat } from './planStep';
import { reachedAt } from './clocks';
import type { StepFace } from './planStep';
import type { Step } from '../hours/step';
import type { TimeTable } from '../../coating/times';

/** The table by which a boat waits for a coat: cure to launch, else touch dry; undefined where silent. */
export function launchTable({ times }: Step): TimeTable | undefined {
	return times.launchMin === undefined ? times.touchDry : times.launchMin;
}

/**
 * Slot positions from which a boat may be launched as far as one step goes, after each of its
 * finishes: the slowest of its faces on one of their runs. Past the forecast on the mean cycle of
 * its last three days.
 *
 * @param run - `shaded` for the latest it may be, `sunlit` for the earliest
 */
export function launchReadyAfter(
	step: Step,
	faces: readonly StepFace[],
	finish: Float64Array,
	run: 'shaded' | 'sunlit'
): Float64Array {
	const table = isCoat(step.kind) ? launchTable(step) : null;
	if (table === undefined || table === null) return finish.slice();
	const sides = faces.flatMap((face) => face.sides);
	if (sides.length === 0) return finish.slice();
	return reachedAt(
		{
			table,
			sides,
			side: 'earliest',
			run,
			curingMin: step.limits.curing?.min ?? -Infinity,
			isCarriedOn: true
		},
		finish
	);
}

/** Slot positions after which a coat has stood ashore too long, after each finish; null without a limit. */
export function launchClosesAfter(
	step: Step,
	faces: readonly StepFace[],
	finish: Float64Array
): Float64Array | null {
	const table = step.times.launchMax;
	if (!isCoat(step.kind) || table === undefined || table === null) return null;
	return reachedAt(
		{
			table,
			sides: faces.flatMap((face) => face.sides),
			side: 'latest',
			curingMin: -Infinity,
			isCarriedOn: true
		},
		finish
	);
}
