import type { Limiter, State, StepFlag } from '../../vocabulary';

/** A start that can be finished. Slot indices; `finish` is one past the last slot worked. */
export interface BestHours {
	readonly start: number;
	readonly finish: number;
	/** Least scaled room over the slots worked (1 = one usual forecast error). */
	readonly room: number;
	readonly limiter: Limiter;
}

/** Consecutive slots in which the step can be started and finished. Slot indices. */
export interface Stretch {
	/** First start. */
	readonly from: number;
	/** Brush down: one past the last slot worked. */
	readonly to: number;
	readonly lastStart: number;
	readonly bestStart: number;
	readonly room: number;
}

/** The hours of one step over a grid. Typed arrays have one entry per slot. */
export interface StepHours {
	/** Codes of STATES. */
	readonly state: Uint8Array;
	/** Codes of LIMITERS: the reason a slot is tight or shut; on open slots the least room's. */
	readonly limiter: Uint8Array;
	/** Least scaled room, at most 3; negative when broken, NaN when unknown. */
	readonly room: Float32Array;
	readonly stretches: readonly Stretch[];
	/**
	 * Least room over the slots of a whole duration begun in each slot, and the slot that binds;
	 * of starts inside a stretch only.
	 */
	readonly startRoom: Float64Array;
	readonly bindsAt: Int32Array;
	/** The start with the most room over all stretches; null without a stretch. */
	readonly best: BestHours | null;
	readonly flags: readonly StepFlag[];
	/** Slots of a whole duration. */
	readonly durationSlots: number;
	/** The sheet states no drying time where one is needed: every hour is shut for it. */
	readonly silentDrying: boolean;
}

/** Where a number came from, worst last. */
export const ORIGINS = ['measured', 'forecast', 'derived', 'assumed'] as const;
export type Origin = (typeof ORIGINS)[number];

/** The phases of a step in a slot: brush moving, film not yet dry, not yet overcoatable. */
export const PHASES = ['apply', 'wet', 'set'] as const;
export type Phase = (typeof PHASES)[number];

/** One limit at one slot, for the reading. */
export interface LimitReading {
	readonly limit: LimitName;
	/** The word this limit shuts with. */
	readonly limiter: Limiter;
	readonly phase: Phase;
	/** Which of the conditions given binds. */
	readonly faceIndex: number;
	/** The value in the limit's own unit; null when missing; a boolean limit has null and `holds`. */
	readonly value: number | null;
	/** What it is held against, in the same unit; null where in or out. */
	readonly bound: number | null;
	readonly side: 'least' | 'most' | 'in';
	readonly unit: LimitUnit;
	/** Signed distance to the bound in its own unit (positive inside); null when unknown or in/out. */
	readonly room: number | null;
	/** In usual errors, at most 3; null when unknown. */
	readonly scaledRoom: number | null;
	/** The usual error of this quantity at this lead, in `unit`; null for in/out limits. */
	readonly usualError: number | null;
	readonly holds: boolean;
	readonly origin: Origin;
	/** Epoch seconds of the slot in which it binds (a wet or set check may bind later). */
	readonly at: number;
}

export const LIMIT_NAMES = [
	'hours',
	'daylight',
	'airTemperature',
	'surfaceTemperature',
	'relativeHumidity',
	'spread',
	'wind',
	'gust',
	'rain',
	'film',
	'directSun',
	'surfaceTrend',
	'sand',
	'curing',
	'dryingTime'
] as const;
export type LimitName = (typeof LIMIT_NAMES)[number];
export const LIMIT_UNITS = [
	'celsius',
	'kelvin',
	'percent',
	'metresPerSecond',
	'millimetres',
	'hours',
	'wattsPerSquareMetre',
	'none'
] as const;
export type LimitUnit = (typeof LIMIT_UNITS)[number];

/** Every limit of a step at one slot, least room first. */
export interface SlotReading {
	readonly slot: number;
	readonly state: State;
	readonly limiter: Limiter;
	readonly room: number | null;
	readonly limits: readonly LimitReading[];
}
