import type { OutlookRequest } from '../../api/outlook/request';
import type { OutlookResponse } from '../../api/outlook/response';
import {
	instantText,
	jobRemedies,
	SHELTERS,
	type JobOutlook,
	type Plan,
	type Warning,
	type YardWeather
} from '../../engine';

const instant = (seconds: number | null): string | null =>
	seconds === null ? null : instantText(seconds);

/** A plan as the answer tells it. */
export function tellPlan(plan: Plan | null): OutlookResponse['plans']['soonest'] {
	if (plan === null) return null;
	const { launchReady, slip } = plan;
	return {
		steps: plan.steps.map((it) => ({
			step: it.step,
			kind: it.kind,
			start: instantText(it.start),
			finish: instantText(it.finish),
			limiter: it.limiter,
			room: it.room,
			earliestNext: instant(it.earliestNext),
			latestNext: instant(it.latestNext)
		})),
		inserted: plan.inserted,
		holdChance: plan.holdChance,
		launchReady: {
			earliest: instant(launchReady.earliest),
			latest: instant(launchReady.latest),
			assumed: launchReady.isAssumed,
			closes: instant(launchReady.closes)
		},
		launch: instant(slip.launch),
		slipDays: slip.days,
		costOfSlip: slip.cost
	};
}

/** A warning as the answer tells it: every field there is, those it does not use null. */
export function tellWarning(warning: Warning): OutlookResponse['warnings'][number] {
	const told = { ...warning };
	return {
		code: warning.code,
		step: 'step' in told ? told.step : null,
		after: 'after' in told ? told.after : null,
		hours: 'hours' in told ? told.hours : null,
		hasStarts: 'hasStarts' in told ? told.hasStarts : null,
		slots: 'slots' in told ? told.slots : null,
		opens: instant('opens' in told ? told.opens : null),
		closes: instant('closes' in told ? told.closes : null),
		launch: instant('launch' in told ? told.launch : null),
		launchBy: instant('launchBy' in told ? told.launchBy : null),
		readyAt: instant('readyAt' in told ? told.readyAt : null)
	};
}

/** What would open the shut runs of each step that is not yet fixed, between two bounds. */
export function tellRemedies(
	yard: YardWeather,
	outlook: JobOutlook,
	{ shelter, shelters }: OutlookRequest,
	from: number,
	end: number
): OutlookResponse['remedies'] {
	const stock = (shelters ?? SHELTERS).filter((name) => name !== shelter && name !== 'open');
	return jobRemedies(yard, outlook, { shelters: stock, from, end }).map(({ step, ...remedy }) => ({
		code: remedy.code,
		step,
		from: instantText(remedy.from),
		to: instantText(remedy.to),
		limiter: remedy.limiter,
		gainMinutes: remedy.gainMinutes,
		opensFrom: instant(remedy.opensFrom),
		opensTo: instant(remedy.opensTo),
		shelter: remedy.shelter,
		method: remedy.method,
		assumed: remedy.isAssumed
	}));
}
