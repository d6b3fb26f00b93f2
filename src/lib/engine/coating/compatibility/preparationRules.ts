import { rule } from './rule';

/** What has to be done, or dry, before. */
export const PREPARATION_RULES = {
	degreaseFirst: rule(
		'gelcoat sanded before it is degreased',
		'Mould wax and polish are dragged into the scratches: degrease first, and scrub a non-skid.'
	),
	solventOnRubber: rule(
		'solvent on a rubber seal',
		'A drive’s rubber diaphragm and seals swell in solvent: mask them.'
	),
	laminateMoisture: rule(
		'a barrier coat over a laminate that may be wet',
		'A barrier keeps water in as well as out. Meters give relative readings: compare with the dry topsides, three to five days after the haul. Drying takes weeks.',
		'a surveyor and a consultant on moisture meters; common practice'
	),
	woodMoisture: rule(
		'a coat on damp wood',
		'Wood is coated at 15 % or less, never over 18 %.',
		'advice on exterior wood (weak); common practice'
	),
	blush: rule(
		'epoxy overcoated or sanded without a wash',
		'Cool, damp hours leave a waxy carbamate on epoxy that no coat sticks to and that sanding only spreads: warm water and a pad first, then dry, then abrade.',
		'O’Malley and others 2005 on field detection of amine blush; a boatbuilder’s notes',
		'everyStep'
	)
} as const;
