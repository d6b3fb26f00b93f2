import { errorSeries } from '../hours/errors';
import type { Step } from '../hours/step';
import { workableSlots } from '../hours/workable';
import type { Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';

/** In how many members of the ensemble a step may go on. */
export interface StepChances {
	readonly members: number;
	/** Members in which each slot is workable, in a run long enough for the step. */
	readonly slots: Uint16Array;
	/** Members in which the step can be begun in each slot and go on to its end. */
	readonly starts: Uint16Array;
	/** 1 per workable slot, per member: for the joint chance of a plan. */
	readonly masks: readonly Uint8Array[];
}

/**
 * Members in which a step can go on, slot by slot and start by start. A member in which a needed
 * value is missing counts as one in which it cannot.
 *
 * @param conditions - what each face meets, per member; one list of faces a member
 */
export function stepChances(
	step: Step,
	conditions: readonly (readonly FaceConditions[])[],
	site: Site,
	durationSlots: number
): StepChances {
	const count = conditions[0]?.[0].weather.grid.count ?? 0;
	const slots = new Uint16Array(count);
	const starts = new Uint16Array(count);
	const masks = conditions.map((faces) => {
		const mask = workableSlots(step, faces, site, errorSeries(faces[0].weather));
		countRuns(mask, durationSlots, slots, starts);
		return mask;
	});
	return { members: conditions.length, slots, starts, masks };
}

/** Takes out of a mask the runs shorter than a step, and counts what is left. */
function countRuns(
	mask: Uint8Array,
	durationSlots: number,
	slots: Uint16Array,
	starts: Uint16Array
): void {
	let from = 0;
	for (let i = 0; i <= mask.length; i++) {
		if (i < mask.length && mask[i] === 1) continue;
		if (i - from < durationSlots) mask.fill(0, from, i);
		for (let slot = from; slot < i; slot++) {
			if (mask[slot] === 0) continue;
			slots[slot]++;
			if (slot + durationSlots <= i) starts[slot]++;
		}
		from = i + 1;
	}
}
