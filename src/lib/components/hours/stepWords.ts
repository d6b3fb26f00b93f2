import type { Hours, HoursStep } from '$lib/api/hours';
import { slotStart } from '$lib/time/slots';
import { clock, dayAndClock } from '$lib/time/zone';

/** What a shelter is called where it stands beside a step; nothing over it needs no word. */
const SHELTER_WORDS: Record<string, string> = {
	open: '',
	lee: 'behind a wind-break',
	tarp: 'under a tarp',
	tent: 'in a tent',
	heatedTent: 'in a heated tent',
	shed: 'in a shed'
};

/** Faces and shelter: "starboard topsides, under a tarp". */
export function stepPlace(step: Pick<HoursStep, 'faces' | 'shelter'>): string {
	const shelter = SHELTER_WORDS[step.shelter] ?? step.shelter;
	return [...step.faces, shelter].filter((it) => it !== '').join(', ');
}

/** Boat, step and place, as a screen reader hears which batten it is on. */
export function stepName(
	boat: string,
	step: Pick<HoursStep, 'name' | 'faces' | 'shelter'>
): string {
	return [boat, step.name, stepPlace(step)].filter((it) => it !== '').join(', ');
}

/**
 * The start that stands beside a step while a day is looked at: that day's best, else the next
 * one's with its day, else in words that there is none.
 */
export function startWords(
	step: Pick<HoursStep, 'bestByDay'>,
	day: number,
	hours: Pick<Hours, 'start' | 'yard'>
): string {
	const zone = hours.yard.timeZone;
	const here = step.bestByDay[day];
	if (here) return clock(slotStart(hours.start, here.start), zone);
	const later = step.bestByDay.find((it, i) => i > day && it !== null);
	return later ? dayAndClock(slotStart(hours.start, later.start), zone) : 'no start';
}
