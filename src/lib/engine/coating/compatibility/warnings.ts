import type { Content } from '../sheet/sheet';
import type { Substrate } from '../sheet/substrates';
import type { Fitting, Surface, Water } from './chain';

interface Over {
	/** What it would lie on. */
	readonly over: Surface;
}

/** The numbers that a sentence on each warning needs. */
export interface WarningNumbers {
	readonly copperOnAluminium: {
		readonly copper: Content;
		/** µm of epoxy between; null where not known. */
		readonly barrierMicrons: number | null;
		readonly leastMicrons: number;
		readonly usualMicrons: number;
		/** Whether the sheet names aluminium among what it may lie on. */
		readonly approved: boolean;
	};
	readonly copperFreeBand: {
		readonly fitting: Fitting['kind'];
		readonly leastMillimetres: number;
		readonly mostMillimetres: number;
	};
	readonly anodeUnpainted: Readonly<Record<never, never>>;
	readonly anodeAlloy: { readonly alloy: string; readonly water: Water };
	readonly zincOnAluminium: { readonly substrate: Substrate };
	readonly aluminiumTools: Readonly<Record<never, never>>;
	readonly bareMetal: {
		readonly substrate: Substrate;
		/** Minutes it would lie bare; null where not planned yet. */
		readonly minutes: number | null;
		readonly within: number;
		readonly relativeHumidity: number | null;
	};
	readonly notOnSheet: { readonly substrate: Substrate };
	readonly strongSolvent: Over;
	readonly hardOverSoft: Over;
	readonly overAntifouling: Over;
	readonly overSilicone: Over;
	readonly tieCoatMissing: Over;
	readonly oldPrimer: { readonly minutes: number; readonly most: number };
	readonly siliconeMist: Readonly<Record<never, never>>;
	readonly unknownPaint: Readonly<Record<never, never>>;
	readonly degreaseFirst: Readonly<Record<never, never>>;
	readonly solventOnRubber: Readonly<Record<never, never>>;
	readonly laminateMoisture: {
		readonly reading: number | null;
		readonly dry: number | null;
		readonly daysAshore: number | null;
		readonly leastDays: number;
	};
	readonly woodMoisture: {
		readonly percent: number | null;
		readonly most: number;
		readonly never: number;
	};
	readonly blush: {
		readonly minutes: number | null;
		readonly relativeHumidity: number | null;
		readonly surfaceTemperature: number | null;
	};
}
export type CompatibilityCode = keyof WarningNumbers;

/** One warning on a chain: at a step, on a face, with its numbers. */
export type CompatibilityWarning = {
	readonly [C in CompatibilityCode]: {
		readonly code: C;
		/** Index of the step; null where it is the boat's own state. */
		readonly step: number | null;
		readonly face: number;
	} & WarningNumbers[C];
}[CompatibilityCode];
