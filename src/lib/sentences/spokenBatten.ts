import type { Limiter } from '../engine';
import { clock } from '../time/zone';
import { closing } from './closing';
import { LIMITER_WORDS } from './words';

/** One local day of a batten. */
export interface BattenDay {
	/** "today", "tomorrow", "Thursday" */
	readonly name: string;
	readonly hours: {
		readonly from: string;
		readonly to: string;
		readonly before: Limiter;
		readonly after: Limiter;
		readonly tight: boolean;
	} | null;
	readonly shutBy: Limiter;
}

/** What a screen reader hears for a batten: the sentence it draws. */
export function spokenBatten(
	step: string,
	boat: string,
	days: readonly BattenDay[],
	timeZone: string
): string {
	const told = days.map(({ name, hours, shutBy }) => {
		if (hours === null) return `${name} shut: ${LIMITER_WORDS[shutBy]}`;
		const state = hours.tight ? 'tight' : 'open';
		const shut = closing(hours.before, hours.after).replace(/\.$/, '');
		const tail = shut === '' ? '' : `, ${shut.charAt(0).toLowerCase()}${shut.slice(1)}`;
		return `${name} ${state} ${clock(hours.from, timeZone)} to ${clock(hours.to, timeZone)}${tail}`;
	});
	return `${step}, ${boat}: ${told.join('; ')}.`;
}
