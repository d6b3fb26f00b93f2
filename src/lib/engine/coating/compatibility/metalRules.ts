import { rule } from './rule';

/** Metals and what is fixed to them. */
export const METAL_RULES = {
	copperOnAluminium: rule(
		'copper antifouling on aluminium',
		'Cuprous oxide is kept off aluminium hulls, drive legs and outdrives; copper-free or thiocyanate paint over 200–300 µm of epoxy barrier is the usual way. A study of 2015 found that copper leached from cuprous-oxide paint had no effect on marine-grade aluminium, and that the galvanic case needs metallic copper in contact: ask for the barrier’s thickness and the maker’s word on aluminium.',
		'common practice; against it Bagley, Atlar, Charles and Anderson 2015, Ocean Engineering 109:595–602'
	),
	copperFreeBand: rule(
		'copper paint up to an anode, a drive leg or a transducer',
		'A bare or copper-free band of 25–50 mm is left round them; owners report deposits on anodes near metallic copper.'
	),
	anodeUnpainted: rule(
		'paint on an anode',
		'A painted anode does not work. Neither it nor the seat beneath is painted: clean metal on clean metal. Bearings, gasket faces and labels stay unpainted too.',
		'anode guidance; do-not-paint list of US Army TB 43-0144'
	),
	anodeAlloy: rule(
		'an anode of the wrong alloy for its water',
		'Zinc is for salt water, aluminium for salt and brackish, magnesium for fresh only; magnesium in salt water over-protects and can damage aluminium.',
		'anode guidance; a marine electrics manual'
	),
	zincOnAluminium: rule(
		'zinc-rich primer on aluminium',
		'Zinc-rich pigment is avoided on aluminium: a zinc-free epoxy or etch primer is used.'
	),
	aluminiumTools: rule(
		'tools on aluminium',
		'Only stainless wire and aluminium-oxide discs, never tools that have been on another metal or on copper paint.',
		'US Army TB 43-0144'
	),
	bareMetal: rule(
		'metal left bare too long',
		'Blasted steel rusts within hours, sooner in damp air, and aluminium grows its oxide within minutes: prime at once, abrade again where it got wet or stood overnight. One engineer holds that salts and humidity decide rather than any fixed hour.',
		'steel within 4 h: UFGS 09971, up to 8 h in air under 60 %: a trade answer; aluminium and bronze: common practice',
		'everyStep'
	)
} as const;
