import type { Method, StepKind } from '../../engine';

/**
 * The usual cautions beside work that can hurt someone. Common practice of the trade; each defers
 * to the sheets, the yard and the law.
 */
const DEFERS = 'The tin’s data and safety sheets, the yard’s rules and the law come first.';

const SPRAYING: readonly Method[] = ['hvlp', 'airSpray', 'airless'];

const BY_HAZARD: Readonly<Record<string, string>> = {
	isocyanate:
		'Isocyanates: asthma for life from breathing the mist. Spray only with air-fed breathing gear, trained, with others kept away.',
	biocide:
		'Biocide: gloves, goggles, covered skin; nothing down the drain, and the dust is pesticide waste.',
	epoxy: 'Epoxy sensitises skin: gloves, and wash at once.',
	oilyRags: 'Oily rags heat by themselves: lay them flat or in a lidded metal tin.',
	solvent: 'Solvents: no sparks, good air, and never enclosed without a watch on the vapour.'
};
/** Worst first: one caution stands beside a step, the rest is on the sheet. */
const HAZARD_ORDER = ['isocyanate', 'biocide', 'epoxy', 'oilyRags', 'solvent'] as const;

const BY_KIND: Partial<Record<StepKind, string>> = {
	abrade: 'Old paint may hold lead or biocide: test it, work wet or with extraction, and mask.',
	blast: 'Blasting: licensed operators, screened, with nobody downwind.',
	weld: 'Hot work: permit, fire watch, and nothing that burns within 11 m.',
	wash: 'Pressure water cuts skin and finds sockets: keep others and cables away.',
	lift: 'Nobody under the load or inside the lift’s lines.',
	launch: 'Nobody under the load or inside the lift’s lines.',
	degrease: 'Solvents: no sparks, gloves, good air.'
};

const SPRAY = 'Spray mist travels: mind the neighbours’ boats, cars and lungs downwind.';

/** The caution of a step; null where none is usual. */
export function cautionOf(
	kind: StepKind,
	method: Method,
	hazards: readonly string[]
): string | null {
	const hazard = HAZARD_ORDER.find((name) => hazards.includes(name));
	const spray = SPRAYING.includes(method) && hazard !== 'isocyanate' ? SPRAY : undefined;
	const caution = spray ?? (hazard === undefined ? BY_KIND[kind] : BY_HAZARD[hazard]);
	return caution === undefined ? null : `${caution} ${DEFERS}`;
}
