import type { Limits, Times } from '../../src/lib/engine';

/**
 * Sample sheets of generic coatings. Plausible values, checked for shape against published
 * handbooks and specifications; none is of one product, and each is to be checked against the tin.
 */
export interface SampleSheet {
	name: string;
	limits: Limits;
	times: Times;
	hazards: string[];
}

const hours = (...rows: [number, number][]): [number, number][] =>
	rows.map(([temperature, time]) => [temperature, time * 60]);

const common: Limits = {
	rainFree: true,
	drySurface: true,
	daylight: true,
	sand: 'none',
	spread: { min: 3 }
};

export const SAMPLE_SHEETS = {
	epoxyPrimer: {
		name: 'Epoxy primer, two-part (sample)',
		limits: {
			...common,
			airTemperature: { min: 10, max: 35 },
			surfaceTemperature: { min: 10, max: 38 },
			relativeHumidity: { max: 85 },
			curing: { min: 8 }
		},
		times: {
			potLife: hours([10, 8], [20, 4], [30, 2]),
			touchDry: hours([10, 8], [20, 4], [30, 2]),
			keepDry: hours([10, 12], [20, 6], [30, 4]),
			overcoatMin: hours([10, 16], [20, 8], [30, 4]),
			overcoatMax: hours([10, 264], [20, 168], [30, 108])
		},
		hazards: ['epoxy', 'solvent']
	},
	barrierCoat: {
		name: 'Epoxy barrier coat (sample)',
		limits: {
			...common,
			airTemperature: { min: 10, max: 32 },
			surfaceTemperature: { min: 10, max: 35 },
			relativeHumidity: { max: 85 },
			wind: { max: 9 },
			gust: { max: 12 },
			curing: { min: 8 }
		},
		times: {
			potLife: hours([10, 5], [20, 2.5], [30, 1]),
			touchDry: hours([10, 7], [20, 3.5], [30, 2]),
			keepDry: hours([10, 12], [20, 6], [30, 4]),
			overcoatMin: hours([10, 12], [20, 6], [30, 3]),
			overcoatMax: hours([10, 192], [20, 120], [30, 72]),
			launchMin: hours([10, 132], [20, 72], [30, 38])
		},
		hazards: ['epoxy', 'solvent']
	},
	erodingAntifouling: {
		name: 'Self-eroding antifouling (sample)',
		limits: {
			...common,
			airTemperature: { min: 5, max: 35 },
			surfaceTemperature: { min: 5, max: 38 },
			relativeHumidity: { max: 85 },
			wind: { max: 9 },
			gust: { max: 12 }
		},
		times: {
			touchDry: hours([5, 2], [20, 1], [35, 0.6]),
			keepDry: hours([5, 6], [20, 3.5], [35, 2]),
			overcoatMin: hours([5, 12], [20, 6], [35, 3]),
			overcoatMax: null,
			launchMin: hours([5, 24], [20, 12], [35, 6])
		},
		hazards: ['biocide', 'solvent']
	},
	polyurethaneTopcoat: {
		name: 'Polyurethane topcoat, two-part (sample)',
		limits: {
			...common,
			airTemperature: { min: 10, max: 30 },
			surfaceTemperature: { min: 10, max: 35 },
			relativeHumidity: { max: 80 },
			spread: { min: 3, untilDry: true },
			wind: { max: 5.5 },
			gust: { max: 8 },
			curing: { min: 8 }
		},
		times: {
			potLife: hours([10, 7], [20, 3.5], [30, 2]),
			dustFree: hours([10, 2.5], [20, 1.5], [30, 0.9]),
			touchDry: hours([10, 5], [20, 3], [30, 2]),
			keepDry: hours([10, 9], [20, 6], [30, 4]),
			overcoatMin: hours([10, 24], [20, 14], [30, 8]),
			overcoatMax: hours([10, 72], [20, 48], [30, 32]),
			launchMin: hours([10, 120], [20, 72], [30, 42])
		},
		hazards: ['isocyanate', 'solvent']
	},
	varnish: {
		name: 'Varnish, one-part (sample)',
		limits: {
			...common,
			airTemperature: { min: 8, max: 30 },
			surfaceTemperature: { min: 8, max: 32 },
			relativeHumidity: { max: 80 },
			wind: { max: 4 },
			gust: { max: 7 },
			noDirectSun: true
		},
		times: {
			touchDry: hours([10, 6], [20, 4], [30, 2.5]),
			keepDry: hours([10, 9], [20, 6], [30, 4]),
			overcoatMin: hours([10, 33], [20, 22], [30, 15]),
			overcoatMax: hours([10, 72], [20, 60], [30, 48])
		},
		hazards: ['solvent', 'oilyRags']
	},
	runningGearPrimer: {
		name: 'Primer for bare metal running gear (sample)',
		limits: {
			...common,
			airTemperature: { min: 10, max: 32 },
			surfaceTemperature: { min: 10, max: 35 },
			relativeHumidity: { max: 80 },
			surfaceTrend: 'rising',
			wind: { max: 8 },
			gust: { max: 11 },
			curing: { min: 10 }
		},
		times: {
			touchDry: hours([10, 3.5], [20, 2], [30, 1]),
			keepDry: hours([10, 6], [20, 4], [30, 2]),
			overcoatMin: hours([10, 9], [20, 5], [30, 3]),
			overcoatMax: hours([10, 96], [20, 72], [30, 48])
		},
		hazards: ['epoxy', 'solvent']
	}
} as const satisfies Record<string, SampleSheet>;
export type SampleSheetName = keyof typeof SAMPLE_SHEETS;
