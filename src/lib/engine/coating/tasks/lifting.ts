import { ALOFT, windMost, type Task } from './task';

/**
 * No single figure holds: each machine's manual rules and its operator decides. A lorry crane's
 * manual halves its limits for a light load of large area, so windage counts.
 */
const SOURCE =
	'public figures for marine and mobile cranes near 20 mph; the split by windage is common practice; the machine’s manual comes first';

const LIGHT_WINDAGE = {
	method: 'none',
	limits: { ...ALOFT, daylight: true, ...windMost(9, 12) },
	caution: { wind: 6, gust: 9 },
	hazards: ['suspendedLoad'],
	source: SOURCE
} as const;

/** Multihulls, fly-bridges, masts in. */
const HIGH_WINDAGE = { ...LIGHT_WINDAGE, limits: { ...LIGHT_WINDAGE.limits, ...windMost(7, 10) } };

/** The hoist, by the boat's windage. */
export const LIFTING_TASKS = [
	{ code: 'haul', kind: 'lift', ...LIGHT_WINDAGE },
	{ code: 'haulHighWindage', kind: 'lift', ...HIGH_WINDAGE },
	{ code: 'launch', kind: 'launch', ...LIGHT_WINDAGE },
	{ code: 'launchHighWindage', kind: 'launch', ...HIGH_WINDAGE },
	{
		...HIGH_WINDAGE,
		code: 'shiftPads',
		kind: 'fit',
		isYardOnly: true,
		source:
			'default, no source: as lifting a boat of much windage; how stands are shifted is the yard’s rule and the stand maker’s'
	}
] as const satisfies readonly Task[];
