/**
 * Advance widths of Barlow Condensed with tabular figures, thousandths of an em, measured from the
 * font files that ship with the application (5.3.0). A server has no font to measure with, and a
 * word must be placed alike there and in the browser.
 */
const CHARACTERS = " ,-.:/%°–'0123456789abcdefghijklmnopqrstuvwxyz";
const WIDTHS = {
	500: [
		200, 189, 296, 202, 234, 363, 776, 358, 375, 137, 457, 457, 457, 457, 457, 457, 457, 457, 457,
		457, 425, 431, 413, 431, 417, 285, 423, 432, 212, 206, 421, 191, 657, 432, 424, 435, 435, 304,
		370, 275, 432, 409, 585, 398, 397, 365
	],
	600: [
		200, 199, 297, 211, 252, 386, 772, 359, 377, 152, 475, 475, 475, 475, 475, 475, 475, 475, 475,
		475, 434, 437, 422, 437, 426, 291, 431, 439, 215, 211, 433, 199, 665, 439, 432, 441, 441, 313,
		385, 282, 438, 423, 600, 417, 411, 368
	]
};
/** Capitals and letters with accents: wider than nearly all of them are. */
const OTHER = 530;

export type Weight = keyof typeof WIDTHS;

/** Width of a text set in Barlow Condensed, px. */
export function textWidth(text: string, size: number, weight: Weight): number {
	let thousandths = 0;
	for (const character of text) {
		const index = CHARACTERS.indexOf(character);
		thousandths += index < 0 ? OTHER : WIDTHS[weight][index];
	}
	return (thousandths * size) / 1000;
}
