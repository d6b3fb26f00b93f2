import type { OutlookResponse } from '../api/outlook/response';
import { dateAndClock } from '../time/zone';
import { counted } from './words';

type Warning = OutlookResponse['warnings'][number];

/**
 * What a warning of a job's outlook says to a person. `steps` are the names of the job's steps, in
 * order; times are in the yard's zone.
 */
export function warningSentence(
	warning: Warning,
	steps: readonly string[],
	timeZone: string
): string {
	const named = (index: number | null): string =>
		index === null || steps[index] === undefined ? 'the step' : steps[index];
	const at = (instant: string | null): string =>
		instant === null ? 'a time past the forecast' : dateAndClock(instant, timeZone);
	const step = named(warning.step);
	switch (warning.code) {
		case 'noStretchInWindow':
			return `No hour is open for ${step} in the recoat window of ${named(warning.after)}, from ${at(warning.opens)} to ${at(warning.closes)}.`;
		case 'fewHoursLeft':
			return `Only ${counted(Math.floor(warning.hours ?? 0), 'open hour')} are left for ${step} before the recoat window of ${named(warning.after)} closes at ${at(warning.closes)}.`;
		case 'nothingFits':
			return warning.hasStarts === true
				? `No plan fits the forecast: what comes before leaves no hour for ${step}.`
				: `No plan fits the forecast: it has no hour at all for ${step}.`;
		case 'nothingBeforeLaunch':
			return `No plan is ready for the launch at ${at(warning.launch)}. The soonest is ready at ${at(warning.readyAt)}.`;
		case 'noLaunchSlot':
			return `The hoist has no launch slot before ${at(warning.launchBy)}.`;
		case 'launchSlotsShut':
			return warning.slots === 1
				? `The one launch slot ahead is shut for ${step}.`
				: `None of the ${warning.slots ?? 0} launch slots ahead is open for ${step}.`;
		case 'ashoreTooLong':
			return `The launch at ${at(warning.launch)} comes later than the last coat may stand ashore, ${at(warning.closes)}.`;
		case 'abradingPutIn':
			return `The recoat window before ${step} is missed: the plan abrades first.`;
		case 'silentMaximum':
			return `The sheet of ${step} does not say how late the next coat may come. Ask the tin’s maker.`;
		case 'silentLaunch':
			return `The sheet of ${step} does not say when the boat may go in. Ask the tin’s maker.`;
		case 'silentDrying':
			return `The sheet of ${step} states no drying time, so every hour is shut for it.`;
	}
}
