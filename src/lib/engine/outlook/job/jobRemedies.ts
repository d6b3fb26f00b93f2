import type { ShelterName } from '../../vocabulary';
import { faceConditions } from '../face/conditions';
import { withReadings } from '../face/readings';
import { positionOf } from '../plan/launch';
import type { Remedy } from '../remedies/remedy';
import { remediesOf } from '../remedies/remedies';
import type { FaceConditions } from '../weather/slots';
import type { YardWeather } from '../weather/yardWeather';
import type { JobOutlook } from './jobOutlook';
import type { StepOutlook } from './stepOutlook';

export interface RemedyOptions {
	/** Shelters that could be put up, beyond those that stand. */
	readonly shelters: readonly ShelterName[];
	/** UTC epoch seconds: runs from here on. */
	readonly from: number;
	/** Runs up to this slot; the grid's end where absent. */
	readonly end?: number;
}

/** Shut runs told of a job, shared among its steps, and of a step at the least. */
const MOST_RUNS = 96;
const FEWEST_RUNS = 4;

/**
 * What would open the shut runs of each step of a job that is not fixed, step by step: of each the
 * first runs from an instant on, of which a job tells so many in all. Steps alike are worked out
 * once.
 */
export function jobRemedies(
	yard: YardWeather,
	{ steps }: JobOutlook,
	{ shelters, from, end }: RemedyOptions
): (Remedy & { readonly step: number })[] {
	const { weather, site } = yard;
	const notBefore = positionOf(weather.grid, from);
	const free = steps.filter(({ planStep }) => !planStep.isFixed);
	const mostRuns = Math.max(FEWEST_RUNS, Math.floor(MOST_RUNS / Math.max(1, free.length)));
	const known = new Map<string, FaceConditions[]>();
	const under = (outlook: StepOutlook, shelter: ShelterName): FaceConditions[] =>
		outlook.faces.flatMap(({ under: { face, readings = [] }, id, washedAt }) => {
			const key = `${id} ${shelter}`;
			const conditions =
				known.get(key) ??
				faceConditions(weather, site, face, shelter, washedAt).map((it) =>
					withReadings(it, readings)
				);
			known.set(key, conditions);
			return conditions;
		});
	const remediesOfStep = (outlook: StepOutlook): Remedy[] => {
		const { launchSlots, duration } = outlook.planStep;
		const stands = outlook.faces.map((face) => face.under.shelter);
		return remediesOf({
			step: outlook.step,
			conditions: outlook.faces.flatMap((face) => face.sides),
			site,
			hours: outlook.hours,
			options: { errors: outlook.faces.flatMap((face) => face.errors), from },
			shelters: shelters
				.filter((shelter) => !stands.includes(shelter))
				.map((shelter) => ({ shelter, conditions: under(outlook, shelter) })),
			kept:
				launchSlots === null
					? null
					: { starts: launchSlots.filter((slot) => slot >= notBefore), duration },
			mostRuns,
			from: Math.max(0, Math.ceil(notBefore - 1e-9)),
			to: end ?? weather.grid.count
		});
	};
	// Judged once where steps are alike: the same hours stand for all of them.
	const told = new Map<StepOutlook['hours'], Remedy[]>();
	return steps.flatMap((outlook, step) => {
		if (outlook.planStep.isFixed) return [];
		const remedies = told.get(outlook.hours) ?? remediesOfStep(outlook);
		told.set(outlook.hours, remedies);
		return remedies.map((remedy) => ({ ...remedy, step }));
	});
}
