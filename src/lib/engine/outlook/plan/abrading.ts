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

/** Most places tried in every combination; of more, one, two and all of them are. */
const ALL_COMBINATIONS = 6;

/** Ways to choose places, fewest first, each way a set of places. */
export function placeSets(places: readonly number[]): number[][][] {
	const sizes =
		places.length <= ALL_COMBINATIONS ? places.map((_, i) => i + 1) : [1, 2, places.length];
	return sizes.map((size) => combinations(places, size));
}

function combinations(places: readonly number[], size: number): number[][] {
	if (size === 0) return [[]];
	return places.flatMap((place, i) =>
		combinations(places.slice(i + 1), size - 1).map((rest) => [place, ...rest])
	);
}
