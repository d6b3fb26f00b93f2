/** Hours of the local day at which a regime is given; linear between. */
export const KNOT_HOURS = [0, 3, 6, 9, 12, 15, 18, 21] as const;

type Knots = readonly [number, number, number, number, number, number, number, number];

/** A kind of day. Knots stand at `KNOT_HOURS` of the local clock. */
export interface Regime {
	/** °C in a mild season (mean 14.5 °C), at sunrise and at the warmest hour. */
	low: number;
	high: number;
	/** Dew point less the day's low, K. */
	dew: Knots;
	/** % */
	cloud: Knots;
	/** m/s at 10 m */
	wind: Knots;
	/** Gust over mean. */
	gustiness: number;
	/** Degrees from north the wind comes from. */
	direction: Knots;
	/** mm/h */
	rain: Knots;
	/** % */
	chance: Knots;
	/** hPa at sea level */
	pressure: Knots;
}

const DRY: Knots = [0, 0, 0, 0, 0, 0, 0, 0];

/** The season's mean that `low` and `high` are made for, °C. */
export const MILD_MEAN = 14.5;

export const REGIMES = {
	/** Some cloud by day, clear and still by night: dew. */
	fair: {
		low: 10,
		high: 19,
		dew: [-0.3, -0.3, -0.2, -0.2, -0.8, -0.8, 0, 0],
		cloud: [8, 8, 12, 22, 32, 28, 12, 4],
		wind: [1.2, 1, 1.2, 2.4, 3.6, 3.8, 2, 1],
		gustiness: 1.5,
		direction: [350, 355, 0, 60, 150, 165, 175, 20],
		rain: DRY,
		chance: [1, 1, 2, 3, 5, 5, 3, 1],
		pressure: [1021, 1021, 1021, 1022, 1021, 1020, 1020, 1021]
	},
	/** A clear dewy dawn, then wind from the sea that rises all afternoon and brings moister air. */
	seaBreeze: {
		low: 9.5,
		high: 20,
		dew: [-0.1, -0.1, 0, 0.3, 1, 2, 1.4, 0.2],
		cloud: [2, 2, 4, 8, 14, 18, 20, 35],
		wind: [0.8, 0.6, 0.7, 1.6, 3.4, 8.2, 5, 3],
		gustiness: 1.5,
		direction: [0, 5, 10, 80, 150, 160, 170, 160],
		rain: DRY,
		chance: [1, 1, 1, 2, 3, 4, 3, 3],
		pressure: [1021, 1021, 1020, 1020, 1018, 1017, 1017, 1017]
	},
	/** High thin cloud, little wind, dry air that leaves no dew. */
	quiet: {
		low: 11,
		high: 19,
		dew: [-2, -2.2, -2.4, -2.6, -3, -3, -2.6, -1.8],
		cloud: [45, 50, 45, 40, 40, 36, 40, 48],
		wind: [2.6, 2.4, 2.2, 2, 2.4, 2.8, 2.2, 2.4],
		gustiness: 1.4,
		direction: [60, 50, 40, 60, 120, 150, 160, 175],
		rain: DRY,
		chance: [2, 2, 3, 4, 6, 8, 10, 14],
		pressure: [1018, 1018, 1018, 1018, 1017, 1016, 1015, 1014]
	},
	/** Warm rain ahead, a gale along it, the wind veering to the north-west behind it. */
	front: {
		low: 12.5,
		high: 17,
		dew: [-0.6, -0.4, 0, 0.4, 0.4, -1.5, -3, -4],
		cloud: [60, 88, 100, 100, 100, 92, 65, 45],
		wind: [4, 6.5, 9, 11, 11.5, 10, 7.5, 6],
		gustiness: 1.6,
		direction: [185, 190, 195, 210, 235, 290, 310, 315],
		rain: [0, 0.1, 1.5, 3, 2, 0.2, 0, 0],
		chance: [28, 60, 95, 98, 96, 66, 26, 12],
		pressure: [1011, 1007, 1002, 998, 998, 1003, 1008, 1011]
	},
	/** Washed, dry, breezy air after a front. */
	clearing: {
		low: 9,
		high: 16.5,
		dew: [-2, -2, -2.2, -3, -4, -4, -3, -2],
		cloud: [40, 34, 30, 36, 42, 30, 16, 8],
		wind: [5.5, 5, 4.8, 6.2, 7.2, 6.6, 4, 2.4],
		gustiness: 1.55,
		direction: [315, 315, 318, 322, 325, 325, 328, 332],
		rain: DRY,
		chance: [10, 8, 8, 10, 12, 8, 4, 2],
		pressure: [1013, 1014, 1016, 1018, 1019, 1020, 1021, 1022]
	},
	/** Grey and mild, a little drizzle about noon. */
	grey: {
		low: 12,
		high: 16.5,
		dew: [-1, -0.8, -0.6, -0.4, 0, 0, -0.4, -0.8],
		cloud: [80, 86, 92, 96, 98, 94, 88, 82],
		wind: [2.6, 2.4, 2.4, 3, 3.6, 3.6, 3, 2.6],
		gustiness: 1.45,
		direction: [230, 225, 220, 215, 210, 210, 215, 220],
		rain: [0, 0, 0, 0.1, 0.3, 0.1, 0, 0],
		chance: [18, 20, 26, 40, 55, 42, 28, 20],
		pressure: [1015, 1015, 1015, 1015, 1014, 1014, 1013, 1013]
	}
} as const satisfies Record<string, Regime>;
export type RegimeName = keyof typeof REGIMES;

/** What may follow what, by chance, where no story says. */
export const FOLLOWED_BY: Record<RegimeName, readonly RegimeName[]> = {
	fair: ['fair', 'seaBreeze', 'quiet'],
	seaBreeze: ['seaBreeze', 'fair', 'quiet', 'grey'],
	quiet: ['grey', 'front', 'fair'],
	grey: ['front', 'quiet', 'grey'],
	front: ['clearing'],
	clearing: ['fair', 'seaBreeze']
};

/**
 * The demo's days, from two days before today: settled, so that everything is dry; today fair with
 * a clear dewy night after it; tomorrow a dewy morning, a good forenoon and a gusty sea breeze; a
 * quiet day; a front with rain and a gale; clearing; fair again.
 */
export const STORY: readonly RegimeName[] = [
	'quiet',
	'fair',
	'fair',
	'seaBreeze',
	'quiet',
	'front',
	'clearing',
	'fair'
];
/** Index of today in `STORY`. */
export const STORY_TODAY = 2;
