import { LIMITERS, STATES } from '../../vocabulary';
import { flagBit } from '../weather/flags';
import { judge, slotStates } from './judge';
import { limiterAt, roomAt, type Limit } from './limit';
import type { LimitReading, Origin, SlotReading } from './result';
import { BROKEN, MOST_ROOM } from './roomSeries';
import { durationSlotsOf, errorsOf, type HoursOptions } from './stepHours';
import { shutShortRuns } from './stretches';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import type { Step } from './step';

const orNull = (value: number): number | null => (Number.isFinite(value) ? value : null);

function originOf(limit: Limit, at: number): Origin {
	const word = limit.face.flags[at];
	if (word & flagBit('measured')) return 'measured';
	if (limit.modelled && word & flagBit('assumed')) return 'assumed';
	if (limit.modelled) return 'derived';
	if (limit.limit === 'gust' && limit.face.weather.gustDerived[at]) return 'derived';
	return 'forecast';
}

/** A limit held at a slot with a scaled room, which a wet or set check may take from a later slot. */
function readLimit(limit: Limit, at: number, scaled: number): LimitReading {
	const { grid } = limit.face.weather;
	const value = orNull(limit.value[at]);
	const bound =
		limit.bound === null || typeof limit.bound === 'number' ? limit.bound : orNull(limit.bound[at]);
	const distance =
		value === null || bound === null
			? null
			: limit.side === 'least'
				? value - bound
				: bound - value;
	return {
		limit: limit.limit,
		limiter: LIMITERS[limiterAt(limit, at)],
		phase: limit.phase,
		faceIndex: limit.faceIndex,
		value,
		bound,
		side: limit.side,
		unit: limit.unit,
		room: distance,
		scaledRoom: Number.isNaN(scaled) ? null : Math.min(scaled, MOST_ROOM),
		usualError: limit.error === null ? null : limit.error[at],
		holds: scaled >= 0,
		origin: originOf(limit, at),
		at: grid.start + at * SLOT_SECONDS
	};
}

/** The slot of [from, to) in which a limit binds: the least room; an unknown one where none is broken. */
function bindingSlot(limit: Limit, from: number, to: number): { at: number; scaled: number } {
	let at = from;
	let scaled = Infinity;
	let unknown = -1;
	for (let i = from; i < to; i++) {
		const room = roomAt(limit, i);
		if (room < scaled) {
			scaled = room;
			at = i;
		} else if (room !== room && unknown < 0) unknown = i;
	}
	return unknown >= 0 && !(scaled < 0) ? { at: unknown, scaled: NaN } : { at, scaled };
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
	const judgement = judge(step, conditions, site, errorsOf(conditions, options));
	const states = slotStates(judgement);
	shutShortRuns(states, durationSlotsOf(step.durationMinutes));
	const { grid, knownTo } = judgement.weather;
	const { work, daylight } = judgement.masks;
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
	for (const limit of judgement.apply) put(readLimit(limit, slot, roomAt(limit, slot)));
	for (const { phases } of judgement.phases) {
		for (const { limits, ends } of phases) {
			const end = Math.min(ends[slot], knownTo);
			for (const limit of limits) {
				const { at, scaled } = bindingSlot(limit, slot + 1, end);
				put(readLimit(limit, Math.min(at, grid.count - 1), scaled));
			}
		}
	}
	return {
		slot,
		state: STATES[states.state[slot]],
		limiter: LIMITERS[states.limiter[slot]],
		room: Number.isNaN(states.room[slot]) ? null : states.room[slot],
		limits: [...rows.values()].sort((a, b) => order(a) - order(b))
	};
}
