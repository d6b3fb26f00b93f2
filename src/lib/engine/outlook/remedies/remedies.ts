import { defaultWind, METHOD_WIND_LIMITS } from '../../coating/methodWind';
import { METHODS, SHELTERS, type Limiter, type Method, type ShelterName } from '../../vocabulary';
import { runsOf, stepHours, type HoursOptions, type HoursRun } from '../hours/stepHours';
import type { StepHours } from '../hours/result';
import type { Step } from '../hours/step';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import type { Remedy } from './remedy';
import { neededSlots, nextWork, usableSlots, type KeptStarts } from './usable';

const SLOT_MINUTES = SLOT_SECONDS / 60;
const DAY_SLOTS = 86_400 / SLOT_SECONDS;

/** Runs that no shelter, method or waiting of hours opens: the clock, the dark, what is not known. */
const NO_REMEDY: readonly Limiter[] = ['none', 'hours', 'dark', 'noData', 'early', 'late'];

/** What the step would meet otherwise: hours with one thing changed. */
interface Alternative {
	/** 1 for slots that would be of use. */
	readonly usable: Uint8Array;
	readonly shelter: ShelterName | null;
	readonly method: Method | null;
	readonly isAssumed: boolean;
}

export interface RemedyInput {
	readonly step: Step;
	readonly conditions: readonly FaceConditions[];
	readonly site: Site;
	readonly hours: StepHours;
	readonly options: HoursOptions;
	/** Shelters the yard has beyond the one that stands, with what the step's faces meet under each. */
	readonly shelters: readonly {
		readonly shelter: ShelterName;
		readonly conditions: readonly FaceConditions[];
	}[];
	/** The starts it keeps to, where it does. */
	readonly kept: KeptStarts | null;
	/** Shut runs told, from the first on. */
	readonly mostRuns: number;
	/** Slots [from, to) to answer for. */
	readonly from: number;
	readonly to: number;
}

/** The step laid by another method, with the usual wind limits of it where they are wider. */
function otherMethods({ step, conditions, site, options, kept }: RemedyInput): Alternative[] {
	const own = step.method === 'none' ? null : METHOD_WIND_LIMITS[step.method];
	if (own === null || (step.limits.wind === undefined && step.limits.gust === undefined)) return [];
	return METHODS.flatMap((method): Alternative[] => {
		if (method === 'none' || method === step.method) return [];
		const usual = defaultWind(method, null);
		if (usual === null || usual.gust <= own.gust) return [];
		const limits = {
			...step.limits,
			wind: { max: Math.max(usual.stop, step.limits.wind?.max ?? 0) },
			gust: { max: Math.max(usual.gust, step.limits.gust?.max ?? 0) }
		};
		const hours = stepHours({ ...step, method, limits }, conditions, site, options);
		return [{ usable: usableSlots(hours, kept), shelter: null, method, isAssumed: true }];
	});
}

function otherShelters({ step, site, shelters, options, kept }: RemedyInput): Alternative[] {
	// Usual errors are those of the open face: what a shelter does to them nobody has measured.
	return [...shelters]
		.sort((a, b) => SHELTERS.indexOf(a.shelter) - SHELTERS.indexOf(b.shelter))
		.map(({ shelter, conditions }) => ({
			usable: usableSlots(stepHours(step, conditions, site, options), kept),
			shelter,
			method: null,
			isAssumed: false
		}));
}

/** Remedies of the shut runs of a step's hours, run by run, the least trouble first. */
export function remediesOf(input: RemedyInput): Remedy[] {
	const { hours, conditions, kept, mostRuns, from, to } = input;
	const { grid } = conditions[0].weather;
	const at = (position: number): number => Math.round(grid.start + position * SLOT_SECONDS);
	const needed = neededSlots(grid.count, kept);
	const runs = runsOf(hours, from, to)
		.filter(
			(run) =>
				run.state === 'shut' &&
				!NO_REMEDY.includes(run.limiter) &&
				needed.subarray(run.from, run.to).includes(1)
		)
		.slice(0, mostRuns);
	if (runs.length === 0) return [];
	const alternatives = [...otherMethods(input), ...otherShelters(input)];
	return runs.flatMap((run) => {
		const told = {
			from: at(run.from),
			to: at(run.to),
			limiter: run.limiter,
			shelter: null,
			method: null,
			isAssumed: false
		};
		return [
			{ ...told, ...waiting(input, run, at) },
			...alternatives
				.filter(({ method }) => method === null || run.limiter === 'wind')
				.map(({ usable, shelter, method, isAssumed }) => ({
					...told,
					...opened(usable, run, at),
					code: method === null ? ('shelter' as const) : ('method' as const),
					shelter,
					method,
					isAssumed
				}))
		];
	});
}

type Gain = Pick<Remedy, 'code' | 'gainMinutes' | 'opensFrom' | 'opensTo'>;

/** The slots of a shut run that would be of use otherwise. */
function opened(
	usable: Uint8Array,
	run: HoursRun,
	at: (position: number) => number
): Omit<Gain, 'code'> {
	let slots = 0;
	let first = -1;
	let last = -1;
	for (let slot = run.from; slot < run.to; slot++) {
		if (usable[slot] === 0) continue;
		slots++;
		if (first < 0) first = slot;
		last = slot;
	}
	return {
		gainMinutes: slots * SLOT_MINUTES,
		opensFrom: first < 0 ? null : at(first),
		opensTo: last < 0 ? null : at(last + 1)
	};
}

/** Waiting: the next stretch, or start kept to, within a day of the run's end. */
function waiting(
	{ hours, kept }: RemedyInput,
	run: HoursRun,
	at: (position: number) => number
): Gain {
	const code = run.limiter === 'wet' || run.limiter === 'frost' ? 'dry' : 'wait';
	const next = nextWork(hours, kept, run.to, run.to + DAY_SLOTS);
	return next === null
		? { code, gainMinutes: 0, opensFrom: null, opensTo: null }
		: {
				code,
				gainMinutes: (next.to - next.from) * SLOT_MINUTES,
				opensFrom: at(next.from),
				opensTo: at(next.to)
			};
}
