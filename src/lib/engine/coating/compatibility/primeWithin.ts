import { isAluminium, type Substrate } from '../sheet/substrates';

const HOUR = 60;

/**
 * Minutes within which bare metal is primed, by the humidity it stands in; null where no rule is
 * usual. Unknown humidity counts as damp.
 *
 * Sources: steel 4 h, UFGS 09971; up to 8 h under 60 % of humidity, a trade answer. Aluminium 1 h
 * wanted, up to 4 h under 75 %, and bronze the same hour: common practice.
 *
 * @param relativeHumidity - %, the highest of the wait
 */
export function primeWithin(substrate: Substrate, relativeHumidity: number | null): number | null {
	const isUnder = (percent: number): boolean =>
		relativeHumidity !== null && relativeHumidity < percent;
	if (substrate === 'steel' || substrate === 'iron') return (isUnder(60) ? 8 : 4) * HOUR;
	if (isAluminium(substrate)) return (isUnder(75) ? 4 : 1) * HOUR;
	return substrate === 'bronze' ? HOUR : null;
}
