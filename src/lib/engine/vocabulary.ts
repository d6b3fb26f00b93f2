/**
 * The closed lists of the engine: one word per thing, in the order that screens list them.
 * The API schema, the database and the screens all take their enumerations from here.
 */

/** What a step does to the boat. Priming is a coat. */
export const STEP_KINDS = [
	'wash',
	'strip',
	'abrade',
	'blast',
	'degrease',
	'laminate',
	'bond',
	'seal',
	'weld',
	'fit',
	'coat',
	'cure',
	'lift',
	'launch'
] as const;
export type StepKind = (typeof STEP_KINDS)[number];

/** Steps that lay something wet, for which a silent drying time shuts the hours. */
export const WET_STEP_KINDS: readonly StepKind[] = ['coat', 'seal', 'bond', 'laminate'];

/** How a coating is laid. */
export const METHODS = [
	'brush',
	'roller',
	'rollAndTip',
	'hvlp',
	'airSpray',
	'airless',
	'none'
] as const;
export type Method = (typeof METHODS)[number];

/** State of a quarter-hour for a step. Order is the code kept in typed arrays. */
export const STATES = ['shut', 'tight', 'open'] as const;
export type State = (typeof STATES)[number];

/** The reason an hour is tight or shut. Order is the code kept in typed arrays; 0 is none. */
export const LIMITERS = [
	'none',
	'noData',
	'hours',
	'dark',
	'dew',
	'damp',
	'dry',
	'wet',
	'frost',
	'cold',
	'hot',
	'sun',
	'rising',
	'falling',
	'wind',
	'sand',
	'rain',
	'short',
	'early',
	'late'
] as const;
export type Limiter = (typeof LIMITERS)[number];

/** Where a slot's numbers came from. Bit i of a slot's flag word is SLOT_FLAGS[i]. */
export const SLOT_FLAGS = [
	'derived',
	'assumed',
	'coarse',
	'stale',
	'measured',
	'noSandStated'
] as const;
export type SlotFlag = (typeof SLOT_FLAGS)[number];

/** What a person must know of a step's hours as a whole. */
export const STEP_FLAGS = ['setPastEnd', 'extrapolated', 'standstill', 'assumed'] as const;
export type StepFlag = (typeof STEP_FLAGS)[number];

/** State of loose sand in the yard's sectors. Order is the code kept in typed arrays. */
export const SAND_STATES = ['none', 'lifting', 'blowing'] as const;
export type SandState = (typeof SAND_STATES)[number];

export const SHELTERS = ['open', 'lee', 'tarp', 'tent', 'heatedTent', 'shed'] as const;
export type ShelterName = (typeof SHELTERS)[number];

export const MATERIALS = [
	'grp',
	'coredGrp',
	'steel',
	'aluminium',
	'timber',
	'casting',
	'iron',
	'lead'
] as const;
export type Material = (typeof MATERIALS)[number];

export const FINISHES = ['gloss', 'matt', 'nonSkid'] as const;
export type Finish = (typeof FINISHES)[number];
