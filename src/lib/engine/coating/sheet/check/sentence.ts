import type { ProblemUnit, SheetFinding } from './problem';

const spaced = (name: string): string =>
	name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);

/** Words of a place in a sheet: "overcoat max before hard antifouling, row 2". */
function placeWords({ path, row }: SheetFinding): string {
	const [group, ...rest] = path.map(String);
	const rowWords = row === null ? '' : `, row ${row + 1}`;
	if (group === 'times' && rest[0] !== undefined) return spaced(rest[0]) + rowWords;
	if (group === 'following' && rest[0] !== undefined) {
		const table = rest[1] === undefined ? 'times' : spaced(rest[1]);
		return `${table} before ${spaced(rest[0])}${rowWords}`;
	}
	const words = path
		.slice(path.length > 1 && (group === 'limits' || group === 'film') ? 1 : 0)
		.map((part) =>
			typeof part === 'number'
				? String(part + 1)
				: ({ min: 'least', max: 'most' }[part] ?? spaced(part))
		);
	return words.length === 0 ? 'the sheet' : words.join(' ');
}

/** Four figures, plainly written; a number that nobody meant keeps its exponent. */
const rounded = (value: number): string =>
	Math.abs(value) < 1e12 ? String(Number(value.toPrecision(4))) : value.toPrecision(4);

/** A quantity for a person; minutes as minutes, hours or days, whichever reads shortest. */
function quantity(value: number | string | null, unit: ProblemUnit): string {
	if (value === null) return 'nothing';
	if (typeof value === 'string') return value;
	if (unit !== 'min') return unit === null ? rounded(value) : `${rounded(value)} ${unit}`;
	if (value < 120) return `${rounded(value)} min`;
	return value < 2880 ? `${rounded(value / 60)} h` : `${rounded(value / 1440)} days`;
}

/** What is to be said of a finding, after its place. */
function statement(it: SheetFinding): string {
	const found = quantity(it.found, it.unit);
	const against = quantity(it.against, it.unit);
	const at = it.celsius === null ? '' : `at ${rounded(it.celsius)} °C, `;
	switch (it.code) {
		case 'missing':
			return 'is missing';
		case 'wrongType':
			return `is ${found}; wanted is ${against}`;
		case 'unknownField':
			return `has no place for “${found}”`;
		case 'notOneOf':
			return `is ${found}, which is none of: ${against}`;
		case 'tooMuch':
			return `${found} is over ${against}`;
		case 'tooLittle':
			return it.found === it.against
				? `must be more than ${against}`
				: `${found} is under ${against}`;
		case 'notRising':
			return `${found} does not rise above the row before, ${against}`;
		case 'leastOverMost':
			return `the least, ${found}, is above the most, ${against}`;
		case 'maximumUnderMinimum':
			return `${at}the maximum, ${found}, is under the minimum, ${against}`;
		case 'inductionOverPotLife':
			return `${at}${found} leaves nothing of the pot life of ${against}`;
		case 'hoursAsMinutes':
			return `${found} is too short for any coating (${against} and more is usual): hours or days typed as minutes?`;
		case 'minutesAsHours':
			return `${found} is too long for any coating (up to ${against} is usual): minutes typed as hours?`;
		case 'fahrenheitAsCelsius':
			return `${found} is too hot for work: Fahrenheit? That would be ${against}`;
		case 'filmUnit':
			return `${found} is too thin for a film: another unit? That would be ${against}`;
		case 'fractionForPercent':
			return `${found} looks like a fraction: is it ${against}?`;
		case 'spreadAgainstFilm':
		case 'spreadOffFilm':
			return `${found}, where the film of the sheet gives ${against}`;
		case 'wetThinnerThanDry':
			return `${found} wet is thinner than ${against} dry`;
		case 'silent':
			return 'the sheet is silent, and a plan needs it';
		case 'lengthens':
			return `${found} is longer than ${against} in the cooler row before`;
		case 'rowOutsideLimits':
			return `${found} lies outside the sheet’s own limit of ${against}`;
		case 'limitsPastRows':
			return `the sheet allows work at ${found}, the table ends at ${against}`;
		case 'rowsDoNotMeet':
			return `its rows and those of its minimum share no temperature: ${found} and ${against}`;
		case 'outOfOrder':
			return `${at}${found} comes after ${against}, which should be later`;
		case 'wetOffFilm':
			return `${found}, where dry film and solids give ${against}`;
	}
}

/** A finding as one sentence, naming the sheet, the table, the row and both numbers. */
export function findingSentence(it: SheetFinding): string {
	const place = placeWords(it);
	const words = statement(it);
	return `${it.sheet === '' ? 'This sheet' : it.sheet}, ${place}: ${words}${words.endsWith('?') ? '' : '.'}`;
}
