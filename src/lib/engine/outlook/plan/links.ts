import { asksNoWait, type TimeTable } from '../../coating/times';
import { launchTable } from './launchReady';
import { clearsMaximum, isCoat, waitsForLaunchReady, type PlanStep } from './planStep';

/**
 * What the steps of a job ask of each other, face by face. Work goes on and comes back in the same
 * order, so the earliest next start counts from the finish before, the latest on both strokes:
 * start to start and finish to finish. Other steps between two coats do not stop the clock; one
 * that clears the surface ends the maximum and starts its own `coatWithin`.
 */
export interface Link {
	/** Indices of the steps. */
	readonly from: number;
	readonly to: number;
	/** Index of the face among those of `from`. */
	readonly face: number;
	/** `earliest`: not before the clock is done; `latest`: not after. */
	readonly side: 'earliest' | 'latest';
	readonly table: Exclude<TimeTable, null>;
	/** The maximum of a recoat window, which abrading in between would clear. */
	readonly isMaximum: boolean;
}

/** The table by which the next coat waits: overcoat min, else touch dry; undefined where silent. */
export function overcoatTable({ step: { times } }: Pick<PlanStep, 'step'>): TimeTable | undefined {
	return times.overcoatMin === undefined ? times.touchDry : times.overcoatMin;
}

/** The table by which abrading waits: dry to sand, else touch dry. */
function sandTable({ step: { times } }: PlanStep): TimeTable | undefined {
	return times.dryToSand === undefined ? times.touchDry : times.dryToSand;
}

const indexOfFace = (step: PlanStep, id: string): number =>
	step.faces.findIndex((face) => face.id === id);

/** Index of the last step before one that does something on a face; −1 without. */
function lastBefore(
	steps: readonly PlanStep[],
	before: number,
	faceId: string,
	does: (step: PlanStep) => boolean
): number {
	for (let i = before - 1; i >= 0; i--)
		if (does(steps[i]) && indexOfFace(steps[i], faceId) >= 0) return i;
	return -1;
}

/** What the steps before one ask of it on one face. */
function linksOnFace(steps: readonly PlanStep[], to: number, id: string): Link[] {
	const links: Link[] = [];
	const ask = (
		from: number,
		side: Link['side'],
		table: TimeTable | undefined,
		isMaximum = false
	): void => {
		if (table === undefined || table === null) return;
		if (side === 'earliest' && asksNoWait(table)) return;
		links.push({ from, to, face: indexOfFace(steps[from], id), side, table, isMaximum });
	};
	const { kind } = steps[to].step;
	const coat = lastBefore(steps, to, id, (it) => isCoat(it.step.kind));
	if (coat >= 0 && clearsMaximum(kind)) ask(coat, 'earliest', sandTable(steps[coat]));
	if (!isCoat(kind)) return links;
	const cleared = lastBefore(steps, to, id, (it) => clearsMaximum(it.step.kind));
	if (coat >= 0) {
		ask(coat, 'earliest', overcoatTable(steps[coat]));
		if (cleared < coat) ask(coat, 'latest', steps[coat].step.times.overcoatMax, true);
	}
	for (let from = Math.max(coat + 1, cleared, 0); from < to; from++) {
		if (indexOfFace(steps[from], id) < 0 || isCoat(steps[from].step.kind)) continue;
		ask(from, 'latest', steps[from].step.times.coatWithin);
	}
	return links;
}

/** What the coats of a job ask of a step that waits for the boat to be launch-ready. */
function launchLinks(steps: readonly PlanStep[], to: number): Link[] {
	return steps.slice(0, to).flatMap((earlier, from) => {
		if (!isCoat(earlier.step.kind)) return [];
		const ready = launchTable(earlier.step);
		const closes = steps[to].step.kind === 'launch' ? earlier.step.times.launchMax : undefined;
		return earlier.faces.flatMap((_, face) => [
			...(ready === undefined || asksNoWait(ready)
				? []
				: [{ from, to, face, side: 'earliest', table: ready, isMaximum: false } as const]),
			...(closes === undefined || closes === null
				? []
				: [{ from, to, face, side: 'latest', table: closes, isMaximum: false } as const])
		]);
	});
}

/** Every link of a job's steps. Between two fixed steps there is none: what is fixed is kept. */
export function linksOf(steps: readonly PlanStep[]): Link[] {
	return steps
		.flatMap((target, to) => [
			...target.faces.flatMap(({ id }) => linksOnFace(steps, to, id)),
			...(waitsForLaunchReady(target.step.kind) ? launchLinks(steps, to) : [])
		])
		.filter(({ from, to }) => !(steps[from].isFixed && steps[to].isFixed));
}
