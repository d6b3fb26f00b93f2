/** What boats are made of and painted, in words. */
export const FACE_WORDS: Readonly<Record<string, string>> = { driveLeg: 'drive leg' };
export const MATERIAL_WORDS: Readonly<Record<string, string>> = {
	grp: 'glass fibre',
	coredGrp: 'glass fibre over a core',
	casting: 'cast metal'
};
export const FINISH_WORDS: Readonly<Record<string, string>> = { nonSkid: 'non-skid' };
export const COLOUR_WORDS: Readonly<Record<string, string>> = {
	mid: 'mid-tone',
	bareAluminium: 'bare aluminium'
};
