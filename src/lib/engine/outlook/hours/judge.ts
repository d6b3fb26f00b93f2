import { STATES } from '../../vocabulary';
import { daylightMask, workMask } from '../weather/calendar';
import { flagBit } from '../weather/flags';
import type { Site } from '../weather/site';
import type { FaceConditions, SlotGrid, SlotWeather } from '../weather/slots';
import { airLimits, faceLimits } from './applyLimits';
import type { ErrorSeries } from './errors';
import { leastRooms, limiterAt, limiterCode, takeLeast, type Limit } from './limit';
import { facePhases, type FacePhases } from './phaseEnds';
import { dryingIsSilent } from './phases';
import { BROKEN, MOST_ROOM } from './roomSeries';
import type { Step } from './step';
import { windowMinima } from './windows';

export const SHUT = STATES.indexOf('shut');
export const TIGHT = STATES.indexOf('tight');
export const OPEN = STATES.indexOf('open');

/** A coarse stretch is at best tight. */
const COARSE_ROOM = 0.99;

/** Every limit of a step over the slots, before it is drawn together. */
export interface Judgement {
	readonly weather: SlotWeather;
	/** What must hold in the slot itself, of all faces. */
	readonly apply: readonly Limit[];
	/** What must hold afterwards, per face. */
	readonly phases: readonly FacePhases[];
	readonly masks: StepMasks;
	readonly silentDrying: boolean;
}

/** 1 inside work hours and daylight; null where the step has no such limit. */
export interface StepMasks {
	readonly work: Uint8Array | null;
	readonly daylight: Uint8Array | null;
}

const remembered = new WeakMap<Site, Map<string, Uint8Array>>();

/** A mask of a site and grid, computed once for all steps that ask alike. */
function remember(site: Site, key: string, make: () => Uint8Array): Uint8Array {
	const ofSite = remembered.get(site) ?? new Map<string, Uint8Array>();
	remembered.set(site, ofSite);
	const before = ofSite.get(key);
	if (before !== undefined) return before;
	const mask = make();
	ofSite.set(key, mask);
	return mask;
}

/** Work hours and daylight of a step over a grid. */
export function stepMasks(step: Step, site: Site, grid: SlotGrid): StepMasks {
	const { workHours, closed, limits } = step;
	const span = `${grid.start} ${grid.count}`;
	return {
		work:
			workHours === undefined && closed === undefined
				? null
				: remember(site, `work ${span} ${JSON.stringify([workHours, closed])}`, () =>
						workMask(site.timeZone, workHours, closed, grid)
					),
		daylight:
			limits.daylight === true
				? remember(site, `daylight ${span}`, () => daylightMask(site, grid))
				: null
	};
}

/**
 * Judges every limit of a step on its faces.
 *
 * @param errors - usual errors on each face
 */
export function judge(
	step: Step,
	conditions: readonly FaceConditions[],
	site: Site,
	errors: readonly ErrorSeries[]
): Judgement {
	const { weather } = conditions[0];
	return {
		weather,
		apply: conditions.flatMap((face, i) => [
			...airLimits(step, face, i, site, errors[i]),
			...faceLimits(step, face, i, errors[i])
		]),
		phases: conditions.map((face, i) => facePhases(step, face, i, errors[i])),
		masks: stepMasks(step, site, weather.grid),
		silentDrying: dryingIsSilent(step)
	};
}

/** States, limiters and rooms of every slot, before runs too short are shut. */
export interface SlotStates {
	readonly state: Uint8Array;
	readonly limiter: Uint8Array;
	readonly room: Float32Array;
}

const NONE = limiterCode('none');
const NO_DATA = limiterCode('noData');
const HOURS = limiterCode('hours');
const DARK = limiterCode('dark');

/** For each slot and one more, the first marked slot from it on; past the end without one. */
export function nextMarked(marks: Uint8Array): Int32Array {
	const count = marks.length;
	const next = new Int32Array(count + 1);
	next[count] = count + 2;
	for (let i = count - 1; i >= 0; i--) next[i] = marks[i] ? i : next[i + 1];
	return next;
}

/** Ends no later than a slot. */
function clipped(ends: Int32Array, most: number): Int32Array {
	const out = new Int32Array(ends.length);
	for (let i = 0; i < out.length; i++) out[i] = ends[i] < most ? ends[i] : most;
	return out;
}

/**
 * Draws the limits together. Limiter: a value missing in the slot itself, then hours, dark, then
 * the least scaled room, and last what lies past the forecast's end or in a gap ahead.
 */
export function slotStates({ weather, apply, phases, masks, silentDrying }: Judgement): SlotStates {
	const { count } = weather.grid;
	const { knownFrom, knownTo } = weather;
	const least = leastRooms(count);
	const missingNow = least.unknown;
	apply.forEach((limit, index) => {
		takeLeast(limit, index, least);
	});
	missingNow.fill(1, 0, Math.max(0, knownFrom));
	missingNow.fill(1, Math.min(count, knownTo));
	if (silentDrying) missingNow.fill(1);

	// Of the limits that bind: their place in one list, and the slot where they do.
	const list = [...apply];
	const bindsAt = new Int32Array(count).fill(-1);
	const missingLater = new Uint8Array(count);
	const windowRoom = new Float64Array(count);
	const windowAt = new Int32Array(count);
	for (const { phases: ofFace, wetEnds } of phases) {
		for (let i = 0; i < count; i++) if (wetEnds[i] > knownTo) missingLater[i] = 1;
		for (const { limits, ends, needs } of ofFace) {
			const group = leastRooms(count);
			for (const limit of limits) {
				takeLeast(limit, list.length, group);
				list.push(limit);
			}
			if (needs !== null)
				for (let i = 0; i < count; i++) if (needs[i] !== needs[i]) group.unknown[i] = 1;
			const nextUnknown = nextMarked(group.unknown);
			const known = clipped(ends, knownTo);
			windowMinima(group.room, 1, known, windowRoom, windowAt);
			for (let i = 0; i < count; i++) {
				if (windowRoom[i] < least.room[i]) {
					least.room[i] = windowRoom[i];
					least.which[i] = group.which[windowAt[i]];
					bindsAt[i] = windowAt[i];
				}
				if (nextUnknown[i + 1] < known[i]) missingLater[i] = 1;
			}
		}
	}
	const limiterOf = (i: number): number =>
		least.which[i] < 0 ? NONE : limiterAt(list[least.which[i]], bindsAt[i] < 0 ? i : bindsAt[i]);

	const limiter = new Uint8Array(count);
	const state = new Uint8Array(count);
	const room = new Float32Array(count);
	const coarse = flagBit('coarse');
	const { work, daylight } = masks;
	for (let i = 0; i < count; i++) {
		const value = Math.min(least.room[i], MOST_ROOM);
		if (missingNow[i]) {
			limiter[i] = NO_DATA;
			room[i] = NaN;
		} else if (work !== null && !work[i]) {
			limiter[i] = HOURS;
			room[i] = BROKEN;
		} else if (daylight !== null && !daylight[i]) {
			limiter[i] = DARK;
			room[i] = BROKEN;
		} else if (value < 0) {
			limiter[i] = limiterOf(i);
			room[i] = value;
		} else if (missingLater[i]) {
			limiter[i] = NO_DATA;
			room[i] = NaN;
		} else {
			const capped = weather.flags[i] & coarse ? Math.min(value, COARSE_ROOM) : value;
			state[i] = capped < 1 ? TIGHT : OPEN;
			limiter[i] = limiterOf(i);
			room[i] = capped;
		}
	}
	return { state, limiter, room };
}
