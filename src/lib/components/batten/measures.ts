/** The batten, measured: px, per place it is drawn in. */
export interface BattenMeasures {
	readonly height: number;
	/** Fractions of the height at which the grain runs. */
	readonly grain: readonly number[];
	readonly tick: { readonly length: number; readonly weight: number };
	/** At 06, 12 and 18. */
	readonly deepTick: { readonly length: number; readonly weight: number };
	readonly notch: { readonly halfWidth: number; readonly height: number };
	/** How far tape stands past the lath, above and below. */
	readonly tapeOver: number;
	readonly tapeOutline: number;
	readonly torn: { readonly amplitude: number; readonly step: number };
	/** Stripes of the tape: the pattern's name. */
	readonly stripes: 'tape' | 'tape-first';
	/** Size of a limiter's word. */
	readonly word: number;
	readonly block: { readonly above: number; readonly height: number };
	/** Whether `dark` and `hours` carry their word; on lists the night and the gap say it. */
	readonly saysDark: boolean;
}

const usual = {
	grain: [0.3, 0.62],
	notch: { halfWidth: 5.5, height: 8 },
	tapeOutline: 0.9,
	torn: { amplitude: 1.5, step: 5 },
	stripes: 'tape',
	saysDark: false
} as const;

export const BATTEN = {
	list: {
		...usual,
		height: 24,
		tick: { length: 5, weight: 0.9 },
		deepTick: { length: 10, weight: 1.5 },
		tapeOver: 2,
		word: 13.5,
		block: { above: 4, height: 15 }
	},
	phone: {
		...usual,
		height: 28,
		tick: { length: 5.5, weight: 0.9 },
		deepTick: { length: 12, weight: 1.5 },
		tapeOver: 3,
		word: 16,
		block: { above: 5, height: 18 }
	},
	chart: {
		...usual,
		height: 32,
		tick: { length: 6, weight: 0.9 },
		deepTick: { length: 13, weight: 1.5 },
		tapeOver: 3,
		word: 16,
		block: { above: 6, height: 21 },
		saysDark: true
	},
	first: {
		...usual,
		height: 64,
		grain: [0.16, 0.34, 0.57, 0.78],
		tick: { length: 9, weight: 1.3 },
		deepTick: { length: 18, weight: 2 },
		notch: { halfWidth: 9, height: 13 },
		tapeOver: 4,
		tapeOutline: 1.2,
		torn: { amplitude: 2.6, step: 7 },
		stripes: 'tape-first',
		word: 17,
		block: { above: 7, height: 36 },
		saysDark: true
	}
} as const satisfies Record<string, BattenMeasures>;

/** Under this many px an hour only the deep ticks are cut. */
export const DENSE_PX_PER_HOUR = 7;
/** A run is never drawn narrower, px. */
export const LEAST_RUN = 2;
