import type { JobStepView, StepState } from '../../api/jobs';
import { mayDo } from '../access/roles';
import type { Role } from '../db/schema';
import { isYardOnly, movesOf } from './stepState';

/** What somebody of a role may do to a step now. */
export function movesOfView(step: JobStepView, role: Role): readonly StepState[] {
	if (!mayDo(role, 'queueWork')) return [];
	if (isYardOnly(step.task) && !mayDo(role, 'yardWork')) return [];
	return movesOf(step.state, step.kind);
}
