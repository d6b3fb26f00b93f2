/**
 * The hazards whose usual caution stands beside work, worst first: where there is room for one,
 * the first of a list is shown. Each defers to the tin's data and safety sheets, the yard's rules,
 * local law and licensed practice.
 */
export const HAZARDS = [
	'isocyanate',
	'hotWork',
	'suspendedLoad',
	'blastStream',
	'oldPaint',
	'pressureWater',
	'biocide',
	'peroxide',
	'styrene',
	'height',
	'epoxy',
	'dust',
	'oilyRags',
	'solvent'
] as const;
export type Hazard = (typeof HAZARDS)[number];
