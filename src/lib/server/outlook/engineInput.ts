import { faceAzimuth, type Face, type Site, type Step } from '../../engine';
import type { QueuedStep } from '../db/queue';
import type { FaceRow, Yard } from '../db/schema';

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

/** A queued step as the engine's: its own limits and times stand over its sheet's, key by key. */
export function stepOf({ step, sheet }: QueuedStep, yard: Yard): Step {
	return {
		name: step.name,
		kind: step.kind,
		durationMinutes: step.durationMinutes,
		method: step.method,
		workHours: yard.workHours,
		limits: { ...sheet?.limits, ...step.limits },
		times: { ...sheet?.times, ...step.times }
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
