import { coverage, wetFilmOf } from '../../mix/coverage';
import type { Sheet } from '../sheet';
import { finding, type SheetProblem, type SheetWarning } from './problem';

const MICRONS_PER_MM = 1000;
const MICRONS_PER_MIL = 25.4;

/** Films thinner than any laid, µm: below the first they are millimetres, below the second mils. */
const THINNEST_MM = 1;
const THINNEST_DRY = 5;
const THINNEST_WET = 10;

/** How far a stated spread rate may lie from the film's: a factor to refuse and one to warn at. */
const REFUSED = 2;
const OFF = 1.3;
/** Likewise for the wet film, which thinning raises. */
const WET_OFF = 1.5;

const isWithin = (ratio: number, factor: number): boolean => ratio <= factor && ratio >= 1 / factor;

function unitProblems({ name, film }: Sheet): SheetProblem[] {
	return (
		[
			['dryFilm', film?.dryFilm, THINNEST_DRY],
			['wetFilm', film?.wetFilm, THINNEST_WET]
		] as const
	).flatMap(([field, found, thinnest]) => {
		if (found === undefined || found >= thinnest) return [];
		const factor = found < THINNEST_MM ? MICRONS_PER_MM : MICRONS_PER_MIL;
		return finding('filmUnit', name, ['film', field], {
			found,
			against: found * factor,
			unit: 'µm'
		});
	});
}

function fractionProblems({ name, film, thinner }: Sheet): SheetProblem[] {
	const percents: [(string | number)[], number | undefined][] = [
		[['film', 'solids'], film?.solids],
		[['thinner', 'percent', 'max'], thinner?.percent.max],
		...Object.entries(film?.loss ?? {}).map(
			([method, loss]): [(string | number)[], number | undefined] => [
				['film', 'loss', method],
				loss
			]
		)
	];
	return percents.flatMap(([path, found]) =>
		found === undefined || found === 0 || found >= 1
			? []
			: finding('fractionForPercent', name, path, { found, against: found * 100, unit: '%' })
	);
}

/** m² a litre that the sheet's film gives; null where it does not give any. */
function spreadOfFilm({ film }: Sheet): number | null {
	if (film?.solids !== undefined && film.dryFilm !== undefined)
		return coverage(film.solids, film.dryFilm);
	return film?.wetFilm === undefined ? null : 1000 / film.wetFilm;
}

/** Physics that cannot be, and units that cannot be meant. */
export function filmProblems(sheet: Sheet): SheetProblem[] {
	const units = [...unitProblems(sheet), ...fractionProblems(sheet)];
	if (units.length > 0) return units;
	const { name, film } = sheet;
	const problems: SheetProblem[] = [];
	if (film?.wetFilm !== undefined && film.dryFilm !== undefined && film.wetFilm < film.dryFilm)
		problems.push(
			finding('wetThinnerThanDry', name, ['film', 'wetFilm'], {
				found: film.wetFilm,
				against: film.dryFilm,
				unit: 'µm'
			})
		);
	const spread = spreadOfFilm(sheet);
	if (
		film?.spreadRate !== undefined &&
		spread !== null &&
		!isWithin(film.spreadRate / spread, REFUSED)
	)
		problems.push(
			finding('spreadAgainstFilm', name, ['film', 'spreadRate'], {
				found: film.spreadRate,
				against: spread,
				unit: 'm²/L'
			})
		);
	return problems;
}

export function filmWarnings(sheet: Sheet): SheetWarning[] {
	const { name, film } = sheet;
	const warnings: SheetWarning[] = [];
	const spread = spreadOfFilm(sheet);
	if (film?.spreadRate !== undefined && spread !== null) {
		const ratio = film.spreadRate / spread;
		if (isWithin(ratio, REFUSED) && !isWithin(ratio, OFF))
			warnings.push(
				finding('spreadOffFilm', name, ['film', 'spreadRate'], {
					found: film.spreadRate,
					against: spread,
					unit: 'm²/L'
				})
			);
	}
	if (film?.wetFilm === undefined || film.dryFilm === undefined || film.solids === undefined)
		return warnings;
	const wet = wetFilmOf(film.dryFilm, film.solids);
	if (film.wetFilm >= film.dryFilm && !isWithin(film.wetFilm / wet, WET_OFF))
		warnings.push(
			finding('wetOffFilm', name, ['film', 'wetFilm'], {
				found: film.wetFilm,
				against: wet,
				unit: 'µm'
			})
		);
	return warnings;
}
