import { STATES } from '../../vocabulary';
import { daylightMask, workMask } from '../weather/calendar';
import { errorSeries } from './errors';
import { flagBit } from '../weather/flags';
import { phaseTracks, type PhaseTracks } from './phases';
import { applyTracks, limiterCode, type LimitTrack } from './rooms';
import { BROKEN, MOST_ROOM } from './roomSeries';
import type { Site } from '../weather/site';
import type { FaceConditions, SlotGrid } from '../weather/slots';
import type { Step, UsualErrors } from './step';

export const SHUT = STATES.indexOf('shut');
export const TIGHT = STATES.indexOf('tight');
export const OPEN = STATES.indexOf('open');

/** A coarse stretch is at best tight. */
const COARSE_ROOM = 0.99;

export interface JudgeOptions {
	readonly usualErrors?: UsualErrors;
}

/** Every limit of a step over the slots, before it is drawn together. */
export interface Judgement {
	readonly grid: SlotGrid;
	readonly tracks: readonly LimitTrack[];
	readonly phases: readonly PhaseTracks[];
	/** 1 inside work hours and daylight; null where the step has no such limit. */
	readonly work: Uint8Array | null;
	readonly daylight: Uint8Array | null;
	readonly silentDrying: boolean;
}

const masks = new WeakMap<Site, Map<string, Uint8Array>>();

/** A mask of a site and grid, computed once for all steps that ask alike. */
function remember(site: Site, key: string, make: () => Uint8Array): Uint8Array {
	const ofSite = masks.get(site) ?? new Map<string, Uint8Array>();
	masks.set(site, ofSite);
	const before = ofSite.get(key);
	if (before !== undefined) return before;
	const mask = make();
	ofSite.set(key, mask);
	return mask;
}

/** Judges every limit of a step on its faces. */
export function judge(
	step: Step,
	conditions: readonly FaceConditions[],
	site: Site,
	options: JudgeOptions = {}
): Judgement {
	const { weather } = conditions[0];
	const { grid } = weather;
	const errors = errorSeries(weather, options.usualErrors);
	const phases = conditions.map((face, index) => phaseTracks(step, face, index, errors));
	const tracks = conditions.flatMap((face, index) => [
		...applyTracks(step, face, index, site, errors),
		...phases[index].tracks
	]);
	const span = `${grid.start} ${grid.count}`;
	const hours = step.workHours;
	return {
		grid,
		tracks,
		phases,
		work:
			hours === undefined
				? null
				: remember(site, `work ${span} ${JSON.stringify(hours)}`, () =>
						workMask(site.timeZone, hours, grid)
					),
		daylight:
			step.limits.daylight === true
				? remember(site, `daylight ${span}`, () => daylightMask(site, grid))
				: null,
		silentDrying: phases.some((phase) => phase.silentDrying)
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
const WET = limiterCode('wet');
const FROST = limiterCode('frost');

/** The limiter of a track at a slot: a film on a surface below freezing is frost. */
export function limiterAt(track: LimitTrack, slot: number): number {
	if (track.limiter !== WET || track.freezes === null) return track.limiter;
	const at = track.at === null ? slot : track.at[slot];
	return track.freezes[at] < 0 ? FROST : WET;
}

/**
 * Draws the tracks together. Limiter: a value missing in the slot itself, then hours, dark, then
 * the least scaled room, and last what lies past the forecast's end or in a gap ahead.
 */
export function slotStates(
	judgement: Judgement,
	conditions: readonly FaceConditions[]
): SlotStates {
	const { count } = judgement.grid;
	const { weather } = conditions[0];
	const state = new Uint8Array(count);
	const limiter = new Uint8Array(count);
	const room = new Float32Array(count);
	const least = new Float64Array(count).fill(Infinity);
	const leastTrack = new Int16Array(count).fill(-1);
	const missingNow = new Uint8Array(count);
	const missingLater = new Uint8Array(count);
	missingNow.fill(1, 0, Math.max(0, weather.knownFrom));
	missingNow.fill(1, Math.min(count, weather.knownTo));
	if (judgement.silentDrying) missingNow.fill(1);
	judgement.tracks.forEach((track, index) => {
		const { scaled } = track;
		const missing = track.phase === 'apply' ? missingNow : missingLater;
		for (let i = 0; i < count; i++) {
			const value = scaled[i];
			if (value < least[i]) {
				least[i] = value;
				leastTrack[i] = index;
			} else if (value !== value) missing[i] = 1;
		}
	});
	for (const { unknown } of judgement.phases) {
		for (let i = 0; i < count; i++) missingLater[i] |= unknown[i];
	}
	const coarse = flagBit('coarse');
	const { work, daylight, tracks } = judgement;
	for (let i = 0; i < count; i++) {
		const value = Math.min(least[i], MOST_ROOM);
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
			limiter[i] = limiterAt(tracks[leastTrack[i]], i);
			room[i] = value;
		} else if (missingLater[i]) {
			limiter[i] = NO_DATA;
			room[i] = NaN;
		} else {
			const capped = weather.flags[i] & coarse ? Math.min(value, COARSE_ROOM) : value;
			state[i] = capped < 1 ? TIGHT : OPEN;
			limiter[i] = leastTrack[i] < 0 ? NONE : limiterAt(tracks[leastTrack[i]], i);
			room[i] = capped;
		}
	}
	return { state, limiter, room };
}
