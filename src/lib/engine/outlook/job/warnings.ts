import { SLOT_SECONDS } from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';
import { workedSlots } from '../plan/candidates';
import { chosenLaunch, instantAt, positionOf } from '../plan/launch';
import { launchTable } from '../plan/launchReady';
import { firstOutOfReach } from '../plan/objectives';
import { gapsOf } from '../plan/gaps';
import type { Plans } from '../plan/plan';
import { isCoat, type PlanStep } from '../plan/planStep';
import { placeInWindow, startWindow } from '../plan/window';
import type { Job } from './job';
import type { StepOutlook } from './stepOutlook';

/**
 * What a person must be told of a job's outlook, with the numbers a sentence needs. Steps are
 * indices of the job; instants UTC epoch seconds.
 */
export type Warning =
	/** No workable start lies in the window that the step before leaves. */
	| {
			readonly code: 'noStretchInWindow';
			readonly step: number;
			readonly after: number;
			readonly opens: number | null;
			readonly closes: number | null;
	  }
	/** Few workable hours are left in that window. */
	| {
			readonly code: 'fewHoursLeft';
			readonly step: number;
			readonly after: number;
			readonly hours: number;
			readonly closes: number;
	  }
	/** No plan fits into the forecast; the step at which it breaks, and whether it has any start at all. */
	| { readonly code: 'nothingFits'; readonly step: number; readonly hasStarts: boolean }
	/** No plan is launch-ready for the launch aimed at; the soonest is ready then. */
	| {
			readonly code: 'nothingBeforeLaunch';
			readonly launch: number;
			readonly readyAt: number | null;
	  }
	/** Launch slots are stated, none in time. */
	| { readonly code: 'noLaunchSlot'; readonly launchBy: number }
	/** None of the launch slots ahead, inside the forecast, is workable for the launch itself. */
	| { readonly code: 'launchSlotsShut'; readonly step: number; readonly slots: number }
	/** The first launch the soonest plan can make is later than its last coat may stand ashore. */
	| { readonly code: 'ashoreTooLong'; readonly launch: number; readonly closes: number }
	/** A recoat window is missed: the plan puts an abrading in before this step. */
	| { readonly code: 'abradingPutIn'; readonly step: number }
	/** The sheet says nothing of how late the next coat may come. */
	| { readonly code: 'silentMaximum'; readonly step: number }
	/** The sheet says nothing of when the boat may go in. */
	| { readonly code: 'silentLaunch'; readonly step: number }
	/** The sheet states no drying time: every hour is shut for it. */
	| { readonly code: 'silentDrying'; readonly step: number };
export const WARNING_CODES = [
	'noStretchInWindow',
	'fewHoursLeft',
	'nothingFits',
	'nothingBeforeLaunch',
	'noLaunchSlot',
	'launchSlotsShut',
	'ashoreTooLong',
	'abradingPutIn',
	'silentMaximum',
	'silentLaunch',
	'silentDrying'
] as const satisfies Warning['code'][];

/** Workable hours in a recoat window under which it is told (common practice). */
const FEW_HOURS = 12;
const HOURS_PER_SLOT = SLOT_SECONDS / 3600;

/** The first step that no way through the job reaches; null where one goes through. */
function breakOf(steps: readonly PlanStep[]): number | null {
	return firstOutOfReach({ steps: steps.map((it) => it.candidates), gaps: gapsOf(steps) });
}

/** Whether a slot is worked from one of some starts. */
const isWorked = (slot: number, starts: Float64Array, duration: number): boolean =>
	starts.some((start) => {
		const { first, end } = workedSlots(start, start + duration);
		return first <= slot && slot < end;
	});

/** Launches that keep to slots, of which none is workable. */
function shutSlots(
	{ weather: { grid, knownTo } }: YardWeather,
	outlooks: readonly StepOutlook[],
	from: number
): Warning[] {
	return outlooks.flatMap(({ planStep }, step): Warning[] => {
		const { launchSlots, isFixed, candidates } = planStep;
		if (isFixed || launchSlots === null || candidates.start.length > 0) return [];
		const notBefore = positionOf(grid, from);
		const ahead = launchSlots.filter((slot) => slot >= notBefore && slot < knownTo);
		return [{ code: 'launchSlotsShut', step, slots: ahead.length }];
	});
}

