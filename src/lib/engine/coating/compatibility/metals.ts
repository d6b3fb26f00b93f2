import type { Content } from '../sheet/sheet';
import { isAluminium, isMetal } from '../sheet/substrates';
import type { At, Look } from './at';
import type { CoatingFace, Water } from './chain';
import { primeWithin } from './primeWithin';
import type { CompatibilityWarning } from './warnings';

/** Barrier asked for between copper and aluminium, µm: at least, and usually (common practice). */
const LEAST_BARRIER = 200;
const USUAL_BARRIER = 300;
/** Copper-free band, mm (common practice). */
const BAND = { leastMillimetres: 25, mostMillimetres: 50 };

const COPPERS = [
	'metallicCopper',
	'cuprousOxide',
	'copperThiocyanate'
] as const satisfies Content[];

function copperOnAluminium({ step, face, found, place }: At): CompatibilityWarning | null {
	const copper = COPPERS.find((content) => step.sheet?.contains?.includes(content));
	if (copper === undefined || !isAluminium(face.substrate)) return null;
	const approved = step.sheet?.substrates?.includes(face.substrate) ?? false;
	const { barrierMicrons } = found;
	const isBarred = barrierMicrons !== null && barrierMicrons >= LEAST_BARRIER;
	if (isBarred && (approved || copper === 'copperThiocyanate')) return null;
	return {
		code: 'copperOnAluminium',
		...place,
		copper,
		barrierMicrons,
		leastMicrons: LEAST_BARRIER,
		usualMicrons: USUAL_BARRIER,
		approved
	};
}

function copperFreeBand({ step, face, place }: At): CompatibilityWarning | null {
	const isCopper = ['metallicCopper', 'cuprousOxide'].some((content) =>
		step.sheet?.contains?.some((it) => it === content)
	);
	const fitting = face.fittings.find(({ kind }) => kind !== 'rubberSeal');
	if (!isCopper || fitting === undefined) return null;
	return { code: 'copperFreeBand', ...place, fitting: fitting.kind, ...BAND };
}

function bareMetal({ step, face, found, place }: At): CompatibilityWarning | null {
	if (step.kind !== 'coat' || found.surface !== 'bare') return null;
	const { relativeHumidity } = step;
	const { minutes } = found;
	const within = primeWithin(face.substrate, relativeHumidity);
	if (within === null || (minutes !== null && minutes <= within)) return null;
	return {
		code: 'bareMetal',
		...place,
		substrate: face.substrate,
		minutes,
		within,
		relativeHumidity
	};
}

/** Rules on metals. */
export const lookAtMetals: Look = (at) => {
	const { step, face, place } = at;
	const isCoat = step.kind === 'coat';
	const isZinc =
		step.sheet?.type === 'zincRichPrimer' || step.sheet?.contains?.includes('zincDust');
	return [
		copperOnAluminium(at),
		copperFreeBand(at),
		isCoat && face.fittings.some(({ kind }) => kind === 'anode')
			? { code: 'anodeUnpainted', ...place }
			: null,
		isZinc === true && isAluminium(face.substrate)
			? { code: 'zincOnAluminium', ...place, substrate: face.substrate }
			: null,
		(step.kind === 'abrade' || step.kind === 'strip') && isAluminium(face.substrate)
			? { code: 'aluminiumTools', ...place }
			: null,
		isMetal(face.substrate) ? bareMetal(at) : null
	];
};

const WATERS_OF = {
	zinc: ['salt'],
	aluminium: ['salt', 'brackish'],
	magnesium: ['fresh']
} as const satisfies Record<string, readonly Water[]>;

/** Anodes of an alloy that is not for the boat's water. */
export function anodeWarnings(
	face: CoatingFace,
	index: number,
	water: Water | null
): CompatibilityWarning[] {
	return face.fittings.flatMap((fitting) => {
		if (fitting.kind !== 'anode' || fitting.alloy === null || water === null) return [];
		const suited: readonly Water[] = WATERS_OF[fitting.alloy];
		if (suited.includes(water)) return [];
		return [{ code: 'anodeAlloy', step: null, face: index, alloy: fitting.alloy, water }];
	});
}
