import type { Place } from './weather';

const RAD = Math.PI / 180;
const DAY_SECONDS = 86_400;
const SOLAR_CONSTANT = 1_361;

/** Fractional year of Spencer 1971, radians. */
function dayAngle(time: number): number {
	const start = Date.UTC(new Date(time * 1000).getUTCFullYear(), 0, 1) / 1000;
	return (2 * Math.PI * (time - start)) / (365.2422 * DAY_SECONDS);
}

/** Declination, radians (Spencer 1971). */
export function declination(time: number): number {
	const g = dayAngle(time);
	return (
		0.006918 -
		0.399912 * Math.cos(g) +
		0.070257 * Math.sin(g) -
		0.006758 * Math.cos(2 * g) +
		0.000907 * Math.sin(2 * g)
	);
}

/** By how much the sundial is ahead of the clock, seconds (Spencer 1971). */
export function equationOfTime(time: number): number {
	const g = dayAngle(time);
	return (
		229.18 *
		60 *
		(0.000075 +
			0.001868 * Math.cos(g) -
			0.032077 * Math.sin(g) -
			0.014615 * Math.cos(2 * g) -
			0.040849 * Math.sin(2 * g))
	);
}

/** Cosine of the sun's zenith distance. */
export function cosZenith(time: number, { latitude, longitude }: Place): number {
	const solarSeconds = time + equationOfTime(time) + longitude * 240;
	const hourAngle = ((solarSeconds % DAY_SECONDS) / DAY_SECONDS) * 2 * Math.PI - Math.PI;
	const dec = declination(time);
	return (
		Math.sin(latitude * RAD) * Math.sin(dec) +
		Math.cos(latitude * RAD) * Math.cos(dec) * Math.cos(hourAngle)
	);
}

/**
 * Sunrise and sunset around the solar noon nearest to `time`, UTC epoch seconds. A polar day or
 * night is given a night or a day of one hour, so that the day's temperature can turn.
 */
export function sunTimes(time: number, place: Place): { sunrise: number; sunset: number } {
	const solar = time + equationOfTime(time) + place.longitude * 240;
	const noon =
		(Math.floor(solar / DAY_SECONDS) + 0.5) * DAY_SECONDS -
		equationOfTime(time) -
		place.longitude * 240;
	const cosine = -Math.tan(place.latitude * RAD) * Math.tan(declination(noon));
	const half = (Math.acos(Math.max(-0.991, Math.min(0.991, cosine))) / Math.PI) * (DAY_SECONDS / 2);
	return { sunrise: noon - half, sunset: noon + half };
}

export interface Irradiance {
	ghi: number;
	dni: number;
	dhi: number;
}

/** The sun at an instant as it would be without cloud. */
export interface ClearSky {
	/** Cosine of the zenith distance, 0 with the sun down. */
	cosine: number;
	/** W/m² on a plane square to the beam. */
	beam: number;
}

/** Clear beam by Meinel 1976, I₀·0.7^(AM^0.678), air mass by Kasten and Young 1989. */
export function clearSky(time: number, place: Place): ClearSky {
	const cosine = cosZenith(time, place);
	if (cosine <= 0.01) return { cosine: 0, beam: 0 };
	const zenith = Math.acos(cosine) / RAD;
	const airMass = 1 / (cosine + 0.50572 * (96.07995 - zenith) ** -1.6364);
	return { cosine, beam: SOLAR_CONSTANT * 0.7 ** (airMass ** 0.678) };
}

/**
 * Irradiance under a share `cloud` of 0 to 1, W/m². A tenth of the beam's horizontal part is
 * diffuse in a clear sky; cloud shuts the beam as (1 − n)^1.5 and the whole as 1 − 0.7 n³ (made up,
 * in the range of published fits). GHI = DNI cos z + DHI always holds.
 */
export function underCloud({ cosine, beam }: ClearSky, cloud: number): Irradiance {
	const ghi = 1.1 * beam * cosine * (1 - 0.7 * cloud ** 3);
	const dni = beam * (1 - cloud) ** 1.5;
	return { ghi, dni, dhi: ghi - dni * cosine };
}
