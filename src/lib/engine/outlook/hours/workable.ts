import type { Site } from '../weather/site';
import type { FaceConditions } from '../weather/slots';
import { applyLimits } from './applyLimits';
import type { ErrorSeries } from './errors';
import { nextMarked, stepMasks } from './judge';
import { markBroken } from './limit';
import { dryingIsSilent, phaseLimits, type ClockRates } from './phases';
import type { Step } from './step';

/**
 * 1 for slots in which a step may go on, and no more: the states of a judgement without their
 * rooms, for the many members of an ensemble. Runs shorter than the step count.
 *
 * @param errors - usual errors of the weather; only rooms depend on them, so any will do
 * @param rates - rates of the step's clocks
 */
export function workableSlots(
	step: Step,
	conditions: readonly FaceConditions[],
	site: Site,
	errors: ErrorSeries,
	rates: ClockRates
): Uint8Array {
	const { weather } = conditions[0];
	const { count } = weather.grid;
	const { knownFrom, knownTo } = weather;
	const shut = new Uint8Array(count);
	if (dryingIsSilent(step)) return shut;
	const { work, daylight } = stepMasks(step, site, weather.grid);
	const broken = new Uint8Array(count);
	conditions.forEach((face, index) => {
		for (const limit of applyLimits(step, face, index, site, errors)) markBroken(limit, shut);
		const { phases, wetEnds } = phaseLimits(step, face, index, errors, rates);
		for (let i = 0; i < count; i++) if (wetEnds[i] > knownTo) shut[i] = 1;
		for (const { limits, ends, needs } of phases) {
			broken.fill(0);
			for (const limit of limits) markBroken(limit, broken);
			if (needs !== null) for (let i = 0; i < count; i++) if (needs[i] !== needs[i]) broken[i] = 1;
			const next = nextMarked(broken);
			for (let i = 0; i < count; i++)
				if (next[i + 1] < (ends[i] < knownTo ? ends[i] : knownTo)) shut[i] = 1;
		}
	});
	const workable = new Uint8Array(count);
	const end = Math.min(count, knownTo);
	for (let i = Math.max(0, knownFrom); i < end; i++)
		if (!shut[i] && (work === null || work[i]) && (daylight === null || daylight[i]))
			workable[i] = 1;
	return workable;
}
