import type { JobStep } from '../job/job';
import { clearsMaximum, isCoat } from './planStep';
import type { Task } from '../../coating/tasks/task';

/**
 * A missed maximum is not a dead end: the surface is abraded and the coat goes on. Where that can
 * be put in, and what it is.
 */

/** Indices of the coats before which abrading may be put in: the coat before them sets a maximum. */
export function abradingPlaces(steps: readonly JobStep[]): number[] {
	return steps.flatMap((target, to) => {
		if (!isCoat(target.step.kind) || target.startAt !== undefined) return [];
		for (let from = to - 1; from >= 0; from--) {
			const { kind, times } = steps[from].step;
			if (clearsMaximum(kind)) return [];
			if (isCoat(kind)) return times.overcoatMax == null ? [] : [to];
		}
		return [];
	});
}

/**
 * The abrading put in before a coat: the usual rule for dry sanding, on the coat's own faces, in
 * its hours, as long as the coat (default, no source).
 */
export function abradingBefore({ step, faces }: JobStep, sanding: Task): JobStep {
	return {
		faces,
		step: {
			name: '',
			kind: 'abrade',
			durationMinutes: step.durationMinutes,
			method: 'none',
			...(step.workHours === undefined ? {} : { workHours: step.workHours }),
			...(step.closed === undefined ? {} : { closed: step.closed }),
			limits: { ...sanding.limits, ...(step.limits.daylight === true ? { daylight: true } : {}) },
			times: sanding.times ?? {}
		}
	};
}

/** Most places beyond the needed ones tried in every combination; of more, none, one, two and all are. */
const ALL_COMBINATIONS = 6;
/** Most ways of one size that are tried, the earliest places first; all there are of six. */
const MOST_WAYS = 64;

/**
 * Ways to choose places, fewest first, each way a set of places in order. What provably does not
 * help is left out.
 *
 * @param mayHelp - false only where abrading before those coats, and no others, leaves no way; true
 * of a set makes it true of every set around it
 */
export function* placeSets(
	places: readonly number[],
	mayHelp: (places: readonly number[]) => boolean
): Generator<number[][]> {
	if (places.length === 0 || !mayHelp(places)) return;
	const needed = places.filter((place) => !mayHelp(places.filter((it) => it !== place)));
	const rest = places.filter((place) => !needed.includes(place));
	const sizes =
		rest.length <= ALL_COMBINATIONS
			? Array.from({ length: rest.length + 1 }, (_, size) => size)
			: [0, 1, 2, rest.length];
	for (const size of sizes) {
		if (needed.length + size === 0) continue;
		yield combinations(rest, size)
			.slice(0, MOST_WAYS)
			.map((more) => [...needed, ...more].sort((a, b) => a - b))
			.filter(mayHelp);
	}
}

function combinations(places: readonly number[], size: number): number[][] {
	if (size === 0) return [[]];
	if (size > places.length) return [];
	return places.flatMap((place, i) =>
		combinations(places.slice(i + 1), size - 1).map((rest) => [place, ...rest])
	);
}
