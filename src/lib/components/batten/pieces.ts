import type { Run } from '$lib/api/hours';
import { cut, type Span } from '../charts/axis';

/** A stretch of lath that is bare because something is missing, and what. */
export interface MissingPiece extends Span {
	readonly missing: string | null;
}

/** A step's runs as a hand lays them on the lath. */
export interface Pieces {
	readonly painted: readonly Span[];
	readonly taped: readonly Span[];
	readonly missing: readonly MissingPiece[];
	/** The runs inside the window, cut to it. */
	readonly runs: readonly Run[];
}

function joined(runs: readonly Run[], state: Run['state']): Span[] {
	const spans: Span[] = [];
	for (const { from, to } of runs.filter((it) => it.state === state)) {
		const last = spans.at(-1);
		if (last?.to === from) spans[spans.length - 1] = { from: last.from, to };
		else spans.push({ from, to });
	}
	return spans;
}

/** Runs inside a window: neighbours in one state are one coat or one length of tape. */
export function pieces(runs: readonly Run[], window: Span): Pieces {
	const inside = cut(runs, window);
	return {
		painted: joined(inside, 'open'),
		taped: joined(inside, 'tight'),
		missing: inside.filter((it) => it.state === 'shut' && it.limiter === 'noData'),
		runs: inside
	};
}
