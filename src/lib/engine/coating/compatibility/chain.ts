import type { Method, StepKind } from '../../vocabulary';
import type { CoatingType } from '../sheet/coatingTypes';
import type { Sheet } from '../sheet/sheet';
import type { Substrate } from '../sheet/substrates';

/** What a face shows before the first step. */
export type Surface = CoatingType | 'bare' | 'gelcoat' | 'unknown';

export const WATERS = ['salt', 'brackish', 'fresh'] as const;
export type Water = (typeof WATERS)[number];

/** What is fixed to a face and is not to be treated as the face is. */
export type Fitting =
	| { readonly kind: 'anode'; readonly alloy: 'zinc' | 'aluminium' | 'magnesium' | null }
	| { readonly kind: 'driveLeg' | 'transducer' | 'rubberSeal' };

export interface CoatingFace {
	readonly substrate: Substrate;
	readonly surface: Surface;
	/** µm of epoxy barrier already there; null where nobody knows. */
	readonly barrierMicrons: number | null;
	readonly fittings: readonly Fitting[];
	/** Readings on one meter's own scale: this face, and a part of the boat known to be dry. */
	readonly laminateMoisture: { readonly reading: number; readonly dry: number } | null;
	/** % of the wood's dry mass. */
	readonly woodMoisture: number | null;
}

export interface CoatingStep {
	readonly kind: StepKind;
	readonly method: Method;
	readonly sheet: Sheet | null;
	/** Coats that the step lays; 1 for most. */
	readonly coats: number;
	/** Indices of the faces it works on. */
	readonly faces: readonly number[];
	/** Takes a face down to what it is made of. Blasting always does. */
	readonly bares: boolean;
	readonly durationMinutes: number;
	/** Minutes from the finish of the step before to this start; null where not planned yet. */
	readonly minutesSince: number | null;
	/** Highest % over those minutes and coldest °C of the face; null where not known. */
	readonly relativeHumidity: number | null;
	readonly surfaceTemperature: number | null;
}

/** A job's steps in order, on their faces. */
export interface CoatingChain {
	readonly water: Water | null;
	/** Days since the haul, at the first step; null where not known. */
	readonly daysAshore: number | null;
	readonly faces: readonly CoatingFace[];
	readonly steps: readonly CoatingStep[];
}
