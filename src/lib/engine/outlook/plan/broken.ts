import { LIMITERS, type Limiter } from '../../vocabulary';
import type { StepHours } from '../hours/result';
import { POSITION_ROUNDING, within } from './chain';
import { gapsOf } from './gaps';
import { fixedStart } from './candidates';
import type { PlanStep } from './planStep';

/** A step of a plan that no longer holds, and why: a limiter, or outside the window of the step before. */
export interface BrokenStep {
	readonly step: number;
	readonly why: Limiter;
}

/** Whether a start is at one of the launch slots, where its step keeps to them. */
const keepsToSlots = ({ launchSlots }: PlanStep, start: number): boolean =>
	launchSlots?.some((slot) => Math.abs(slot - start) <= POSITION_ROUNDING) ?? true;

/**
 * What of a plan no longer holds in the forecast at hand: steps whose slots are no longer all
 * workable, launches whose slot is no longer stated (`hours`), and starts that now lie before or
 * after what the steps before them allow. Empty where all of it holds. A plan that was taken is judged by this, and so is one moved by hand.
 *
 * @param places - slot positions of each step's start and finish
 */
export function brokenSteps(
	steps: readonly { readonly planStep: PlanStep; readonly hours: StepHours }[],
	places: readonly { readonly start: number; readonly finish: number }[]
): BrokenStep[] {
	const broken: BrokenStep[] = [];
	const placed = steps.map(({ planStep }, i): PlanStep => {
		const { start, finish } = places[i];
		const candidates = { ...fixedStart(start, finish), ready: planStep.candidates.ready };
		return planStep.isFixed ? planStep : { ...planStep, candidates };
	});
	steps.forEach(({ hours, planStep }, step) => {
		if (planStep.isFixed) return;
		const { start, finish } = places[step];
		if (!keepsToSlots(planStep, start)) {
			broken.push({ step, why: 'hours' });
			return;
		}
		const end = Math.ceil(finish - POSITION_ROUNDING);
		for (let slot = Math.floor(start + POSITION_ROUNDING); slot < end; slot++) {
			if (hours.state[slot] !== 0) continue;
			broken.push({ step, why: LIMITERS[hours.limiter[slot] ?? 0] });
			return;
		}
	});
	for (const { from, to, earliest, latest } of gapsOf(placed)) {
		const { start } = places[to];
		if (within(start, earliest[0], latest[0])) continue;
		const why = earliest[0] > start ? 'early' : 'late';
		if (!broken.some((it) => it.step === to && it.why === why) && from < to)
			broken.push({ step: to, why });
	}
	return broken.sort((a, b) => a.step - b.step);
}
