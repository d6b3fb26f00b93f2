import {
	methodLimits,
	taskOf,
	timesBefore,
	type CoatingType,
	type Limits,
	type Sheet,
	type Times
} from '../../engine';
import type { StepRow } from '../db/schema';

/**
 * Limits and times of a step: its sheet's, with the most wind of its method and the overcoat times
 * toward the very coat that follows; without a sheet those of its rule of work; over both what
 * the step says of its own, key by key.
 *
 * @param next - kind of the coat that follows on one of its faces; null where none does
 */
export function stepRules(
	step: Pick<StepRow, 'method' | 'task' | 'limits' | 'times'>,
	sheet: Sheet | null,
	next: CoatingType | null
): { limits: Limits; times: Times } {
	const task = step.task === null ? null : taskOf(step.task);
	const given =
		sheet === null
			? { limits: task?.limits, times: task?.times }
			: { limits: methodLimits(sheet, step.method).limits, times: timesBefore(sheet, next).times };
	return {
		limits: { ...given.limits, ...step.limits },
		times: { ...given.times, ...step.times }
	};
}
