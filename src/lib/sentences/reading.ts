import type { Limiter, State } from '../engine';
import { dayAndClock } from '../time/zone';
import { list, LIMITER_WORDS } from './words';

/** What a reading says of one quarter-hour. Numbers come as text in the person's units. */
export interface ReadingFacts {
	/** ISO 8601 */
	readonly slotStart: string;
	readonly timeZone: string;
	readonly state: State;
	readonly limiter: Limiter;
	/** The binding limit: "17.5 kn", "20 kn", "2.5 kn", "2.6 kn"; null where in or out. */
	readonly binding: {
		readonly value: string;
		readonly bound: string;
		readonly room: string;
		readonly usualError: string | null;
	} | null;
	readonly missing: readonly string[];
	/** When it binds, if later than the slot: the film is still wet then. */
	readonly bindsAt: string | null;
}

/** "Wed 14:45, tight: 2.5 kn of room". */
export function readingTitle(facts: ReadingFacts): string {
	const when = dayAndClock(facts.slotStart, facts.timeZone);
	if (facts.limiter === 'noData') return `${when}, shut: ${missingWords(facts.missing)}`;
	if (facts.state === 'shut') return `${when}, shut by ${LIMITER_WORDS[facts.limiter]}`;
	if (facts.binding === null) return `${when}, ${facts.state}`;
	return `${when}, ${facts.state}: ${facts.binding.room} of room`;
}

const missingWords = (missing: readonly string[]): string =>
	missing.length === 0 ? 'the forecast ends before it is dry' : `no ${list(missing)}`;

/** The sentence under the title: the binding number against its limit. */
export function readingDetail(facts: ReadingFacts): string {
	const later =
		facts.bindsAt === null
			? ''
			: ` at ${dayAndClock(facts.bindsAt, facts.timeZone)}, while the coat is not through`;
	if (facts.limiter === 'noData') return 'Nothing is guessed: a missing value keeps the hour shut.';
	if (facts.limiter === 'hours') return 'The yard is closed then.';
	if (facts.limiter === 'dark') return 'There is no daylight over the whole quarter-hour.';
	if (facts.limiter === 'short') return 'Too few quarter-hours in a row to finish the step.';
	if (facts.binding === null)
		return facts.state === 'shut'
			? `It is shut by ${LIMITER_WORDS[facts.limiter]}${later}.`
			: 'Every limit holds with room to spare.';
	const error =
		facts.binding.usualError === null ? '' : `; the usual error is ${facts.binding.usualError}`;
	return `${facts.binding.value} against ${facts.binding.bound}${later}${error}.`;
}
