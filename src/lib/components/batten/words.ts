import type { Hours, Run } from '$lib/api/hours';
import { overlap, type Axis, type Span } from '../charts/axis';
import { textWidth } from '../charts/textWidth';
import type { BattenMeasures } from './measures';

/** What is said where the missing thing's own name is not known, or too long for its place. */
const NO_DATA = 'no data';

/** The word a run is shut or tightened with: the engine's own, except where nothing is known. */
export function limiterWord(run: Pick<Run, 'limiter' | 'missing'>): string {
	if (run.limiter === 'none') return '';
	if (run.limiter !== 'noData') return run.limiter;
	return run.missing === null ? NO_DATA : `no ${run.missing.replace(/^no /, '')}`;
}

/** A word in its place on the lath. */
export interface Word {
	readonly text: string;
	/** px: the middle of the word. */
	readonly x: number;
	/** px: as wide as it is set. */
	readonly width: number;
	readonly on: 'bare' | 'tape' | 'missing';
}

const SPARE = { bare: 3, missing: 3, tape: 5 } as const;
const SILENT_ON_LISTS: readonly Run['limiter'][] = ['dark', 'hours'];

/** The parts of a span that lie in none of the others. */
function without(span: Span, others: readonly Span[]): Span[] {
	let parts = [span];
	for (const other of others) {
		parts = parts.flatMap((part) => {
			const common = overlap(part, other);
			if (!common) return [part];
			return [
				{ from: part.from, to: common.from },
				{ from: common.to, to: part.to }
			].filter((it) => it.from < it.to);
		});
	}
	return parts;
}

function widest(spans: readonly Span[]): Span | null {
	return spans.reduce<Span | null>(
		(best, it) => (best && best.to - best.from >= it.to - it.from ? best : it),
		null
	);
}

/** Neighbouring bare or taped runs with one word share it. */
function sameWord(runs: readonly Run[]): Run[] {
	const joined: Run[] = [];
	for (const run of runs) {
		const last = joined.at(-1);
		const same =
			last &&
			last.to === run.from &&
			last.state === run.state &&
			limiterWord(last) === limiterWord(run);
		if (same) joined[joined.length - 1] = { ...last, to: run.to };
		else joined.push(run);
	}
	return joined;
}

/**
 * Where words fit. A run that outlasts a day says its word once a day, by day where there is room,
 * so that no screenful of lath is left without its reason.
 * @param covered slots under a block, where no word can be read
 */
export function words(
	runs: readonly Run[],
	days: Hours['days'],
	axis: Axis,
	measures: Pick<BattenMeasures, 'word' | 'saysDark'>,
	covered: Span | null = null
): Word[] {
	const placed: Word[] = [];
	for (const run of sameWord(runs)) {
		if (run.state === 'open') continue;
		if (!measures.saysDark && SILENT_ON_LISTS.includes(run.limiter)) continue;
		const on = run.state === 'tight' ? 'tape' : run.limiter === 'noData' ? 'missing' : 'bare';
		const weight = on === 'bare' ? 500 : 600;
		const place = (text: string, day: Span): Word | null => {
			const width = textWidth(text, measures.word, weight);
			const fits = (span: Span) => axis.x(span.to) - axis.x(span.from) >= width + 2 * SPARE[on];
			const part = overlap(run, day);
			if (text === '' || !part) return null;
			const free = without(part, covered ? [covered] : []);
			const light = free.flatMap((it) => without(it, axis.nights));
			const room = widest(light.filter(fits)) ?? widest(free.filter(fits));
			if (!room) return null;
			const { from, to } = room;
			return { text, x: (axis.x(from) + axis.x(to)) / 2, width, on };
		};
		for (const { startSlot, slots } of days) {
			const day = { from: startSlot, to: startSlot + slots };
			const word = place(limiterWord(run), day) ?? (on === 'missing' ? place(NO_DATA, day) : null);
			if (word) placed.push(word);
		}
	}
	return placed;
}
