import type { Hours, Run } from '$lib/api/hours';
import type { AxisSource } from '../charts/axis';

/**
 * The day on the front page: an example, and said to be one. Slots of a day in May, from midnight.
 */
const slot = (time: string): number => {
	const [hours, minutes] = time.split(':').map(Number);
	return hours * 4 + minutes / 15;
};

const DAYS: Hours['days'] = [{ date: '2026-05-13', startSlot: 0, slots: 96, highWind: false }];

export const EXAMPLE: AxisSource = {
	start: '2026-05-13T00:00:00Z',
	slotCount: 96,
	days: DAYS,
	nights: [],
	yard: { timeZone: 'UTC' }
};

/** Hours in view, and when now is. */
export const VIEW = { from: slot('06:00'), to: slot('20:00') };
export const NOW = { slot: slot('07:10'), text: '07:10' };
/** The painted run, and the tape at both its ends. */
export const OPEN = { from: slot('09:45'), to: slot('14:15'), tape: 2 };
/** The start that is offered, and its end. */
export const OFFER = { start: slot('10:15'), finish: slot('12:00'), label: '10:15' };

const run = (from: string, to: string, state: Run['state'], limiter: Run['limiter']): Run => ({
	from: slot(from),
	to: slot(to),
	state,
	limiter,
	missing: null
});

export const RUNS: readonly Run[] = [
	run('00:00', '07:00', 'shut', 'hours'),
	run('07:00', '09:15', 'shut', 'dew'),
	run('09:15', '09:45', 'tight', 'dew'),
	run('09:45', '14:15', 'open', 'none'),
	run('14:15', '14:45', 'tight', 'wind'),
	run('14:45', '24:00', 'shut', 'wind')
];