function windowWarnings(
	{ weather: { grid } }: YardWeather,
	outlooks: readonly StepOutlook[],
	firstSlot: number
): Warning[] {
	const steps = outlooks.map((it) => it.planStep);
	return outlooks.flatMap(({ hours }, step): Warning[] => {
		// A step waits on what is fixed only where all before it are.
		if (steps[step].isFixed || !steps.slice(0, step).every((it) => it.isFixed)) return [];
		const window = startWindow(steps, step);
		if (window === null || !Number.isFinite(window.closes)) return [];
		const { duration, candidates, launchSlots } = steps[step];
		const inside = candidates.start.filter(
			(start) => start >= window.opens - 1e-6 && start <= window.closes + 1e-6
		);
		if (inside.length === 0)
			return [
				{
					code: 'noStretchInWindow',
					step,
					after: window.closedBy,
					opens: instantAt(grid, window.opens),
					closes: instantAt(grid, window.closes)
				}
			];
		let workable = 0;
		for (let slot = Math.max(0, firstSlot); slot < hours.state.length; slot++)
			if (
				hours.state[slot] !== 0 &&
				placeInWindow(window, slot, duration) === 'inside' &&
				(launchSlots === null || isWorked(slot, inside, duration))
			)
				workable++;
		const left = workable * HOURS_PER_SLOT;
		const closes = instantAt(grid, window.closes);
		return left < FEW_HOURS && closes !== null
			? [{ code: 'fewHoursLeft', step, after: window.closedBy, hours: left, closes }]
			: [];
	});
}

function silences(job: Job): Warning[] {
	return job.steps.flatMap(({ step }, index): Warning[] => {
		if (!isCoat(step.kind)) return [];
		const isFollowed = job.steps.slice(index + 1).some((it) => isCoat(it.step.kind));
		return [
			...(isFollowed && step.times.overcoatMax === undefined
				? [{ code: 'silentMaximum', step: index } as const]
				: []),
			...(step.times.launchMin === undefined && launchTable(step) !== null
				? [{ code: 'silentLaunch', step: index } as const]
				: [])
		];
	});
}

function launchWarnings(job: Job, plans: Plans): Warning[] {
	const { launchBy } = job.launch;
	const launch = chosenLaunch(job.launch);
	const first = plans.soonest;
	const closes = first?.launchReady.closes ?? null;
	const goesIn = first?.slip.launch ?? null;
	return [
		...(launchBy !== undefined && launch === null
			? [{ code: 'noLaunchSlot', launchBy } as const]
			: []),
		...(launch !== null && plans.byDate === null
			? [
					{
						code: 'nothingBeforeLaunch',
						launch,
						readyAt: first?.launchReady.latest ?? null
					} as const
				]
			: []),
		...(closes !== null && goesIn !== null && goesIn > closes
			? [{ code: 'ashoreTooLong', launch: goesIn, closes } as const]
			: [])
	];
}

/**
 * The warnings of a job, in the order of what is lost first.
 *
 * @param from - UTC epoch seconds; no start before it
 */
export function warningsOf(
	yard: YardWeather,
	job: Job,
	outlooks: readonly StepOutlook[],
	plans: Plans,
	from: number
): Warning[] {
	const firstSlot = Math.ceil(positionOf(yard.weather.grid, from) - 1e-9);
	const breaksAt = plans.soonest === null ? breakOf(outlooks.map((it) => it.planStep)) : null;
	const putIn = (plans.soonest?.steps ?? []).flatMap(({ step }, i, all): Warning[] => {
		const next = all[i + 1]?.step ?? null;
		return step === null && next !== null ? [{ code: 'abradingPutIn', step: next }] : [];
	});
	return [
		...outlooks.flatMap(({ hours }, step): Warning[] =>
			hours.silentDrying ? [{ code: 'silentDrying', step }] : []
		),
		...windowWarnings(yard, outlooks, firstSlot),
		...shutSlots(yard, outlooks, from),
		...(breaksAt === null
			? []
			: [
					{
						code: 'nothingFits',
						step: breaksAt,
						hasStarts: outlooks[breaksAt].planStep.candidates.start.length > 0
					} as const
				]),
		...putIn,
		...launchWarnings(job, plans),
		...silences(job)
	];
}
