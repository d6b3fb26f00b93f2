import { eq } from 'drizzle-orm';
import type { StepMove, StepState } from '../../api/jobs';
import { taskOf, WET_STEP_KINDS, type StepKind, type TaskCode } from '../../engine';
import { STATE_WORDS } from '../../sentences/stepStates';
import { mayDo, type Membership } from '../access/roles';
import { changeRow } from '../db/changeRow';
import type { Database } from '../db/client';
import { steps, type StepRow } from '../db/schema';
import { visibleJob } from './jobView';
import { refused, type Outcome } from './outcome';

/** Where a step may go from each state. Going back is for what was said by mistake: the record keeps both. */
const MOVES: Readonly<Record<StepState, readonly StepState[]>> = {
	queued: ['underWay', 'done', 'dropped'],
	underWay: ['curing', 'done', 'queued'],
	curing: ['done', 'underWay'],
	done: ['queued'],
	dropped: ['queued']
};

/** The states a step of a kind may go to. Only what is laid wet cures, and it does so before it is done. */
export function movesOf(state: StepState, kind: StepKind): readonly StepState[] {
	const cures = WET_STEP_KINDS.includes(kind);
	return MOVES[state].filter((to) =>
		to === 'curing' ? cures : !(to === 'done' && state === 'underWay' && cures)
	);
}

export const isYardOnly = (task: TaskCode | null): boolean =>
	task !== null && taskOf(task).isYardOnly === true;

/** A step's times in the state it goes to; a sentence where they cannot be. */
function timesIn(
	step: StepRow,
	to: StepState,
	at: Date
): Pick<StepRow, 'startedAt' | 'finishedAt'> | string {
	switch (to) {
		case 'queued':
		case 'dropped':
			return { startedAt: null, finishedAt: null };
		case 'underWay':
			return step.state === 'curing'
				? { startedAt: step.startedAt, finishedAt: null }
				: { startedAt: at, finishedAt: null };
		case 'curing':
		case 'done': {
			if (step.state === 'curing')
				return { startedAt: step.startedAt, finishedAt: step.finishedAt };
			const startedAt = step.startedAt ?? new Date(at.getTime() - step.durationMinutes * 60_000);
			if (at <= startedAt) return 'It cannot have ended before it began.';
			return { startedAt, finishedAt: at };
		}
	}
}

/** Clocks of phones and servers differ by less. */
const CLOCKS_DIFFER_MS = 5 * 60_000;

/** Takes a step from one state to another, with the time it was. */
export function moveStep(
	db: Database,
	membership: Membership,
	stepId: string,
	{ revision, to, at }: StepMove,
	now: Date
): Promise<Outcome> {
	return db.transaction(async (tx): Promise<Outcome> => {
		const [step] = await tx.select().from(steps).where(eq(steps.id, stepId));
		if (step === undefined || (await visibleJob(tx, membership, step.jobId)) === null)
			return { outcome: 'gone' };
		if (isYardOnly(step.task) && !mayDo(membership.role, 'yardWork'))
			return refused(
				`“${step.name}” is work of the yard’s own people: its manager says how it goes.`
			);
		const when = at === undefined ? now : new Date(at);
		if (when.getTime() > now.getTime() + CLOCKS_DIFFER_MS)
			return refused('That time is still to come.', 'at');
		if (step.revision === revision && !movesOf(step.state, step.kind).includes(to))
			return refused(
				`“${step.name}” is ${STATE_WORDS[step.state]}: it cannot become ${STATE_WORDS[to]}.`
			);
		const times = timesIn(step, to, when);
		if (typeof times === 'string') return refused(times, 'at');
		const changed = await changeRow(tx, steps, stepId, revision, {
			state: to,
			updatedAt: now,
			...times
		});
		return changed.outcome === 'changed' ? { outcome: 'done' } : changed;
	});
}
