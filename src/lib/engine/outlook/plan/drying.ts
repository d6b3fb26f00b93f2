import type { Gap } from './chain';
import type { PlanStep } from './planStep';

const worksOn = ({ faces }: PlanStep, id: string): boolean => faces.some((face) => face.id === id);

/**
 * What a washing asks of the next step that needs a dry surface, on each face that both work on: to
 * wait until the film is gone, as the heat balance dries it. Films of the forecast, not of members.
 */
export function dryingGaps(steps: readonly PlanStep[]): Gap[] {
	return steps.flatMap((target, to) => {
		if (target.step.limits.drySurface !== true) return [];
		return target.faces.flatMap(({ id }): Gap[] => {
			const from = steps
				.slice(0, to)
				.findLastIndex(
					(it) => worksOn(it, id) && (it.step.kind === 'wash' || it.step.limits.drySurface === true)
				);
			if (from < 0 || steps[from].step.kind !== 'wash') return [];
			if (steps[from].isFixed && target.isFixed) return [];
			return [dryingGap(steps[from], from, to, id)];
		});
	});
}

function dryingGap({ candidates, faces }: PlanStep, from: number, to: number, id: string): Gap {
	const sides = faces.find((face) => face.id === id)?.sides ?? [];
	const driesOnAll = (slot: number): number =>
		Math.max(-Infinity, ...sides.map(({ dries }) => dries?.(slot) ?? -Infinity));
	let latestSoFar = -Infinity;
	const earliest = candidates.finish.map((finish) => {
		const slot = Math.ceil(finish - 1e-6);
		const end = sides[0]?.weather.grid.count ?? 0;
		// What was washed before the forecast begins has dried or shows in its first film.
		const dried = slot < 0 ? -Infinity : slot >= end ? Infinity : driesOnAll(slot);
		// A later washing starts from another temperature; it is never through sooner.
		if (dried < Infinity) latestSoFar = Math.max(latestSoFar, dried);
		return dried < Infinity ? latestSoFar : Infinity;
	});
	return { from, to, earliest, latest: new Float64Array(earliest.length).fill(Infinity) };
}
