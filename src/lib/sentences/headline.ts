import type { Sentence } from '../api/sentence';
import type { Limiter } from '../engine';
import { clock } from '../time/zone';
import { closing } from './closing';
import { capital, counted, LIMITER_WORDS, list } from './words';

/** One step on the day the sentence speaks of. Instants in ISO 8601. */
export interface SpokenStep {
	readonly step: string;
	readonly boat: string;
	/** "starboard topsides" */
	readonly face: string;
	/** A coat, rather than other work. */
	readonly coat: boolean;
	/** The day's best stretch; null where nothing fits. */
	readonly hours: {
		readonly from: string;
		readonly to: string;
		readonly before: Limiter;
		readonly after: Limiter;
		readonly room: number;
	} | null;
	/** What shuts most of the day's daylight hours of the yard. */
	readonly shutBy: Limiter;
}

export interface SpokenDay {
	readonly day: 'today' | 'tomorrow';
	readonly timeZone: string;
	readonly steps: readonly SpokenStep[];
	/** Nothing was ever fetched; nothing can be said. */
	readonly forecast: 'none' | 'known';
}

const plain = (text: string): Sentence[number] => ({ text, role: 'plain' });
const time = (text: string): Sentence[number] => ({ text, role: 'time' });
const boat = (text: string): Sentence[number] => ({ text, role: 'boat' });

type Open = SpokenStep & { hours: NonNullable<SpokenStep['hours']> };

/** A boat's possessive: "Tansy’s", "Ulysses’". */
const possessive = (name: string): string => (name.endsWith('s') ? '’ ' : '’s ');

function oneStep(it: Open, day: string, timeZone: string): Sentence {
	const end = it.coat ? ', brush down by ' : ', done by ';
	const shut = closing(it.hours.before, it.hours.after);
	return [
		plain(`${day}: ${it.step} on `),
		boat(it.boat),
		plain(`${possessive(it.boat)}${it.face} from `),
		time(clock(it.hours.from, timeZone)),
		plain(end),
		time(clock(it.hours.to, timeZone)),
		plain(shut === '' ? '.' : `. ${shut}`)
	];
}

/** The limiter most of the steps share; what they differ in is left to the battens. */
function shared(limiters: readonly Limiter[]): Limiter {
	const counts = new Map<Limiter, number>();
	for (const limiter of limiters) counts.set(limiter, (counts.get(limiter) ?? 0) + 1);
	return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? 'none';
}

function severalSteps(open: readonly Open[], day: string, timeZone: string): Sentence {
	const coats = open.filter(({ coat }) => coat);
	const spoken = coats.length > 0 ? coats : open;
	const from = spoken.map(({ hours }) => hours.from).sort()[0];
	const to = spoken.map(({ hours }) => hours.to).sort()[spoken.length - 1];
	const shut = closing(
		shared(spoken.map(({ hours }) => hours.before)),
		shared(spoken.map(({ hours }) => hours.after))
	);
	const work = coats.length > 0 ? 'coats go on' : 'work goes on';
	const end = coats.length > 0 ? '; brushes down by ' : '; done by ';
	return [
		plain(`${day}, ${work} from `),
		time(clock(from, timeZone)),
		plain(end),
		time(clock(to, timeZone)),
		plain(shut === '' ? '.' : `. ${shut.replace(' shuts it ', ' shuts them ')}`)
	];
}

/** The first thing on the first screen. */
export function headline({ day, timeZone, steps, forecast }: SpokenDay): Sentence {
	const spokenDay = capital(day);
	if (steps.length === 0) return [plain('No jobs are queued yet.')];
	if (forecast === 'none')
		return [plain('No forecast has come yet, so no hour can be called open.')];
	const open = steps.filter((it): it is Open => it.hours !== null);
	const [first, second] = open;
	if (first === undefined) {
		const why = shared(steps.map(({ shutBy }) => shutBy));
		if (why === 'hours') return [plain(`${spokenDay} the yard is shut.`)];
		return [plain(`Nothing can go on ${day}: ${LIMITER_WORDS[why]} shuts the day.`)];
	}
	return second === undefined
		? oneStep(first, spokenDay, timeZone)
		: severalSteps(open, spokenDay, timeZone);
}

/** A day of the axis with a gale in it. */
export interface HighWindDay {
	/** "Friday", or "today" */
	readonly name: string;
	/** In the person's unit: "37 kn". */
	readonly gust: string;
	/** When the first wet hour of that day begins; null on a dry day. */
	readonly rainFrom: string | null;
}

export interface SublineInput extends SpokenDay {
	readonly highWind: HighWindDay | null;
}

/** The line under it: which coat has most room, and the next high-wind day. */
export function subline({ day, timeZone, steps, forecast, highWind }: SublineInput): Sentence {
	const parts: Sentence = [];
	if (steps.length === 0)
		return [plain('A job is a queue of steps on one side of a boat. Its hours show here.')];
	const open = steps
		.filter((it): it is Open => it.hours !== null)
		.sort((a, b) => b.hours.room - a.hours.room);
	const [best] = open;
	if (forecast === 'known' && best !== undefined && open.length > 1) {
		parts.push(
			plain(
				`${counted(open.length, 'step')} of ${steps.length} fit ${day}; most room: ${best.step} on `
			),
			boat(best.boat),
			plain('. ')
		);
	}
	if (highWind !== null) {
		const facts = [
			...(highWind.rainFrom === null ? [] : [`rain from ${clock(highWind.rainFrom, timeZone)}`]),
			`gusts to ${highWind.gust}`
		];
		parts.push(plain(`${capital(highWind.name)} is a high-wind day: ${list(facts)}.`));
	}
	return parts;
}
