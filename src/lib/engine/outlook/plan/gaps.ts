import type { Candidates, Gap } from './chain';
import { reachedAt } from './clocks';
import { dryingGaps } from './drying';
import { linksOf, type Link } from './links';
import type { PlanStep } from './planStep';

const everywhere = ({ start }: Candidates, value: number): Float64Array =>
	new Float64Array(start.length).fill(value);

/** Where a link puts the start of its later step, after each start of its earlier one. */
export function linkBounds(link: Link, from: PlanStep, duration: number): Float64Array {
	const { sides } = from.faces[link.face];
	const { candidates, step } = from;
	const { table, side } = link;
	if (side === 'earliest') {
		const curingMin = step.limits.curing?.min ?? -Infinity;
		return reachedAt({ table, sides, side, curingMin }, candidates.finish);
	}
	const question = { table, sides, side, curingMin: -Infinity } as const;
	const byStart = reachedAt(question, candidates.start);
	const byFinish = reachedAt(question, candidates.finish);
	return byStart.map((position, k) => Math.min(position, byFinish[k] - duration));
}

/** Every gap of a chain: each step after the one before it, and what their clocks ask. */
export function gapsOf(steps: readonly PlanStep[]): Gap[] {
	const inOrder = steps.slice(1).flatMap((target, from): Gap[] => {
		const { candidates, isFixed } = steps[from];
		if (isFixed && target.isFixed) return [];
		const latest = everywhere(candidates, Infinity);
		return [{ from, to: from + 1, earliest: candidates.finish, latest }];
	});
	const byClock = linksOf(steps).map((link): Gap => {
		const from = steps[link.from];
		const bounds = linkBounds(link, from, steps[link.to].duration);
		return {
			from: link.from,
			to: link.to,
			earliest: link.side === 'earliest' ? bounds : everywhere(from.candidates, -Infinity),
			latest: link.side === 'latest' ? bounds : everywhere(from.candidates, Infinity),
			isMaximum: link.isMaximum
		};
	});
	const gaps = merged([...inOrder, ...byClock, ...dryingGaps(steps)]);
	return gaps.filter((gap) => !isImplied(gap, gaps, steps));
}

/** Gaps between the same two steps as one, maxima apart: they may be let go. */
function merged(gaps: readonly Gap[]): Gap[] {
	const byPair = new Map<string, Gap>();
	for (const gap of gaps) {
		const key = `${gap.from} ${gap.to} ${gap.isMaximum === true ? 'maximum' : ''}`;
		const before = byPair.get(key);
		byPair.set(key, before === undefined ? gap : tighter(before, gap));
	}
	return [...byPair.values()];
}

function tighter(a: Gap, b: Gap): Gap {
	const earliest = a.earliest.slice();
	const latest = a.latest.slice();
	for (let k = 0; k < earliest.length; k++) {
		if (b.earliest[k] > earliest[k]) earliest[k] = b.earliest[k];
		if (b.latest[k] < latest[k]) latest[k] = b.latest[k];
	}
	return { ...a, earliest, latest };
}

/**
 * Whether a gap over a step only repeats what that step asks itself: after the wait before it and
 * its own work, a wait from further back is over. Chains without such gaps are swept faster.
 */
function isImplied(gap: Gap, gaps: readonly Gap[], steps: readonly PlanStep[]): boolean {
	const { from, to, earliest, latest } = gap;
	if (to - from < 2 || latest.some((it) => it < Infinity)) return false;
	const between = steps.slice(from + 1, to);
	if (between.some((it) => it.isFixed)) return false;
	// Exact, not in whole slots: a fixed step and a launch slot may begin at any minute.
	const work = between.reduce((sum, it) => sum + it.duration, 0);
	return gaps.some(
		(first) =>
			first.from === from &&
			first.to === from + 1 &&
			first.earliest.every((it, k) => it + work >= earliest[k])
	);
}
