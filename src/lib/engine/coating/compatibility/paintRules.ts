import { rule } from './rule';

/** One coating over another. */
export const PAINT_RULES = {
	notOnSheet: rule(
		'a coating on what its sheet does not name',
		'The sheet lists what it may lie on, and this is not among it.',
		'the tin’s own sheet'
	),
	strongSolvent: rule(
		'strong solvents over one-part paint',
		'The solvents of a two-part polyurethane lift and wrinkle one-part paint beneath: test a patch, or take it off.',
		'a marine paint merchant’s advice'
	),
	hardOverSoft: rule(
		'hard antifouling over an eroding one',
		'The eroding paint goes on dissolving under the hard one, which falls off. The other way about is fine over sound paint.'
	),
	overAntifouling: rule(
		'another kind of paint over antifouling',
		'Antifouling is weak and full of biocide: take it off or seal it before anything but antifouling.'
	),
	overSilicone: rule(
		'paint over silicone',
		'Nothing but its own kind sticks to silicone, and sanding spreads it: its dust, rags and rollers are kept apart.',
		'US Navy process instruction for foul-release, 2009'
	),
	tieCoatMissing: rule(
		'a silicone finish without its tie coat',
		'Silicone holds on a tie coat, or on running gear on its etch primer.'
	),
	oldPrimer: rule(
		'a tie coat on a primer of many days',
		'The tie coat wants its epoxy no more than three days old.',
		'a sheet of a three-part silicone tie coat',
		'everyStep'
	),
	siliconeMist: rule(
		'silicone sprayed among other boats',
		'Its mist is light, floats far, and ruins the next coat of every boat it settles on.',
		'US Navy process instruction for foul-release, 2009'
	),
	unknownPaint: rule(
		'paint over paint that nobody knows',
		'Rub a patch with solvent: what softens lifts. Seal it with a tie coat; old tin copolymers are sealed or taken off by those licensed for it.',
		'label of a copper antifouling; common practice'
	)
} as const;
