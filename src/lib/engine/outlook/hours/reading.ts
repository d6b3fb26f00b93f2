import { LIMITERS, STATES } from '../../vocabulary';
import { flagBit } from '../weather/flags';
import { judge, limiterAt, slotStates } from './judge';
import type { LimitReading, Origin, SlotReading } from './result';
import { BROKEN, MOST_ROOM } from './roomSeries';
import type { LimitTrack } from './rooms';
import { durationSlotsOf, type HoursOptions } from './stepHours';
import { shutShortRuns } from './stretches';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import type { Step } from './step';

const orNull = (value: number): number | null => (Number.isFinite(value) ? value : null);

function originOf(track: LimitTrack, at: number): Origin {
	const word = track.face.flags[at];
	if (word & flagBit('measured')) return 'measured';
	if (track.modelled && word & flagBit('assumed')) return 'assumed';
	if (track.modelled) return 'derived';
	if (track.limit === 'gust' && track.face.weather.gustDerived[at]) return 'derived';
	return 'forecast';
}

function readTrack(track: LimitTrack, slot: number): LimitReading {
	const { grid } = track.face.weather;
	const at = Math.min(track.at === null ? slot : track.at[slot], grid.count - 1);
	const scaled = track.scaled[slot];
	const value = orNull(track.value[at]);
	const bound =
		track.bound === null || typeof track.bound === 'number' ? track.bound : orNull(track.bound[at]);
	const distance =
		value === null || bound === null || track.side === 'in'
			? null
			: track.side === 'least'
				? value - bound
				: bound - value;
	return {
		limit: track.limit,
		limiter: LIMITERS[limiterAt(track, slot)],
		phase: track.phase,
		faceIndex: track.faceIndex,
		value,
		bound,
		side: track.side,
		unit: track.unit,
		room: distance,
		scaledRoom: Number.isNaN(scaled) ? null : Math.min(scaled, MOST_ROOM),
		usualError: track.error === null ? null : track.error[at],
		holds: scaled >= 0,
		origin: originOf(track, at),
		at: grid.start + at * SLOT_SECONDS
	};
}

/**
 * Place of a row: least room first. What is unknown in the slot itself comes before all, what is
 * unknown later after the limits already broken, as the limiter is chosen.
 */
function order({ scaledRoom, phase }: LimitReading): number {
	if (scaledRoom !== null) return scaledRoom;
	return phase === 'apply' ? -Infinity : -Number.MIN_VALUE;
}

/**
 * Every limit of a step at one slot, least room first, drawn from the same tracks as
 * {@link stepHours}. Of several faces the worse is told.
 */
export function slotReading(
	step: Step,
	conditions: readonly FaceConditions[],
	site: Site,
	slot: number,
	options: HoursOptions = {}
): SlotReading {
	const judgement = judge(step, conditions, site, options);
	const states = slotStates(judgement, conditions);
	shutShortRuns(states, durationSlotsOf(step.durationMinutes));
	const { grid, work, daylight } = judgement;
	const at = grid.start + slot * SLOT_SECONDS;
	const inOrOut = (limit: 'hours' | 'daylight' | 'dryingTime', holds: boolean): LimitReading => ({
		limit,
		limiter: limit === 'daylight' ? 'dark' : limit === 'hours' ? 'hours' : 'noData',
		phase: limit === 'dryingTime' ? 'wet' : 'apply',
		faceIndex: 0,
		value: null,
		bound: null,
		side: 'in',
		unit: 'none',
		room: null,
		scaledRoom: limit === 'dryingTime' ? null : holds ? MOST_ROOM : BROKEN,
		usualError: null,
		holds,
		origin: 'derived',
		at
	});
	const rows = new Map<string, LimitReading>();
	const put = (reading: LimitReading): void => {
		const key = `${reading.limit} ${reading.phase} ${reading.side} ${String(reading.bound)}`;
		const before = rows.get(key);
		if (before === undefined || order(reading) < order(before)) rows.set(key, reading);
	};
	if (work !== null) put(inOrOut('hours', work[slot] === 1));
	if (daylight !== null) put(inOrOut('daylight', daylight[slot] === 1));
	if (judgement.silentDrying) put(inOrOut('dryingTime', false));
	for (const track of judgement.tracks) put(readTrack(track, slot));
	return {
		slot,
		state: STATES[states.state[slot]],
		limiter: LIMITERS[states.limiter[slot]],
		room: Number.isNaN(states.room[slot]) ? null : states.room[slot],
		limits: [...rows.values()].sort((a, b) => order(a) - order(b))
	};
}
