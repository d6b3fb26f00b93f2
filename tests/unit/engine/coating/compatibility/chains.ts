import type {
	CoatingChain,
	CoatingFace,
	CoatingStep
} from '../../../../../src/lib/engine/coating/compatibility/chain';
import { compatibilityWarnings } from '../../../../../src/lib/engine/coating/compatibility/compatibility';
import type {
	CompatibilityCode,
	CompatibilityWarning
} from '../../../../../src/lib/engine/coating/compatibility/warnings';
import type { Sheet } from '../../../../../src/lib/engine/coating/sheet/sheet';

/** A sound GRP face with nothing to say of it. */
export const faceOf = (change: Partial<CoatingFace> = {}): CoatingFace => ({
	substrate: 'grp',
	surface: 'epoxyBarrier',
	barrierMicrons: null,
	fittings: [],
	laminateMoisture: { reading: 10, dry: 12 },
	woodMoisture: 12,
	...change
});

/** A step on the first face, an hour after the one before, in dry warm air. */
export const stepOf = (change: Partial<CoatingStep> = {}): CoatingStep => ({
	kind: 'coat',
	method: 'roller',
	sheet: null,
	coats: 1,
	faces: [0],
	bares: false,
	durationMinutes: 60,
	minutesSince: 60,
	relativeHumidity: 50,
	surfaceTemperature: 22,
	...change
});
export const coatOf = (sheet: Sheet, change: Partial<CoatingStep> = {}): CoatingStep =>
	stepOf({ sheet, ...change });

export const chainOf = (
	face: CoatingFace,
	steps: readonly CoatingStep[],
	change: Partial<CoatingChain> = {}
): CoatingChain => ({ water: 'salt', daysAshore: 10, faces: [face], steps, ...change });

/** Codes of the warnings of a chain, in order. */
export const codesOf = (chain: CoatingChain): CompatibilityCode[] =>
	compatibilityWarnings(chain).map(({ code }) => code);

/** The one warning of a code; fails where there is none or more than one. */
export function only(chain: CoatingChain, code: CompatibilityCode): CompatibilityWarning {
	const found = compatibilityWarnings(chain).filter((it) => it.code === code);
	if (found.length !== 1) throw new Error(`${found.length} warnings of ${code}`);
	return found[0];
}
