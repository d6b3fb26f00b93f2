import { COATINGS } from '../sheet/coatingTypes';
import type { At, Look } from './at';
import type { CompatibilityWarning } from './warnings';

/** % of moisture that wood is coated at, and never over. */
const WOOD_MOST = 15;
const WOOD_NEVER = 18;
/** Days ashore before a moisture meter says anything: the largest drop is over. */
const LEAST_DAYS = 3;
/** % of humidity from which, and °C up to which, epoxy blushes; minutes in which it may. */
const BLUSH_HUMIDITY = 70;
const BLUSH_WARMEST = 20;
const BLUSH_MINUTES = 12 * 60;

function laminateMoisture({ chain, step, face, found, place }: At): CompatibilityWarning | null {
	const isLaminate = face.substrate === 'grp' || face.substrate === 'coredGrp';
	if (!isLaminate || step.sheet?.type !== 'epoxyBarrier' || found.surface === 'epoxyBarrier')
		return null;
	const readings = face.laminateMoisture;
	const { daysAshore } = chain;
	const isDry = readings !== null && readings.reading <= readings.dry;
	if (isDry && (daysAshore === null || daysAshore >= LEAST_DAYS)) return null;
	return {
		code: 'laminateMoisture',
		...place,
		reading: readings?.reading ?? null,
		dry: readings?.dry ?? null,
		daysAshore,
		leastDays: LEAST_DAYS
	};
}

function woodMoisture({ step, face, found, place }: At): CompatibilityWarning | null {
	if (step.kind !== 'coat' || face.substrate !== 'timber' || found.surface !== 'bare') return null;
	const percent = face.woodMoisture;
	if (percent !== null && percent <= WOOD_MOST) return null;
	return { code: 'woodMoisture', ...place, percent, most: WOOD_MOST, never: WOOD_NEVER };
}

/**
 * Epoxy that stood cool and damp and was not washed. Where the hours' weather is not known, a coat
 * that stood long enough to blush, or is about to be sanded, counts.
 */
function blush({ step, found, place }: At): CompatibilityWarning | null {
	const { surface, minutes, washed } = found;
	if (step.kind !== 'coat' && step.kind !== 'abrade') return null;
	if (surface === 'bare' || surface === 'gelcoat' || surface === 'unknown') return null;
	if (COATINGS[surface].cure !== 'epoxy' || washed) return null;
	const { relativeHumidity, surfaceTemperature } = step;
	const isWarm = surfaceTemperature !== null && surfaceTemperature >= BLUSH_WARMEST;
	const isDry = relativeHumidity !== null && relativeHumidity < BLUSH_HUMIDITY;
	if (isWarm || isDry) return null;
	const isLong = minutes === null || minutes >= BLUSH_MINUTES;
	if (relativeHumidity === null && step.kind === 'coat' && !isLong) return null;
	return { code: 'blush', ...place, minutes, relativeHumidity, surfaceTemperature };
}

/** Rules on what has to be done, or dry, before. */
export const lookAtPreparation: Look = (at) => {
	const { step, face, found, place } = at;
	const isSolvent = step.kind === 'degrease' || step.sheet?.hazards.includes('solvent') === true;
	return [
		step.kind === 'abrade' && found.surface === 'gelcoat' && !found.degreased
			? { code: 'degreaseFirst', ...place }
			: null,
		isSolvent && face.fittings.some(({ kind }) => kind === 'rubberSeal')
			? { code: 'solventOnRubber', ...place }
			: null,
		laminateMoisture(at),
		woodMoisture(at),
		blush(at)
	];
};
