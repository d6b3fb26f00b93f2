import { dayStart } from '../../time/dates';
import { hoursInBoth } from '../../time/weekly';
import { addDays, faceAzimuth, type Face, type Site, type Step } from '../../engine';
import type { QueuedStep } from '../db/queue';
import type { FaceRow, Yard } from '../db/schema';
import { stepRules } from '../jobs/stepRules';

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

/** A face of a boat that heads somewhere, as the engine's face. */
export function faceOf(row: FaceRow, heading: number): Face {
	return {
		tilt: row.tilt,
		azimuth: faceAzimuth(heading, row.bearing),
		solarAbsorptance: row.solarAbsorptance,
		emissivity: row.emissivity,
		material: row.material,
		finish: row.finish,
		bothSides: row.bothSides,
		...(row.inside === null ? {} : { inside: row.inside })
	};
}

/** Whole days of a zone as a span of instants, UTC epoch seconds. */
const daysAway = (timeZone: string, { from, to }: { from: string; to: string }) => ({
	from: dayStart(timeZone, from),
	to: dayStart(timeZone, addDays(to, 1))
});

/** A step as the engine's: worked when the yard is open and everybody who works on it is there. */
export function stepOf(queued: QueuedStep, yard: Yard): Step {
	const { step, sheet, nextCoating, painters, absences } = queued;
	const own = painters.flatMap(({ workHours }) => (workHours === null ? [] : [workHours]));
	return {
		name: step.name,
		kind: step.kind,
		durationMinutes: step.durationMinutes,
		method: step.method,
		workHours: own.reduce(hoursInBoth, yard.workHours),
		...(absences.length === 0
			? {}
			: { closed: absences.map((away) => daysAway(yard.timeZone, away)) }),
		...stepRules(step, sheet?.sheet ?? null, nextCoating)
	};
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
