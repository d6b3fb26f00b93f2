import { LIMITERS, type Limiter } from '../../vocabulary';
import type { FaceConditions } from '../weather/slots';
import type { LimitName, LimitUnit, Phase } from './result';
import { MOST_ROOM } from './roomSeries';

/**
 * One limit of a step on one face over the slots. States, stretches, chances and readings are all
 * drawn from these, so that a number is compared with a limit in one place.
 */
export interface Limit {
	readonly limit: LimitName;
	readonly phase: Phase;
	/** Code of LIMITERS that this limit shuts with. */
	readonly limiter: number;
	readonly side: 'least' | 'most';
	readonly unit: LimitUnit;
	readonly value: Float64Array;
	/** What the value is held against; per slot where it moves, null where in or out. */
	readonly bound: number | Float64Array | null;
	/** The usual error of a distance, in `unit`; null where in or out. */
	readonly error: Float64Array | null;
	/** Scaled rooms of a rule that is no distance to a bound; null where it is one. */
	readonly rooms: Float64Array | null;
	/** The face's temperature, where a film below freezing is called frost. */
	readonly freezes: Float64Array | null;
	/** Worked out by the engine rather than read from the forecast. */
	readonly modelled: boolean;
	readonly face: FaceConditions;
	/** Which of the conditions given. */
	readonly faceIndex: number;
}

const CODES = Object.fromEntries(LIMITERS.map((limiter, code) => [limiter, code]));

export const limiterCode = (limiter: Limiter): number => CODES[limiter];

/** What is told of a limit; what is left out is null, or read from the forecast. */
type Told = Pick<Limit, 'limit' | 'phase' | 'side' | 'unit' | 'value'> & Partial<Limit>;

/** A limit on a face. Written out field by field: members make many thousands of one shape. */
export function limitOn(
	face: FaceConditions,
	faceIndex: number,
	limiter: Limiter,
	told: Told
): Limit {
	return {
		limit: told.limit,
		phase: told.phase,
		limiter: limiterCode(limiter),
		side: told.side,
		unit: told.unit,
		value: told.value,
		bound: told.bound ?? null,
		error: told.error ?? null,
		rooms: told.rooms ?? null,
		freezes: told.freezes ?? null,
		modelled: told.modelled ?? false,
		face,
		faceIndex
	};
}

const WET = limiterCode('wet');
const FROST = limiterCode('frost');

/** The limiter of a limit that binds at a slot: a film on a surface below freezing is frost. */
export function limiterAt(limit: Limit, slot: number): number {
	if (limit.limiter !== WET || limit.freezes === null) return limit.limiter;
	return limit.freezes[slot] < 0 ? FROST : WET;
}

/** Scaled room at a slot: 1 is one usual error, at most {@link MOST_ROOM}; negative broken, NaN unknown. */
export function roomAt({ rooms, value, bound, side, error }: Limit, slot: number): number {
	if (rooms !== null) return rooms[slot];
	if (bound === null || error === null) return NaN;
	const held = typeof bound === 'number' ? bound : bound[slot];
	const distance = side === 'least' ? value[slot] - held : held - value[slot];
	const room = distance / error[slot];
	return room > MOST_ROOM ? MOST_ROOM : room;
}

/** The least rooms of several limits, slot by slot. */
export interface LeastRooms {
	/** +Infinity where nothing is known to bind. */
	readonly room: Float64Array;
	/** Index given with the limit that has it; −1 for none. */
	readonly which: Int16Array;
	/** 1 where a limit is unknown. */
	readonly unknown: Uint8Array;
}

/** Room for the least of several limits over so many slots. */
export function leastRooms(count: number): LeastRooms {
	return {
		room: new Float64Array(count).fill(Infinity),
		which: new Int16Array(count).fill(-1),
		unknown: new Uint8Array(count)
	};
}

/** Takes a limit's rooms into the least so far, under an index of the caller's. */
export function takeLeast(limit: Limit, index: number, least: LeastRooms): void {
	const { room, which, unknown } = least;
	const { rooms, value, bound, error } = limit;
	const count = room.length;
	if (rooms !== null) {
		for (let i = 0; i < count; i++) {
			const here = rooms[i];
			if (here < room[i]) {
				room[i] = here;
				which[i] = index;
			} else if (here !== here) unknown[i] = 1;
		}
		return;
	}
	if (error === null || bound === null) return;
	const sign = limit.side === 'least' ? 1 : -1;
	const moving = typeof bound === 'number' ? null : bound;
	const fixed = typeof bound === 'number' ? bound : 0;
	for (let i = 0; i < count; i++) {
		const held = moving === null ? fixed : moving[i];
		let here = (sign * (value[i] - held)) / error[i];
		if (here > MOST_ROOM) here = MOST_ROOM;
		if (here < room[i]) {
			room[i] = here;
			which[i] = index;
		} else if (here !== here) unknown[i] = 1;
	}
}

/** Marks with 1 the slots in which a limit is broken or unknown; the sign of {@link roomAt}. */
export function markBroken({ rooms, value, bound, side }: Limit, broken: Uint8Array): void {
	const count = broken.length;
	if (rooms !== null) {
		for (let i = 0; i < count; i++) if (!(rooms[i] >= 0)) broken[i] = 1;
	} else if (typeof bound === 'number') {
		if (side === 'least') {
			for (let i = 0; i < count; i++) if (!(value[i] >= bound)) broken[i] = 1;
		} else {
			for (let i = 0; i < count; i++) if (!(value[i] <= bound)) broken[i] = 1;
		}
	} else if (bound !== null) {
		for (let i = 0; i < count; i++) {
			if (!(side === 'least' ? value[i] >= bound[i] : value[i] <= bound[i])) broken[i] = 1;
		}
	}
}
