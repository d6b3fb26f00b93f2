import type { Candidates, Gap } from './chain';
import { reachedAt } from './clocks';
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
			latest: link.side === 'latest' ? bounds : everywhere(from.candidates, Infinity)
		};
	});
	return [...inOrder, ...byClock];
}
