import { rounded } from './rounding';

/** Coordinates at the edge, as people write them. Inside everything is degrees, north and east positive. */
export type CoordinateAxis = 'latitude' | 'longitude';

/** A coordinate in degrees, or a sentence that says what is wrong with what was typed. */
export type ReadCoordinate =
	| { readonly degrees: number; readonly trouble: null }
	| { readonly degrees: null; readonly trouble: string };

interface AxisRules {
	readonly most: number;
	readonly positive: string;
	readonly negative: string;
	/** Two ways of typing one, for the sentences. */
	readonly like: string;
}
const RULES: Readonly<Record<CoordinateAxis, AxisRules>> = {
	latitude: { most: 90, positive: 'N', negative: 'S', like: '37.02 N or 37° 01.2′ N' },
	longitude: { most: 180, positive: 'E', negative: 'W', like: '7.86 W or 7° 51.6′ W' }
};
const OTHER: Readonly<Record<CoordinateAxis, CoordinateAxis>> = {
	latitude: 'longitude',
	longitude: 'latitude'
};

const no = (trouble: string): ReadCoordinate => ({ degrees: null, trouble });

/** A number with a point or a comma, without sign. */
const NUMBER = /^\d+(?:[.,]\d*)?$|^[.,]\d+$/;
/** Signs people and keyboards put after degrees, minutes and seconds, and between parts. */
const MARKS = /[°º˚*'’‘′´`"”“″:]|\bdeg\b|\bmin\b|\bsec\b/giu;

/** The hemisphere letter of a text and the text without it; null where there are two. */
function hemisphereOf(text: string): { letter: string; rest: string } | null {
	const before = /^([NSEWO])\s*(.*)$/i.exec(text);
	const after = /^(.*?)\s*([NSEWO])$/i.exec(before === null ? text : before[2]);
	if (before !== null && after !== null) return null;
	if (before !== null) return { letter: before[1].toUpperCase(), rest: before[2] };
	if (after !== null) return { letter: after[2].toUpperCase(), rest: after[1] };
	return { letter: '', rest: text };
}

/** Degrees from one to three parts, the last with a fraction; a sentence where they are none. */
function degreesOf(parts: readonly string[], like: string): number | string {
	if (parts.length === 0 || parts.length > 3 || !parts.every((part) => NUMBER.test(part)))
		return `Type degrees, or degrees and minutes, like ${like}.`;
	const values = parts.map((part) => Number(part.replace(',', '.')));
	const broken = values.slice(0, -1).some((value) => !Number.isInteger(value));
	if (broken) return 'Only the last number may have a fraction: 37 01.2, not 37.5 01.2.';
	const [degrees, minutes = 0, seconds = 0] = values;
	if (minutes >= 60) return `Minutes run from 0 to under 60, and these are ${minutes}.`;
	if (seconds >= 60) return `Seconds run from 0 to under 60, and these are ${seconds}.`;
	return degrees + minutes / 60 + seconds / 3600;
}

/**
 * A latitude or longitude as a person types it: decimal degrees ("37.02", "−7,86"), degrees and
 * minutes ("37° 01.2′ N") or with seconds, the hemisphere as a letter on either side or as a sign.
 */
export function readCoordinate(typed: string, axis: CoordinateAxis): ReadCoordinate {
	const { most, positive, negative, like } = RULES[axis];
	// The ordinal sign that stands for degrees on some keyboards would become a letter.
	const text = typed
		.replaceAll('º', '°')
		.normalize('NFKC')
		.replaceAll(/[−–—‐]/gu, '-')
		.trim();
	if (text === '') return no(`Type the ${axis}, like ${like}.`);
	const found = hemisphereOf(text);
	if (found === null) return no('Name the hemisphere once, before or after the number.');
	const { letter, rest } = found;
	if (letter === 'O') return no('O is east in some languages and west in others: write E or W.');
	const other = RULES[OTHER[axis]];
	if (letter === other.positive || letter === other.negative)
		return no(
			`${letter} belongs to a ${OTHER[axis]}; a ${axis} ends in ${positive} or ${negative}.`
		);
	const signed = /^([+-])\s*(.*)$/.exec(rest);
	const sign = signed?.[1] ?? '';
	if (sign !== '' && letter !== '')
		return no(
			`Write either a sign or ${letter}, not both: one could mean the other half of the globe.`
		);
	const plain = (signed?.[2] ?? rest).replaceAll(MARKS, ' ').trim();
	const size = degreesOf(plain === '' ? [] : plain.split(/\s+/), like);
	if (typeof size === 'string') return no(size);
	if (size > most) return no(`A ${axis} lies between 0 and ${most}°, and this is ${size}°.`);
	const degrees = sign === '-' || letter === negative ? -size : size;
	// A millionth of a degree is a decimetre; "-0" is 0.
	return { degrees: Math.round(degrees * 1e6) / 1e6 || 0, trouble: null };
}

/** Degrees and minutes with the hemisphere: "37° 01.20′ N". */
export function coordinateWords(degrees: number, axis: CoordinateAxis): string {
	const { positive, negative } = RULES[axis];
	const hundredths = Math.round(Math.abs(degrees) * 6000);
	const whole = Math.floor(hundredths / 6000);
	const minutes = rounded((hundredths - whole * 6000) / 100, 2).padStart(5, '0');
	return `${whole}° ${minutes}′ ${degrees < 0 ? negative : positive}`;
}

/** The same in decimal degrees, for a field: "37.02 N". */
export function coordinateField(degrees: number, axis: CoordinateAxis): string {
	const { positive, negative } = RULES[axis];
	return `${Math.abs(degrees)} ${degrees < 0 ? negative : positive}`;
}
