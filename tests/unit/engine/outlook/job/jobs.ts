import type { Step } from '../../../../../src/lib/engine/outlook/hours/step';
import type { Job, JobStep } from '../../../../../src/lib/engine/outlook/job/job';
import { jobOutlook } from '../../../../../src/lib/engine/outlook/job/jobOutlook';
import type { Forecast } from '../../../../../src/lib/engine/outlook/weather/forecast';
import { yardWeather } from '../../../../../src/lib/engine/outlook/weather/yardWeather';
import { COAT, forecastOf, HOUR, SITE, START, TOPSIDES } from '../flatWeather';

export const FACE = { id: 'port', face: TOPSIDES, shelter: 'open' } as const;
export const OTHER_FACE = {
	id: 'starboard',
	face: { ...TOPSIDES, azimuth: 270 },
	shelter: 'open'
} as const;

/** A coat with constant times in hours, workable in any weather, by day. */
export const coat = (
	times: Partial<
		Record<'touchDry' | 'overcoatMin' | 'overcoatMax' | 'launchMin' | 'launchMax', number | null>
	>,
	more: Partial<Step> = {}
): Step => ({
	...COAT,
	durationMinutes: 120,
	workHours: [{ days: [1, 2, 3, 4, 5, 6, 7], from: '09:00', to: '17:00' }],
	times: Object.fromEntries(
		Object.entries(times).map(([name, hours]) => [name, hours === null ? null : hours * 60])
	),
	...more
});

export const on = (step: Step, more: Partial<JobStep> = {}): JobStep => ({
	step,
	faces: [FACE],
	...more
});

/** Hours after START (01:00 on the yard's clock of the first day) as an instant. */
export const at = (hours: number): number => START + hours * HOUR;

/** An instant as hours after START. */
export const hoursOf = (instant: number | null | undefined): number | null =>
	instant === null || instant === undefined ? null : (instant - START) / HOUR;

export function outlookOf(
	steps: readonly JobStep[],
	launch: Job['launch'] = {},
	{ forecast = forecastOf({}, 121), from = START }: { forecast?: Forecast; from?: number } = {}
) {
	const yard = yardWeather({ site: SITE, forecast, looseSand: null });
	return jobOutlook(yard, { steps, launch }, { from });
}

/** Starts of a plan's steps in hours after START; null without a plan. */
export const startsOf = (
	plan: { steps: readonly { start: number }[] } | null
): (number | null)[] | null =>
	plan === null ? null : plan.steps.map(({ start }) => hoursOf(start));
