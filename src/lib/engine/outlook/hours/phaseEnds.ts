import { cureClock, finishSlots, type CureClock } from '../../coating/cure';
import { asksNoWait } from '../../coating/times';
import type { FaceConditions } from '../weather/slots';
import { phasesOf, type PhaseLimits, type PhaseTime } from './phases';
import type { ErrorSeries } from './errors';
import type { Step } from './step';

/** A phase with its end: its limits must hold in [i + 1, ends[i]), were the last stroke laid at the end of slot i. */
export interface EndedPhase extends PhaseLimits {
	readonly ends: Int32Array;
}

/** The phases of a step on one face, on exact clocks. */
export interface FacePhases {
	readonly phases: readonly EndedPhase[];
	/** End of the wet phase, and of the set phase, after each slot; past the grid where it ends first. */
	readonly wetEnds: Int32Array;
	readonly setEnds: Int32Array;
	readonly clocks: readonly { readonly clock: CureClock; readonly ends: Int32Array }[];
}

/** Ends of the empty window after each slot: nothing to wait for. */
function nextSlots(count: number): Int32Array {
	const ends = new Int32Array(count);
	for (let i = 0; i < count; i++) ends[i] = i + 1;
	return ends;
}

/** The later of two ends, slot by slot. */
function later(a: Int32Array, b: Int32Array): Int32Array {
	const ends = new Int32Array(a.length);
	for (let i = 0; i < ends.length; i++) ends[i] = a[i] > b[i] ? a[i] : b[i];
	return ends;
}

/** {@link phasesOf} a step, each with its end after every slot. */
export function facePhases(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	errors: ErrorSeries
): FacePhases {
	const none = nextSlots(face.weather.grid.count);
	const clocks = new Map<PhaseTime, { clock: CureClock; ends: Int32Array }>();
	const endsOf = (name: PhaseTime): Int32Array => {
		const table = step.times[name] ?? null;
		// Done at once.
		if (asksNoWait(table)) return none;
		const known = clocks.get(name);
		if (known !== undefined) return known.ends;
		// Earliest clocks run on the coldest spot.
		const clock = cureClock(table, face.surfaceShaded, 'earliest', step.limits.curing?.min);
		const ends = finishSlots(clock.progress).subarray(1);
		clocks.set(name, { clock, ends });
		return ends;
	};
	const phases = phasesOf(step, face, faceIndex, errors).map((phase) => ({
		...phase,
		ends: phase.until.map(endsOf).reduce(later, none)
	}));
	const [wet, , set] = phases;
	return {
		phases: phases.filter(({ limits, needs }) => limits.length > 0 || needs !== null),
		wetEnds: wet.ends,
		setEnds: set.ends,
		clocks: [...clocks.values()]
	};
}
