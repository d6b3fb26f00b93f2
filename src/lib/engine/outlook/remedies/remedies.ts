import { defaultWind, METHOD_WIND_LIMITS } from '../../coating/methodWind';
import {
	METHODS,
	SHELTERS,
	STATES,
	type Limiter,
	type Method,
	type ShelterName
} from '../../vocabulary';
import { runsOf, stepHours, type HoursOptions, type HoursRun } from '../hours/stepHours';
import type { StepHours } from '../hours/result';
import type { Step } from '../hours/step';
import type { Site } from '../weather/site';
import { SLOT_SECONDS, type FaceConditions } from '../weather/slots';
import type { Remedy } from './remedy';

const SHUT = STATES.indexOf('shut');
const SLOT_MINUTES = SLOT_SECONDS / 60;
const DAY_SLOTS = 86_400 / SLOT_SECONDS;

/** Runs that no shelter, method or waiting of hours opens: the clock, the dark, what is not known. */
const NO_REMEDY: readonly Limiter[] = ['none', 'hours', 'dark', 'noData', 'early', 'late'];

/** What the step would meet otherwise: hours with one thing changed. */
interface Alternative {
	readonly hours: StepHours;
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
	/** Slots [from, to) to answer for. */
	readonly from: number;
	readonly to: number;
}

/** The step laid by another method, with the usual wind limits of it where they are wider. */
function otherMethods({ step, conditions, site, options }: RemedyInput): Alternative[] {
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
		return [{ hours, shelter: null, method, isAssumed: true }];
	});
}

function otherShelters({ step, site, shelters, options }: RemedyInput): Alternative[] {
	// Usual errors are those of the open face: what a shelter does to them nobody has measured.
	return [...shelters]
		.sort((a, b) => SHELTERS.indexOf(a.shelter) - SHELTERS.indexOf(b.shelter))
		.map(({ shelter, conditions }) => ({
			hours: stepHours(step, conditions, site, options),
			shelter,
			method: null,
			isAssumed: false
		}));
}

/** Remedies of the shut runs of a step's hours, run by run, the least trouble first. */
export function remediesOf(input: RemedyInput): Remedy[] {
	const { hours, conditions, from, to } = input;
	const { grid } = conditions[0].weather;
	const at = (slot: number): number => grid.start + slot * SLOT_SECONDS;
	const runs = runsOf(hours, from, to).filter(
		({ state, limiter }) => state === 'shut' && !NO_REMEDY.includes(limiter)
	);
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
			{ ...told, ...waiting(hours, run, at) },
			...alternatives
				.filter(({ method }) => method === null || run.limiter === 'wind')
				.map(({ hours: other, shelter, method, isAssumed }) => ({
					...told,
					...opened(other, run, at),
					code: method === null ? ('shelter' as const) : ('method' as const),
					shelter,
					method,
					isAssumed
				}))
		];
	});
}

type Gain = Pick<Remedy, 'code' | 'gainMinutes' | 'opensFrom' | 'opensTo'>;

/** The slots of a shut run that other hours would have workable. */
function opened(other: StepHours, run: HoursRun, at: (slot: number) => number): Omit<Gain, 'code'> {
	let slots = 0;
	let first = -1;
	let last = -1;
	for (let slot = run.from; slot < run.to; slot++) {
		if (other.state[slot] === SHUT) continue;
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

/** Waiting: the next stretch that begins within a day of the run's end. */
function waiting(hours: StepHours, run: HoursRun, at: (slot: number) => number): Gain {
	const code = run.limiter === 'wet' || run.limiter === 'frost' ? 'dry' : 'wait';
	const next = hours.stretches.find(
		(stretch) => stretch.from >= run.to && stretch.from < run.to + DAY_SLOTS
	);
	return next === undefined
		? { code, gainMinutes: 0, opensFrom: null, opensTo: null }
		: {
				code,
				gainMinutes: (next.to - next.from) * SLOT_MINUTES,
				opensFrom: at(next.from),
				opensTo: at(next.to)
			};
}
