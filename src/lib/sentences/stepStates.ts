import type { StepState } from '../api/jobs';

/** The state of a step in a word or two. */
export const STATE_WORDS: Readonly<Record<StepState, string>> = {
	queued: 'queued',
	underWay: 'under way',
	curing: 'curing',
	done: 'done',
	dropped: 'dropped'
};
