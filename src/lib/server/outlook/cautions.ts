import { HAZARDS, type Hazard, type Method, type StepKind } from '../../engine';

/**
 * The usual cautions beside work that can hurt someone. Common practice of the trade; each defers
 * to the sheets, the yard and the law.
 */
const DEFERS = 'The tin’s data and safety sheets, the yard’s rules and the law come first.';

const SPRAYING: readonly Method[] = ['hvlp', 'airSpray', 'airless'];

const BY_HAZARD: Readonly<Record<Hazard, string>> = {
	isocyanate:
		'Isocyanates: asthma for life from breathing the mist. Spray only with air-fed breathing gear, trained, with others kept away.',
	hotWork: 'Hot work: permit, fire watch, and nothing that burns within 11 m.',
	suspendedLoad: 'Nobody under the load or inside the lift’s lines.',
	blastStream: 'Blasting: licensed operators, screened, with nobody downwind.',
	oldPaint: 'Old paint may hold lead or biocide: test it, work wet or with extraction, and mask.',
	pressureWater: 'Pressure water cuts skin and finds sockets: keep others and cables away.',
	biocide:
		'Biocide: gloves, goggles, covered skin; nothing down the drain, and the dust is pesticide waste.',
	peroxide:
		'Peroxide catalyst blinds: goggles, and never straight into accelerator, it can explode.',
	styrene: 'Styrene: good air, a vapour mask, no sparks.',
	height: 'Work at height: ladder tied, three points held, down before the wind moves you.',
	epoxy: 'Epoxy sensitises skin: gloves, and wash at once.',
	dust: 'Dust: extraction on the tool, a P2 or P3 mask, and nothing leaves the sheet.',
	oilyRags: 'Oily rags heat by themselves: lay them flat or in a lidded metal tin.',
	solvent: 'Solvents: no sparks, good air, and never enclosed without a watch on the vapour.'
};

/** The hazard of work that no sheet speaks for. */
const BY_KIND: Partial<Record<StepKind, Hazard>> = {
	abrade: 'oldPaint',
	blast: 'blastStream',
	weld: 'hotWork',
	wash: 'pressureWater',
	lift: 'suspendedLoad',
	launch: 'suspendedLoad',
	degrease: 'solvent'
};

const SPRAY = 'Spray mist travels: mind the neighbours’ boats, cars and lungs downwind.';

/** The caution of a step, the worst of its hazards; null where none is usual. */
export function cautionOf(
	kind: StepKind,
	method: Method,
	hazards: readonly string[]
): string | null {
	const hazard = HAZARDS.find((name) => hazards.includes(name)) ?? BY_KIND[kind];
	const isSpray = SPRAYING.includes(method) && hazard !== 'isocyanate';
	const caution = isSpray ? SPRAY : hazard === undefined ? undefined : BY_HAZARD[hazard];
	return caution === undefined ? null : `${caution} ${DEFERS}`;
}
