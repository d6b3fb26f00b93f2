import type { Limiter } from '../engine';

/** The word a limiter goes by on its own; the missing thing is named elsewhere. */
export const LIMITER_WORDS: Record<Limiter, string> = {
	none: 'nothing',
	noData: 'missing data',
	hours: 'the yard’s hours',
	dark: 'darkness',
	dew: 'dew',
	damp: 'damp air',
	dry: 'dry air',
	wet: 'a wet face',
	frost: 'frost',
	cold: 'cold',
	hot: 'heat',
	sun: 'the sun on it',
	rising: 'a warming surface',
	falling: 'a cooling surface',
	wind: 'wind',
	sand: 'blowing sand',
	rain: 'rain',
	short: 'too short a gap',
	early: 'the coat before it',
	late: 'the recoat window’s end'
};

/** "wind" → "Wind": the first letter of a sentence. */
export function capital(text: string): string {
	return text.charAt(0).toUpperCase() + text.slice(1);
}

/** "a", "a and b", "a, b and c". */
export function list(items: readonly string[]): string {
	if (items.length < 2) return items.join('');
	return `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;
}

/** "1 step", "3 steps". */
export function counted(count: number, one: string, many = `${one}s`): string {
	return `${count} ${count === 1 ? one : many}`;
}
