import { cureClock, finishSlots, type CureClock } from '../../coating/cure';
import type { TimeName } from '../../coating/times';
import { WET_STEP_KINDS } from '../../vocabulary';
import type { ErrorSeries } from './errors';
import { limiterCode, type LimitTrack } from './rooms';
import { distanceRoom, filmRoom, rainRoom, sandRoom, type RoomSeries } from './roomSeries';
import type { FaceConditions } from '../weather/slots';
import type { Step } from './step';
import { windowMinima } from './windows';

/** What the wet and set phases of a step on one face ask of each slot, were the last stroke laid at its end. */
export interface PhaseTracks {
	readonly tracks: readonly LimitTrack[];
	/** 1 where the wet phase runs into something unknown, or past the forecast's end. */
	readonly unknown: Uint8Array;
	/** 1 where the set phase alone runs past the end. */
	readonly setPastEnd: Uint8Array;
	/** Slots of each phase whose clock was outside its rows, or stood still. */
	readonly extrapolated: Uint8Array;
	readonly standstill: Uint8Array;
	/** The sheet states no drying time, and one is needed. */
	readonly silentDrying: boolean;
}

/** Windows of a clock: the coat laid at the end of slot i is not there yet in [i + 1, ends[i]). */
interface ClockWindow {
	readonly ends: Int32Array;
	readonly clock: CureClock | null;
}

function clockWindow(step: Step, name: TimeName, face: FaceConditions): ClockWindow | null {
	const table = step.times[name];
	if (table === undefined) return null;
	const { count } = face.weather.grid;
	// The tin sets no limit: done at once.
	if (table === null) return { ends: nextSlots(count), clock: null };
	// Earliest clocks run on the coldest spot.
	const clock = cureClock(table, face.surfaceShaded, 'earliest', step.limits.curing?.min);
	return { ends: finishSlots(clock).subarray(1), clock };
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

/** Ends no later than a slot. */
function clipped(ends: Int32Array, most: number): Int32Array {
	const out = new Int32Array(ends.length);
	for (let i = 0; i < out.length; i++) out[i] = ends[i] < most ? ends[i] : most;
	return out;
}

/** The wet and set phase tracks of a step on one face. */
export function phaseTracks(
	step: Step,
	face: FaceConditions,
	faceIndex: number,
	errors: ErrorSeries
): PhaseTracks {
	const { count } = face.weather.grid;
	const { knownTo } = face.weather;
	const { limits } = step;
	const touch = clockWindow(step, 'touchDry', face);
	const keep = clockWindow(step, 'keepDry', face);
	const over = clockWindow(step, 'overcoatMin', face);
	const none = nextSlots(count);
	const wetEnds = later(touch?.ends ?? none, keep?.ends ?? none);
	const touchEnds = (touch ?? keep)?.ends ?? none;
	const setEnds = later(over?.ends ?? none, wetEnds);

	const tracks: LimitTrack[] = [];
	const windowed = (
		name: Pick<
			LimitTrack,
			'limit' | 'phase' | 'side' | 'unit' | 'bound' | 'error' | 'freezes' | 'modelled'
		>,
		limiter: Parameters<typeof limiterCode>[0],
		base: RoomSeries,
		ends: Int32Array
	): void => {
		const scaled = new Float64Array(count);
		const at = new Int32Array(count);
		windowMinima(base.scaled, 1, clipped(ends, knownTo), scaled, at);
		tracks.push({
			...name,
			limiter: limiterCode(limiter),
			value: base.value,
			scaled,
			at,
			face,
			faceIndex
		});
	};
	const wet = { phase: 'wet', error: null, freezes: null, modelled: false } as const;
	const drying = touch !== null || keep !== null;
	if (drying && limits.rainFree === true && face.rainReaches) {
		windowed(
			{ ...wet, limit: 'rain', side: 'most', unit: 'millimetres', bound: null },
			'rain',
			rainRoom(face.weather),
			wetEnds
		);
	}
	if (drying && (limits.rainFree === true || limits.drySurface === true)) {
		const frozen = { ...wet, freezes: face.surfaceShaded, modelled: true };
		windowed(
			{ ...frozen, limit: 'film', side: 'most', unit: 'millimetres', bound: null },
			'wet',
			filmRoom(face.film),
			wetEnds
		);
	}
	if (drying && limits.sand === 'none' && face.dustReaches && face.weather.sandStated) {
		const gust = { ...wet, error: errors.gust, modelled: true };
		windowed(
			{
				...gust,
				limit: 'sand',
				side: 'most',
				unit: 'metresPerSecond',
				bound: face.weather.sandLiftGust
			},
			'sand',
			sandRoom(face.weather, errors.gust),
			touchEnds
		);
	}
	if (drying && limits.spread !== undefined) {
		const kelvin = {
			...wet,
			limit: 'spread',
			side: 'least',
			unit: 'kelvin',
			error: errors.spread,
			modelled: true
		} as const;
		windowed(
			{ ...kelvin, bound: 0 },
			'dew',
			distanceRoom(face.spread, 0, 'least', errors.spread),
			wetEnds
		);
		if (limits.spread.untilDry === true) {
			const { min } = limits.spread;
			windowed(
				{ ...kelvin, bound: min },
				'dew',
				distanceRoom(face.spread, min, 'least', errors.spread),
				touchEnds
			);
		}
	}
	if (limits.curing !== undefined && (drying || over !== null)) {
		const { min } = limits.curing;
		const base = distanceRoom(face.surfaceShaded, min, 'least', errors.surfaceTemperature);
		const celsius = {
			limit: 'curing',
			side: 'least',
			unit: 'celsius',
			bound: min,
			error: errors.surfaceTemperature,
			freezes: null,
			modelled: true
		} as const;
		if (drying) windowed({ ...celsius, phase: 'wet' }, 'cold', base, wetEnds);
		if (over !== null) windowed({ ...celsius, phase: 'set' }, 'cold', base, setEnds);
	}

	const unknown = new Uint8Array(count);
	const setPastEnd = new Uint8Array(count);
	const extrapolated = new Uint8Array(count);
	const standstill = new Uint8Array(count);
	for (let i = 0; i < count; i++) {
		if (wetEnds[i] > knownTo) unknown[i] = 1;
		else if (setEnds[i] > knownTo) setPastEnd[i] = 1;
	}
	for (const window of [touch, keep, over]) {
		if (window === null || window.clock === null) continue;
		const { clock, ends } = window;
		for (let i = 0; i < count; i++) {
			const from = i + 1;
			const end = Math.min(ends[i], count, Math.max(knownTo, from));
			if (window !== over && clock.unknown[end] > clock.unknown[from]) unknown[i] = 1;
			if (clock.extrapolated[end] > clock.extrapolated[from]) extrapolated[i] = 1;
			if (clock.standstill[end] > clock.standstill[from]) standstill[i] = 1;
		}
	}
	return {
		tracks,
		unknown,
		setPastEnd,
		extrapolated,
		standstill,
		silentDrying: !drying && limits.rainFree === true && WET_STEP_KINDS.includes(step.kind)
	};
}
