import type { Method } from '../../vocabulary';
import { COATINGS, type CoatingType } from '../sheet/coatingTypes';
import type { At, Look } from './at';
import type { Surface } from './chain';
import type { CompatibilityWarning } from './warnings';

/** A tie coat's epoxy is no older, minutes: a published tie-coat sheet's three days. */
const OLDEST_PRIMER = 3 * 24 * 60;

const SPRAYS: readonly Method[] = ['hvlp', 'airSpray', 'airless'];

const traitsOf = (surface: Surface) =>
	surface === 'bare' || surface === 'gelcoat' || surface === 'unknown' ? null : COATINGS[surface];

/** Coatings that a silicone finish holds on. */
const HOLDS_SILICONE: readonly Surface[] = ['siliconeTieCoat', 'siliconeFinish', 'etchPrimer'];
/** Coatings that go over antifouling to seal it. */
const SEALS: readonly CoatingType[] = ['onePartPrimer'];

function paintOverPaint(
	{ step, found, place }: At,
	type: CoatingType
): readonly (CompatibilityWarning | null)[] {
	const over = found.surface;
	const beneath = traitsOf(over);
	const laid = COATINGS[type];
	const isStrong =
		type === 'polyurethaneTopcoat' || step.sheet?.contains?.includes('strongSolvent') === true;
	const isOnePart =
		beneath?.cure === 'onePart' && beneath.antifouling === null && over !== 'etchPrimer';
	const isSilicone = laid.cure === 'silicone';
	return [
		isStrong && isOnePart ? { code: 'strongSolvent', ...place, over } : null,
		laid.antifouling === 'hard' && beneath?.antifouling === 'soft'
			? { code: 'hardOverSoft', ...place, over }
			: null,
		beneath !== null &&
		beneath.antifouling !== null &&
		laid.antifouling === null &&
		!SEALS.includes(type)
			? { code: 'overAntifouling', ...place, over }
			: null,
		over === 'siliconeFinish' && !isSilicone ? { code: 'overSilicone', ...place, over } : null,
		type === 'siliconeFinish' && !HOLDS_SILICONE.includes(over)
			? { code: 'tieCoatMissing', ...place, over }
			: null,
		type === 'siliconeTieCoat' &&
		beneath?.cure === 'epoxy' &&
		found.minutes !== null &&
		found.minutes > OLDEST_PRIMER
			? { code: 'oldPrimer', ...place, minutes: found.minutes, most: OLDEST_PRIMER }
			: null,
		isSilicone && SPRAYS.includes(step.method) ? { code: 'siliconeMist', ...place } : null
	];
}

/** Rules on one coating over another, and on what a sheet says it may lie on. */
export const lookAtPaints: Look = (at) => {
	const { step, face, found, place } = at;
	if (step.kind !== 'coat') return [];
	const { substrate } = face;
	const isOnSubstrate = found.surface === 'bare' || found.surface === 'gelcoat';
	const named = step.sheet?.substrates;
	return [
		found.surface === 'unknown' ? { code: 'unknownPaint', ...place } : null,
		isOnSubstrate && named !== undefined && !named.includes(substrate)
			? { code: 'notOnSheet', ...place, substrate }
			: null,
		...(step.sheet === null ? [] : paintOverPaint(at, step.sheet.type))
	];
};
