import { stepHours, durationSlotsOf } from '../hours/stepHours';
import type { StepHours } from '../hours/result';
import type { Step } from '../hours/step';
import { stepChances, type StepChances } from '../members/chances';
import { fixedStart, startsOf } from '../plan/candidates';
import { launchReadyAfter } from '../plan/launchReady';
import { launchPositions, positionOf, type LaunchWish } from '../plan/launch';
import { waitsForLaunchReady, type PlanStep } from '../plan/planStep';
import { SLOT_SECONDS } from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';
import type { FaceOutlook } from './faces';
import type { FaceUnder, JobStep } from './job';

/** A step of a job judged: its hours, its chances, and its place in a plan. */
export interface StepOutlook {
	readonly step: Step;
	readonly faces: readonly FaceOutlook[];
	readonly hours: StepHours;
	/** Null without members. */
	readonly chances: StepChances | null;
	readonly planStep: PlanStep;
}

/** Where a step works on no face (a lift, a launch): the yard's open air over a level surface. */
const OPEN_GROUND: FaceUnder = {
	id: '',
	face: { tilt: 0, azimuth: 0, solarAbsorptance: 0.5, emissivity: 0.9, material: 'grp' },
	shelter: 'open'
};

const SLOT_MINUTES = SLOT_SECONDS / 60;

/**
 * Judges steps of a yard, those alike once: hours and chances do not depend on what comes before.
 * A launch keeps to the slots of the wish, where it states any.
 */
export function stepOutlooks(
	yard: YardWeather,
	faceOf: (under: FaceUnder) => FaceOutlook,
	from: number,
	wish: LaunchWish = {}
) {
	const { site, weather } = yard;
	const judged = new Map<string, { hours: StepHours; chances: StepChances | null }>();
	const judge = (step: Step, faces: readonly FaceOutlook[], key: string) => {
		const before = judged.get(key);
		if (before !== undefined) return before;
		const sides = faces.flatMap((face) => face.sides);
		const errors = faces.flatMap((face) => face.errors);
		const hours = stepHours(step, sides, site, { errors, from });
		const chances =
			yard.members.length === 0
				? null
				: stepChances(
						step,
						yard.members.map((_, member) => faces.flatMap((face) => face.members[member])),
						site,
						durationSlotsOf(step.durationMinutes)
					);
		const result = { hours, chances };
		judged.set(key, result);
		return result;
	};
	const notBefore = positionOf(weather.grid, from);
	const slots = launchPositions(weather.grid, wish);
	return ({ step, faces: under, startAt, finishedAt }: JobStep): StepOutlook => {
		const faces = (under.length > 0 ? under : [OPEN_GROUND]).map(faceOf);
		// The name says nothing of the hours.
		const key = JSON.stringify([{ ...step, name: '' }, under]);
		const { hours, chances } = judge(step, faces, key);
		const isFixed = startAt !== undefined;
		const duration = step.durationMinutes / SLOT_MINUTES;
		const launchSlots = step.kind === 'launch' ? slots : null;
		const starts =
			startAt === undefined
				? startsOf(hours, chances, { notBefore, duration, only: launchSlots })
				: fixedStart(
						positionOf(weather.grid, startAt),
						finishedAt === undefined
							? positionOf(weather.grid, startAt) + duration
							: positionOf(weather.grid, finishedAt)
					);
		const ready = waitsForLaunchReady(step.kind)
			? new Float64Array(starts.start.length).fill(-Infinity)
			: launchReadyAfter(step, faces, starts.finish, 'shaded');
		return {
			step,
			faces,
			hours,
			chances,
			planStep: { step, faces, candidates: { ...starts, ready }, isFixed, duration, launchSlots }
		};
	};
}
