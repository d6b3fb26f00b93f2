/**
 * An invented hull with a transom on its stands, seen from its starboard side:
 * px of a drawing 1120 wide and 372 high, ground line included.
 */
export const HULL = { width: 1120, height: 372, ground: 352 } as const;

/** Upper edge of the topsides, from transom to stem. */
const SHEER = 'M22 62C240 92 470 96 660 84S960 46 1098 22';
/** From the stem down to the waterline. */
const STEM = 'C1086 68 1058 116 1016 150';
/** The waterline, back to the transom. */
const WATERLINE = 'C800 178 300 180 54 160';

export const LINES = {
	sheer: SHEER,
	topsides: `${SHEER}${STEM}${WATERLINE}Z`,
	bottom: 'M54 160C300 180 800 178 1016 150C930 222 720 254 520 250C320 246 130 214 54 160Z',
	cabin: 'M366 86L392 58C480 44 600 42 692 50L742 74',
	windows: ['M436 84L446 68H500L504 84Z', 'M528 84V66H590L592 83Z', 'M620 81L618 64H672L690 75Z'],
	/** Seams of the planking on topsides and bottom. */
	seams: [
		'M30 84C300 112 760 112 1078 60',
		'M38 108C300 136 760 136 1056 94',
		'M46 134C300 158 760 158 1034 124',
		'M112 196C300 212 720 214 946 190',
		'M210 224C360 236 640 238 812 226'
	],
	rudder: 'M118 190L128 318H176L188 214',
	keel: 'M478 249L506 330H676L704 244',
	chocks: ['M506 332H554V352H506Z', 'M628 332H676V352H628Z'],
	stands: [
		{ x: 286, top: 234, tilt: 2 },
		{ x: 850, top: 223, tilt: -2 }
	]
} as const;
