import type { Sheet } from '../sheet/sheet';
import { onePartEnamel } from './above/onePartEnamel';
import { polyurethaneTopcoat } from './above/polyurethaneTopcoat';
import { varnish } from './above/varnish';
import { epoxyBarrier } from './bottom/epoxyBarrier';
import { erodingAntifouling } from './bottom/erodingAntifouling';
import { hardAntifouling } from './bottom/hardAntifouling';
import { siliconeFinish } from './bottom/siliconeFinish';
import { siliconeTieCoat } from './bottom/siliconeTieCoat';
import { laminatingEpoxy } from './joints/laminatingEpoxy';
import { polyurethaneSealant } from './joints/polyurethaneSealant';
import { aluminiumPrimer } from './metal/aluminiumPrimer';
import { epoxyPrimer } from './metal/epoxyPrimer';
import { etchPrimer } from './metal/etchPrimer';
import { runningGearSilicone } from './metal/runningGearSilicone';

/**
 * Sample sheets of generic coatings. Each is plausible and none is of one product: to be checked
 * against the tin before use.
 */
export const SAMPLE_SHEETS = {
	epoxyPrimer,
	aluminiumPrimer,
	epoxyBarrier,
	erodingAntifouling,
	hardAntifouling,
	etchPrimer,
	runningGearSilicone,
	siliconeTieCoat,
	siliconeFinish,
	polyurethaneTopcoat,
	onePartEnamel,
	varnish,
	laminatingEpoxy,
	polyurethaneSealant
} as const satisfies Record<string, Sheet>;
export type SampleName = keyof typeof SAMPLE_SHEETS;
