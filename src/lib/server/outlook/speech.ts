import type { Hours, HoursStep } from '../../api/hours';
import { SLOT_SECONDS, WET_HOUR, type SlotWeather } from '../../engine';
import type { HighWindDay, SpokenStep } from '../../sentences/headline';
import { spokenBatten } from '../../sentences/spokenBatten';
import { clock, weekday } from '../../time/zone';
import { quantity, type Units } from '../../units/quantity';
import type { QueuedStep } from '../db/queue';
import type { Axis } from './axis';
import { shutBy, stepView } from './stepView';
import type { AxisHours } from './stepHours';

/** From this hour on the day's work is behind: the sentence speaks of tomorrow. */
const LAST_HOUR_OF_TODAY = 15;

export const isoAt = (axis: Pick<Axis, 'start'>, slot: number): string =>
	new Date((axis.start + slot * SLOT_SECONDS) * 1000).toISOString();

/** The day there is most to say of at this hour, as an index of the axis' days. */
export function dayToSpeakOf(timeZone: string, now: Date): number {
	return Number(clock(now.getTime(), timeZone).slice(0, 2)) < LAST_HOUR_OF_TODAY ? 0 : 1;
}

/**
 * The day the sentence speaks of, as an index of the axis' days: today until no step has a start
 * left today or it is 15:00, whichever is first; then tomorrow.
 */
export function spokenDayOf(
	steps: readonly Pick<HoursStep, 'bestByDay'>[],
	timeZone: string,
	now: Date
): number {
	const left = steps.some(({ bestByDay }) => bestByDay[0] !== null);
	return left ? dayToSpeakOf(timeZone, now) : 1;
}

const dayStartSlot = (axis: Axis, day: number): number =>
	axis.days.slice(0, day).reduce((sum, { slots }) => sum + slots, 0);

export function dayName(axis: Axis, day: number, timeZone: string): string {
	if (day === 0) return 'today';
	if (day === 1) return 'tomorrow';
	return weekday(axis.days[day].start * 1000, timeZone);
}

/** A step's facts on one day, for the sentences. */
export function spokenStep(
	queued: QueuedStep,
	view: Pick<HoursStep, 'bestByDay' | 'faces'>,
	hours: AxisHours | null,
	axis: Axis,
	day: number
): SpokenStep {
	const best = view.bestByDay[day];
	const from = dayStartSlot(axis, day);
	return {
		step: queued.step.name,
		boat: queued.boat.name,
		face: view.faces.join(' and '),
		coat: queued.step.kind === 'coat',
		hours:
			best === null
				? null
				: {
						from: isoAt(axis, best.from),
						to: isoAt(axis, best.to),
						before: best.before,
						after: best.after,
						room: best.room
					},
		shutBy: hours === null ? 'noData' : shutBy(hours, from, from + axis.days[day].slots)
	};
}

/** A step of the page with what a screen reader hears for its batten. */
export function spokenView(
	queued: QueuedStep,
	hours: AxisHours | null,
	axis: Axis,
	nowSlot: number,
	timeZone: string
): HoursStep {
	const view = stepView(queued, hours, axis, nowSlot);
	const days = axis.days.map((_, day) => {
		const spoken = spokenStep(queued, view, hours, axis, day);
		return {
			name: dayName(axis, day, timeZone),
			hours: spoken.hours === null ? null : { ...spoken.hours, tight: spoken.hours.room < 1 },
			shutBy: spoken.shutBy
		};
	});
	const what = view.faces.length === 0 ? view.name : `${view.name}, ${view.faces.join(' and ')}`;
	return { ...view, spoken: spokenBatten(what, queued.boat.name, days, timeZone) };
}

/** The page's days, with the ones whose gusts reach the yard's threshold. */
export function pageDays(
	axis: Axis,
	weather: SlotWeather | null,
	highWindGust: number
): Hours['days'] {
	let startSlot = 0;
	return axis.days.map(({ date, slots }) => {
		const from = startSlot;
		startSlot += slots;
		const highWind =
			weather?.windGust
				.subarray(from + axis.offset, from + slots + axis.offset)
				.some((gust) => gust >= highWindGust) ?? false;
		return { date, startSlot: from, slots, highWind };
	});
}

/** The first high-wind day of the page from an index on; null without one. */
export function highWindDayOf(
	days: Hours['days'],
	weather: SlotWeather | null,
	axis: Axis,
	timeZone: string,
	units: Units
): HighWindDay | null {
	const index = days.findIndex(({ highWind }) => highWind);
	if (index < 0 || weather === null) return null;
	const { startSlot, slots } = days[index];
	const from = startSlot + axis.offset;
	const gusts = weather.windGust.subarray(from, from + slots);
	const most = gusts.reduce((a, b) => (b > a ? b : a), 0);
	const wet = weather.hourlyPrecipitation
		.subarray(from, from + slots)
		.findIndex((amount) => amount >= WET_HOUR);
	const { number, unit } = quantity(most, 'metresPerSecond', units);
	return {
		name: dayName(axis, index, timeZone),
		gust: `${Math.round(Number(number))} ${unit}`,
		rainFrom: wet < 0 ? null : isoAt(axis, startSlot + wet)
	};
}
