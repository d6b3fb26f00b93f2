/** Short-wave irradiance in W/m²; angles in degrees, azimuths from north clockwise. */

const RADIANS = Math.PI / 180;
/** W/m², ASTM E490: of the time when Erbs' relation was fitted, which it is used for. */
const SOLAR_CONSTANT = 1366.1;

/** Global irradiance under a clear sky at a sun altitude. Source: Haurwitz 1945. */
export function clearSkyGlobal(sunAltitude: number): number {
	if (!(sunAltitude > 0)) return 0;
	const cosZenith = Math.sin(sunAltitude * RADIANS);
	return 1098 * cosZenith * Math.exp(-0.059 / cosZenith);
}

/** Share of clear-sky global irradiance under a cloud cover of 0 to 1. Source: Kasten and Czeplak 1980. */
export function cloudTransmission(cloudCover: number): number {
	return 1 - 0.75 * cloudCover ** 3.4;
}

/** Diffuse share of global irradiance at a clearness index. Source: Erbs, Klein and Duffie 1982. */
export function diffuseFractionErbs(clearness: number): number {
	const k = clearness;
	if (k <= 0.22) return 1 - 0.09 * k;
	if (k > 0.8) return 0.165;
	return 0.9511 - 0.1604 * k + 4.388 * k ** 2 - 16.638 * k ** 3 + 12.336 * k ** 4;
}

/** Irradiance outside the air on a plane facing the sun. Source: Spencer 1971. */
export function extraterrestrialNormal(dayOfYear: number): number {
	const angle = (2 * Math.PI * (dayOfYear - 1)) / 365;
	const distance =
		1.00011 +
		0.034221 * Math.cos(angle) +
		0.00128 * Math.sin(angle) +
		0.000719 * Math.cos(2 * angle) +
		0.000077 * Math.sin(2 * angle);
	return SOLAR_CONSTANT * distance;
}

/** Under this the sun is too low to divide by its sine; the light is taken as diffuse. */
const LEAST_BEAM_ALTITUDE = 1.5;

/** Direct normal and diffuse parts of a global irradiance by Erbs' relation. */
export function splitGlobal(
	ghi: number,
	sunAltitude: number,
	dayOfYear: number
): { dni: number; dhi: number } {
	if (!(ghi > 0)) return { dni: ghi === 0 ? 0 : ghi < 0 ? 0 : NaN, dhi: ghi <= 0 ? 0 : NaN };
	if (sunAltitude < LEAST_BEAM_ALTITUDE) return { dni: 0, dhi: ghi };
	const cosZenith = Math.sin(sunAltitude * RADIANS);
	const clearness = ghi / (extraterrestrialNormal(dayOfYear) * cosZenith);
	const dhi = ghi * diffuseFractionErbs(Math.min(clearness, 1));
	return { dni: (ghi - dhi) / cosZenith, dhi };
}

/**
 * How sunlit the ground before a face is: 1 up to 45° of tilt, 0.7 to 100°, 0.35 for tilts over
 * it, since a bottom looks at its own boat's shadow (defaults, no source).
 */
export function groundView(tilt: number): number {
	if (tilt <= 45) return 1;
	return tilt <= 100 ? 0.7 : 0.35;
}

/** Share of the sky's hemisphere a tilted plane sees, isotropic. Source: Liu and Jordan 1960. */
export function skyView(tilt: number): number {
	return (1 + Math.cos(tilt * RADIANS)) / 2;
}

/** Cosine of the sun's angle on a plane; negative behind it. */
export function incidenceCosine(
	sunAltitude: number,
	sunAzimuth: number,
	tilt: number,
	azimuth: number
): number {
	const h = sunAltitude * RADIANS;
	return (
		Math.sin(h) * Math.cos(tilt * RADIANS) +
		Math.cos(h) * Math.sin(tilt * RADIANS) * Math.cos((sunAzimuth - azimuth) * RADIANS)
	);
}

/** Sun and light over a grid; all arrays of one length. */
export interface LightSeries {
	readonly ghi: Float64Array;
	readonly dni: Float64Array;
	readonly dhi: Float64Array;
	readonly sunAltitude: Float64Array;
	readonly sunAzimuth: Float64Array;
}

/** Share of direct normal light that falls on a plane, per entry; 0 behind it and with the sun down. */
export function beamShares(
	{ sunAltitude, sunAzimuth }: Pick<LightSeries, 'sunAltitude' | 'sunAzimuth'>,
	tilt: number,
	azimuth: number
): Float64Array {
	const cosTilt = Math.cos(tilt * RADIANS);
	const sinTilt = Math.sin(tilt * RADIANS);
	const shares = new Float64Array(sunAltitude.length);
	for (let i = 0; i < shares.length; i++) {
		const h = sunAltitude[i] * RADIANS;
		if (!(h > 0)) continue;
		const cosine =
			Math.sin(h) * cosTilt + Math.cos(h) * sinTilt * Math.cos((sunAzimuth[i] - azimuth) * RADIANS);
		if (cosine > 0) shares[i] = cosine;
	}
	return shares;
}

/**
 * Light on a face: direct into `beam`, sky and ground-reflected into `diffuse`, W/m².
 * DNI·max(0, cos θ) and DHI(1 + cos β)/2 + GHI·ρ·g(1 − cos β)/2 (Liu and Jordan 1960).
 *
 * @param shares - {@link beamShares} of the face
 */
export function fillFaceIrradiance(
	light: Pick<LightSeries, 'ghi' | 'dni' | 'dhi'>,
	shares: Float64Array,
	tilt: number,
	albedo: number,
	beam: Float64Array,
	diffuse: Float64Array
): void {
	const { ghi, dni, dhi } = light;
	const fromSky = skyView(tilt);
	const fromGround = albedo * groundView(tilt) * (1 - fromSky);
	for (let i = 0; i < beam.length; i++) {
		diffuse[i] = dhi[i] * fromSky + ghi[i] * fromGround;
		beam[i] = dni[i] * shares[i];
	}
}
