import { dayStart } from '../../time/dates';
import { hoursInBoth, hoursOutside } from '../../time/weekly';
import {
	addDays,
	faceAzimuth,
	isNoisy,
	SHELTERS,
	taskOf,
	type Face,
	type Limits,
	type ShelterName,
	type Site,
	type Step
} from '../../engine';
import type { QueuedStep } from '../db/queue';
import type { FaceRow, Yard } from '../db/schema';
import { stepRules } from '../jobs/stepRules';
import { liftGustOf } from './launchWish';

/** The yard as the engine's site. */
export function siteOf(yard: Yard): Site {
	return {
		latitude: yard.latitude,
		longitude: yard.longitude,
		elevation: yard.elevation,
		timeZone: yard.timeZone,
		roughness: yard.roughness,
		albedo: yard.albedo
	};
}

/** A face of a boat on its stand, as the engine's face. */
export function faceOf(
	row: FaceRow,
	{ boat: { heading }, lee }: Pick<QueuedStep, 'boat' | 'lee'>
): Face {
	return {
		tilt: row.tilt,
		azimuth: faceAzimuth(heading, row.bearing),
		solarAbsorptance: row.solarAbsorptance,
		emissivity: row.emissivity,
		material: row.material,
		finish: row.finish,
		bothSides: row.bothSides,
		...(row.inside === null ? {} : { inside: row.inside }),
		...(lee === null || lee.length === 0 ? {} : { lee })
	};
}

/** Whole days of a zone as a span of instants, UTC epoch seconds. */
const daysAway = (timeZone: string, { from, to }: { from: string; to: string }) => ({
	from: dayStart(timeZone, from),
	to: dayStart(timeZone, addDays(to, 1))
});

/**
 * A step as the engine's: worked when the yard is open and everybody who works on it is there, what
 * is heard outside quiet hours, and what is lifted under the hoist's limit.
 */
export function stepOf(queued: QueuedStep, yard: Yard): Step {
	const { step, sheet, nextCoating, painters, absences } = queued;
	const own = painters.flatMap(({ workHours }) => (workHours === null ? [] : [workHours]));
	const worked = own.reduce(hoursInBoth, yard.workHours);
	const away = [...absences, ...yard.holidays.map(({ date }) => ({ from: date, to: date }))];
	const { limits, times } = stepRules(step, sheet?.sheet ?? null, nextCoating);
	const isLift = step.kind === 'lift' || step.kind === 'launch';
	return {
		name: step.name,
		kind: step.kind,
		durationMinutes: step.durationMinutes,
		method: step.method,
		workHours: isNoisy(step) ? hoursInBoth(worked, hoursOutside(yard.quietHours)) : worked,
		...(away.length === 0 ? {} : { closed: away.map((days) => daysAway(yard.timeZone, days)) }),
		limits: isLift ? underHoist(limits, yard) : limits,
		times
	};
}

/** What the rule of work says of lifting until a yard has said what its own machine bears. */
const USUAL_LIFT_GUST = taskOf('launch').limits.gust?.max;

/** Limits under the yard's hoist; a boat that asks for less wind than usual keeps the lesser. */
function underHoist(limits: Limits, yard: Yard): Limits {
	const own = limits.gust?.max;
	const most = liftGustOf(yard);
	const isUsual = own === undefined || own === USUAL_LIFT_GUST;
	return {
		...limits,
		gust: { max: isUsual ? most : Math.min(own, most) },
		windHeight: 10
	};
}

/** Shelters that could be put up: those in the yard's stock, every kind where nobody has said. */
export function shelterStockOf({ shelters }: Pick<Yard, 'shelters'>): readonly ShelterName[] {
	return shelters === null
		? SHELTERS
		: SHELTERS.filter((name) => shelters.some(({ kind, count }) => kind === name && count > 0));
}

const FACE_WORDS: Record<FaceRow['name'], string> = {
	topsides: 'topsides',
	bottom: 'bottom',
	transom: 'transom',
	deck: 'deck',
	coachroof: 'coachroof',
	keel: 'keel',
	rudder: 'rudder',
	driveLeg: 'drive leg',
	propeller: 'propeller'
};

/** A face in words: "starboard topsides", "deck". */
export function faceWords({ name, side }: Pick<FaceRow, 'name' | 'side'>): string {
	return side === 'both' ? FACE_WORDS[name] : `${side} ${FACE_WORDS[name]}`;
}
