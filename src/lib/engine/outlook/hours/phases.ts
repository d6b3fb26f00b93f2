import { cureClock, cureProgress, finishSlots, type CureClock } from '../../coating/cure';
import { rateTable, type RateTable } from '../../coating/rates';
import type { TimeName } from '../../coating/times';
import { WET_STEP_KINDS } from '../../vocabulary';
import type { FaceConditions } from '../weather/slots';
import { sandCounts, sandLimit } from './applyLimits';
import type { ErrorSeries } from './errors';
import { limiterCode, type Limit } from './limit';
import { filmRoom, rainRoom } from './roomSeries';
import type { Step } from './step';

/** Limits that must hold in every slot of [i + 1, ends[i]), were the last stroke laid at the end of slot i. */
export interface PhaseLimits {
	readonly limits: readonly Limit[];
	readonly ends: Int32Array;
	/** Surface temperatures the end depends on; an unknown one in the window makes the slot unknown. */
	readonly needs: Float64Array | null;
}

/** What the wet and set phases of a step on one face ask. */
export interface Phases {
	readonly phases: readonly PhaseLimits[];
	/** End of the wet phase, and of the set phase, after each slot; past the grid where it ends first. */
	readonly wetEnds: Int32Array;
	readonly setEnds: Int32Array;
	/** Clocks that ran, with their ends; empty where they ran on rates alone. */
	readonly clocks: readonly { readonly clock: CureClock; readonly ends: Int32Array }[];
}

/** How the clocks of a step run: exactly, or for the many members on tables of rates. */
export type ClockRates = Readonly<Partial<Record<TimeName, RateTable>>>;

const PHASE_TIMES = ['touchDry', 'keepDry', 'overcoatMin'] as const satisfies TimeName[];

/** Tables of rates for the clocks of a step's wet and set phases. */
export function phaseRates({ times }: Step): ClockRates {
	return Object.fromEntries(
		PHASE_TIMES.flatMap((name) => {
			const table = times[name];
			return table === undefined || table === null ? [] : [[name, rateTable(table, 'earliest')]];
		})
	);
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

/** Ends of the empty window after each slot: nothing to wait for. */
function nextSlots(count: number): Int32Array {
	const ends = new Int32Array(count);
	for (let i = 0; i < count; i++) ends[i] = i + 1;
	return ends;
}

/** The later of two ends, slot by slot. */
function later(a: Int32Array, b: Int32Array | null): Int32Array {
	if (b === null || a === b) return a;
	const ends = new Int32Array(a.length);
	for (let i = 0; i < ends.length; i++) ends[i] = a[i] > b[i] ? a[i] : b[i];
	return ends;
}

const WET = {
	phase: 'wet',
	error: null,
	bound: null,
	rooms: null,
	freezes: null,
	modelled: true
} as const;

/** The limits of the wet and set phases of a step on one face. */
export function phaseLimits(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	errors: ErrorSeries,
	rates: ClockRates | null
): Phases {
	const { count } = face.weather.grid;
	const { limits, times } = step;
	const none = nextSlots(count);
	const curingMin = limits.curing?.min ?? -Infinity;
	const clocks: { clock: CureClock; ends: Int32Array }[] = [];
	// Earliest clocks run on the coldest spot.
	const endsOf = (name: (typeof PHASE_TIMES)[number]): Int32Array | null => {
		const table = times[name];
		if (table === undefined) return null;
		// The tin sets no limit: done at once.
		if (table === null) return none;
		const quick = rates?.[name];
		if (quick !== undefined)
			return finishSlots(cureProgress(quick, face.surfaceShaded, curingMin)).subarray(1);
		const clock = cureClock(table, face.surfaceShaded, 'earliest', curingMin);
		const ends = finishSlots(clock.progress).subarray(1);
		clocks.push({ clock, ends });
		return ends;
	};
	const touch = endsOf('touchDry');
	const keep = endsOf('keepDry');
	const over = endsOf('overcoatMin');
	const wetEnds = later(touch ?? none, keep);
	const touchEnds = touch ?? keep ?? none;
	const setEnds = later(wetEnds, over);
	const drying = touch !== null || keep !== null;

	const at = { face, faceIndex };
	const wet: Limit[] = [];
	const untilTouch: Limit[] = [];
	const set: Limit[] = [];
	const spread = {
		...WET,
		...at,
		limit: 'spread',
		limiter: limiterCode('dew'),
		side: 'least',
		unit: 'kelvin',
		value: face.spread,
		error: errors.spread
	} as const;
	if (drying && limits.rainFree === true && face.rainReaches) {
		wet.push({
			...WET,
			...at,
			...rainRoom(face.weather),
			limit: 'rain',
			limiter: limiterCode('rain'),
			side: 'most',
			unit: 'millimetres',
			modelled: false
		});
	}
	if (drying && (limits.rainFree === true || limits.drySurface === true)) {
		wet.push({
			...WET,
			...at,
			...filmRoom(face.film),
			limit: 'film',
			limiter: limiterCode('wet'),
			side: 'most',
			unit: 'millimetres',
			freezes: face.surfaceShaded
		});
	}
	if (drying && sandCounts(step, face))
		untilTouch.push({
			...WET,
			...at,
			limiter: limiterCode('sand'),
			...sandLimit(face, errors)
		});
	if (drying && limits.spread !== undefined) {
		wet.push({ ...spread, bound: 0 });
		if (limits.spread.untilDry === true) untilTouch.push({ ...spread, bound: limits.spread.min });
	}
	if (limits.curing !== undefined) {
		const curing = {
			...WET,
			...at,
			limit: 'curing',
			limiter: limiterCode('cold'),
			side: 'least',
			unit: 'celsius',
			value: face.surfaceShaded,
			bound: limits.curing.min,
			error: errors.surfaceTemperature
		} as const;
		if (drying) wet.push(curing);
		if (over !== null) set.push({ ...curing, phase: 'set' });
	}
	// A constant time on no curing minimum asks for no temperature.
	const asksTemperature = (['touchDry', 'keepDry'] as const).some((name) => {
		const table = times[name] ?? null;
		return table !== null && (typeof table !== 'number' || limits.curing !== undefined);
	});
	return {
		phases: [
			{ limits: wet, ends: wetEnds, needs: asksTemperature ? face.surfaceShaded : null },
			{ limits: untilTouch, ends: touchEnds, needs: null },
			{ limits: set, ends: setEnds, needs: null }
		].filter((phase) => phase.limits.length > 0 || phase.needs !== null),
		wetEnds,
		setEnds,
		clocks
	};
}
