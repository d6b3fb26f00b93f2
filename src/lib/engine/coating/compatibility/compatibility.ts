import type { Look } from './at';
import type { CoatingChain } from './chain';
import { anodeWarnings, lookAtMetals } from './metals';
import { lookAtPaints } from './paints';
import { lookAtPreparation } from './preparation';
import { COMPATIBILITY_RULES } from './rules';
import { foundOnFace } from './surfaceBefore';
import type { CompatibilityWarning } from './warnings';

const LOOKS: readonly Look[] = [lookAtMetals, lookAtPaints, lookAtPreparation];

/** All that is warned of on one face, in the order of the steps. */
function warningsOnFace(chain: CoatingChain, index: number): CompatibilityWarning[] {
	const face = chain.faces[index];
	const told = new Set<string>();
	const warnings = foundOnFace(chain, index).flatMap((found, at) => {
		if (found === null) return [];
		const step = chain.steps[at];
		const place = { step: at, face: index };
		return LOOKS.flatMap((look) => look({ chain, step, face, found, place }));
	});
	return [...anodeWarnings(face, index, chain.water), ...warnings].filter(
		(warning): warning is CompatibilityWarning => {
			if (warning === null) return false;
			if (COMPATIBILITY_RULES[warning.code].told === 'everyStep') return true;
			const isNew = !told.has(warning.code);
			told.add(warning.code);
			return isNew;
		}
	);
}

/**
 * What a chain of steps does that paint and metal do not forgive, face by face. Only warnings: each
 * has its rule, with a reason and where it comes from, and none refuses anything. What is not known
 * is warned of, never taken as fine.
 */
export function compatibilityWarnings(chain: CoatingChain): CompatibilityWarning[] {
	return chain.faces.flatMap((_, index) => warningsOnFace(chain, index));
}
