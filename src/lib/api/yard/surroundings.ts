/** What lies round a yard, in words, with the number each stands for. */
export interface Surroundings {
	readonly words: string;
	readonly value: number;
}

/**
 * Aerodynamic roughness lengths, m. Source: the Davenport classes as revised by Wieringa 1992,
 * which the World Meteorological Organization's guide to instruments repeats; the words are ours.
 */
export const ROUGHNESS_CHOICES: readonly Surroundings[] = [
	{ words: 'open water', value: 0.0002 },
	{ words: 'mud flats, bare sand', value: 0.005 },
	{ words: 'open hardstand, grass', value: 0.03 },
	{ words: 'a few boats and huts', value: 0.1 },
	{ words: 'boats close together, sheds', value: 0.25 },
	{ words: 'among buildings or trees', value: 0.5 },
	{ words: 'in a town', value: 1 }
];

/** Shares of sunlight the ground sends back (textbook values, rounded). */
export const ALBEDO_CHOICES: readonly Surroundings[] = [
	{ words: 'asphalt, dark stone', value: 0.1 },
	{ words: 'gravel, grass, earth', value: 0.2 },
	{ words: 'concrete', value: 0.3 },
	{ words: 'pale sand, shells', value: 0.4 },
	{ words: 'snow', value: 0.8 }
];
