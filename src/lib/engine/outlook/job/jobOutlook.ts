import type { UsualErrors } from '../hours/step';
import { yardErrors } from '../members/memberErrors';
import type { Plans } from '../plan/plan';
import { plansOf } from '../plan/plans';
import type { YardWeather } from '../weather/yardWeather';
import { faceOutlooks } from './faces';
import type { Job } from './job';
import { stepOutlooks, type StepOutlook } from './stepOutlook';
import { warningsOf, type Warning } from './warnings';

export interface JobOptions {
	/** UTC epoch seconds; no start before it. */
	readonly from: number;
	/** Instead of the default usual errors; the members' spread replaces either. */
	readonly usualErrors?: UsualErrors;
}

/** A job judged: the hours and chances of each step, the plans of all of them, what to be told. */
export interface JobOutlook {
	readonly steps: readonly StepOutlook[];
	readonly plans: Plans;
	readonly warnings: readonly Warning[];
}

const remembered = new WeakMap<YardWeather, ReturnType<typeof yardErrors>>();

function errorsOfYard(yard: YardWeather, usualErrors?: UsualErrors) {
	if (usualErrors !== undefined) return yardErrors(yard, usualErrors);
	const errors = remembered.get(yard) ?? yardErrors(yard);
	remembered.set(yard, errors);
	return errors;
}

/** When logged washings of a face were done, UTC epoch seconds. */
function washesOf({ steps }: Job, faceId: string): number[] {
	return steps.flatMap(({ step, faces, finishedAt }) =>
		step.kind === 'wash' && finishedAt !== undefined && faces.some(({ id }) => id === faceId)
			? [finishedAt]
			: []
	);
}

/**
 * The outlook of one job in a yard's weather: on one series or on one and its members alike. What
 * the members of its faces meet is worked out here and let go with the result, so that a whole
 * yard is run job by job in little memory.
 */
export function jobOutlook(
	yard: YardWeather,
	job: Job,
	{ from, usualErrors }: JobOptions
): JobOutlook {
	const faces = faceOutlooks(yard, errorsOfYard(yard, usualErrors), (id) => washesOf(job, id));
	const judge = stepOutlooks(yard, faces, from, job.launch);
	const steps = job.steps.map(judge);
	const plans = plansOf(yard, job, steps, judge);
	return { steps, plans, warnings: warningsOf(yard, job, steps, plans, from) };
}
