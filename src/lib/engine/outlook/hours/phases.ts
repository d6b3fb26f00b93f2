import { asksNoWait, type TimeName } from '../../coating/times';
import { WET_STEP_KINDS } from '../../vocabulary';
import type { FaceConditions } from '../weather/slots';
import type { ErrorSeries } from './errors';
import { limitOn, type Limit } from './limit';
import { rainRoom } from './roomSeries';
import { filmLimit, rainLimit, sandCounts, sandLimit, spreadLimit } from './sharedLimits';
import type { Step } from './step';

/** The times that end the phases after the brush. */
export const PHASE_TIMES = ['touchDry', 'keepDry', 'overcoatMin'] as const satisfies TimeName[];
export type PhaseTime = (typeof PHASE_TIMES)[number];

/**
 * Limits that must hold after the last stroke until each of some times is reached. A phase whose
 * end lies past the forecast is unknown, unless it `mayRunPast`.
 */
export interface PhaseLimits {
	readonly limits: readonly Limit[];
	readonly until: readonly PhaseTime[];
	readonly mayRunPast: boolean;
	/** Surface temperatures the end depends on; an unknown one meanwhile makes the slot unknown. */
	readonly needs: Float64Array | null;
}

/** The sheet states no drying time, and one is needed: every hour is shut for it. */
export function dryingIsSilent({ times, limits, kind }: Step): boolean {
	return (
		times.touchDry === undefined &&
		times.keepDry === undefined &&
		limits.rainFree === true &&
		WET_STEP_KINDS.includes(kind)
	);
}

/** Whether a clock of a step asks for temperature: a constant time on no curing minimum does not. */
function asksTemperature({ times, limits }: Step, name: PhaseTime): boolean {
	const table = times[name] ?? null;
	return !asksNoWait(table) && (typeof table !== 'number' || limits.curing !== undefined);
}

/**
 * The wet and set phases of a step on one face: wet until touch dry and keep dry, with sand and
 * the sheet's own spread only until touch dry; set until overcoat min.
 */
export function phasesOf(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	errors: ErrorSeries
): PhaseLimits[] {
	const { limits, times } = step;
	const { rainFree, drySurface, spread, curing } = limits;
	const drying = (['touchDry', 'keepDry'] as const).filter((name) => times[name] !== undefined);
	const wet: Limit[] = [];
	const untilTouch: Limit[] = [];
	const set: Limit[] = [];
	const cures = (phase: 'wet' | 'set', bound: number): Limit =>
		limitOn(face, faceIndex, 'cold', {
			limit: 'curing',
			phase,
			side: 'least',
			unit: 'celsius',
			value: face.surfaceShaded,
			bound,
			error: errors.surfaceTemperature,
			modelled: true
		});
	if (drying.length > 0) {
		if (rainFree === true && face.rainReaches)
			wet.push(rainLimit(face, faceIndex, 'wet', rainRoom(face.weather)));
		if (rainFree === true || drySurface === true) wet.push(filmLimit(face, faceIndex, 'wet'));
		if (sandCounts(step, face)) untilTouch.push(sandLimit(face, faceIndex, 'wet', errors));
		if (spread !== undefined) {
			wet.push(spreadLimit(face, faceIndex, 'wet', 0, errors));
			if (spread.untilDry === true)
				untilTouch.push(spreadLimit(face, faceIndex, 'wet', spread.min, errors));
		}
		if (curing !== undefined) wet.push(cures('wet', curing.min));
	}
	if (curing !== undefined && times.overcoatMin !== undefined) set.push(cures('set', curing.min));
	const needs = drying.some((name) => asksTemperature(step, name)) ? face.surfaceShaded : null;
	const isSet = times.overcoatMin !== undefined;
	return [
		{ limits: wet, until: drying, mayRunPast: false, needs },
		{ limits: untilTouch, until: drying.slice(0, 1), mayRunPast: false, needs: null },
		{
			limits: set,
			until: isSet ? [...drying, 'overcoatMin' as const] : drying,
			mayRunPast: true,
			needs: null
		}
	];
}
