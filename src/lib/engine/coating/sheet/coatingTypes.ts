import type { TimeName } from '../times';

/** The generic kinds of coating, adhesive and sealant. */
export const COATING_TYPES = [
	'epoxyPrimer',
	'aluminiumPrimer',
	'zincRichPrimer',
	'etchPrimer',
	'onePartPrimer',
	'epoxyBarrier',
	'epoxyFiller',
	'erodingAntifouling',
	'hardAntifouling',
	'siliconeTieCoat',
	'siliconeFinish',
	'polyurethaneTopcoat',
	'onePartEnamel',
	'varnish',
	'laminatingEpoxy',
	'laminatingPolyester',
	'gelcoat',
	'polyurethaneSealant',
	'polysulfideSealant'
] as const;
export type CoatingType = (typeof COATING_TYPES)[number];

/** What is true of a kind of coating whatever the tin, as checks, rules and mixing need it. */
interface CoatingTraits {
	/** What the wet film asks of the air: a gloss shows dust, a thick bead hardly. */
	readonly surface: 'plain' | 'gloss' | 'varnish' | 'silicone' | 'thick';
	/** What hardens it; `onePart` dries or oxidises and is lifted by strong solvents. */
	readonly cure: 'epoxy' | 'polyurethane' | 'onePart' | 'polyester' | 'silicone' | 'moisture';
	/** Antifoulings only: eroding ones stay soft. */
	readonly antifouling: 'soft' | 'hard' | null;
	/** Its times may be minutes where those of other kinds are hours. */
	readonly quick: boolean;
	/** Times that a plan needs and a sheet of this kind usually states. */
	readonly needs: readonly TimeName[];
}

const LAID: readonly TimeName[] = ['touchDry', 'overcoatMin', 'overcoatMax'];
const MIXED: readonly TimeName[] = ['potLife', ...LAID];

const traits = (
	cure: CoatingTraits['cure'],
	needs: readonly TimeName[],
	more: Partial<CoatingTraits> = {}
): CoatingTraits => ({ surface: 'plain', antifouling: null, quick: false, cure, needs, ...more });

const QUICK_AND_THICK = { surface: 'thick', quick: true } as const;

/** The traits of every kind. Common practice. */
export const COATINGS: Readonly<Record<CoatingType, CoatingTraits>> = {
	epoxyPrimer: traits('epoxy', MIXED),
	aluminiumPrimer: traits('epoxy', MIXED),
	zincRichPrimer: traits('epoxy', MIXED),
	etchPrimer: traits('onePart', ['overcoatMin', 'overcoatMax'], { quick: true }),
	onePartPrimer: traits('onePart', LAID),
	epoxyBarrier: traits('epoxy', [...MIXED, 'launchMin']),
	epoxyFiller: traits('epoxy', MIXED, QUICK_AND_THICK),
	erodingAntifouling: traits('onePart', [...LAID, 'launchMin'], { antifouling: 'soft' }),
	hardAntifouling: traits('onePart', [...LAID, 'launchMin'], { antifouling: 'hard' }),
	siliconeTieCoat: traits('silicone', MIXED, { surface: 'silicone' }),
	siliconeFinish: traits('silicone', ['touchDry', 'launchMin'], { surface: 'silicone' }),
	polyurethaneTopcoat: traits('polyurethane', MIXED, { surface: 'gloss' }),
	onePartEnamel: traits('onePart', LAID, { surface: 'gloss' }),
	varnish: traits('onePart', LAID, { surface: 'varnish' }),
	laminatingEpoxy: traits('epoxy', MIXED, QUICK_AND_THICK),
	laminatingPolyester: traits('polyester', ['potLife', 'overcoatMax'], QUICK_AND_THICK),
	gelcoat: traits('polyester', ['potLife'], { surface: 'gloss', quick: true }),
	polyurethaneSealant: traits('moisture', ['touchDry', 'launchMin'], QUICK_AND_THICK),
	polysulfideSealant: traits('moisture', ['touchDry', 'launchMin'], QUICK_AND_THICK)
};
