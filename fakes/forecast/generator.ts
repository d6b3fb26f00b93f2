import { relativeHumidity } from './air';
import { daysAround, extremes, localDate, type Day } from './days';
import { smoothNoise } from './noise';
import { MILD_MEAN, REGIMES, type Regime } from './regimes';
import { clearSky, declination, sunTimes, underCloud, type ClearSky } from './sun';
import { NO_NUDGE, type HourWeather, type Nudge, type Place, type Weather } from './weather';

const HOUR = 3_600;
/** Points of an hour at which sun and wind are taken. */
const STEPS = 6;
/** Seconds from a stamp to the middle of each part of the hour before it. */
const BEFORE = Array.from({ length: STEPS }, (_, i) => ((i + 0.5) / STEPS - 1) * HOUR);

const percent = (value: number): number => Math.max(0, Math.min(100, value));

export interface GeneratorOptions {
	timeZone: string;
	/** Local date of the story's today. */
	anchor: string;
	seed: number;
	/**
	 * `mild`: a southern harbour where coatings can go on in any month; `seasonal`: temperatures
	 * that follow latitude and date.
	 */
	climate: 'mild' | 'seasonal';
}

type Curve = 'dew' | 'cloud' | 'wind' | 'rain' | 'chance' | 'pressure';

/** Made-up weather, coherent in itself: the same options always make the same hours. */
export function generator({ timeZone, anchor, seed, climate }: GeneratorOptions): Weather {
	const days = daysAround(anchor, timeZone, seed);
	const knots = days.flatMap((day) => day.knots);
	const first = knots[0] ?? 0;
	const clamp = (time: number) => Math.max(first, Math.min(knots.at(-1) ?? first, time));

	/** Day and knot before an instant, and the share of the way to the next knot. */
	function locate(time: number): { at: number; next: number; share: number } {
		const t = clamp(time);
		let at = Math.max(0, Math.min(knots.length - 2, Math.floor((t - first) / (3 * HOUR))));
		// Days with a change of clock are an hour short or long.
		while (at > 0 && (knots[at] ?? 0) > t) at--;
		while (at < knots.length - 2 && (knots[at + 1] ?? 0) <= t) at++;
		const from = knots[at] ?? 0;
		const to = knots[at + 1] ?? from + 1;
		return { at, next: at + 1, share: Math.min(1, (t - from) / (to - from)) };
	}
	const regimeAt = (knot: number): Regime => REGIMES[days[Math.floor(knot / 8)]?.regime ?? 'fair'];
	const knotValue = (knot: number, name: Curve | 'direction'): number =>
		regimeAt(knot)[name][knot % 8] ?? 0;

	function curve(time: number, name: Curve): number {
		const { at, next, share } = locate(time);
		// A dew point stands on its own day's low.
		const base = (knot: number) =>
			name === 'dew' ? regimeAt(knot).low + knotValue(knot, 'dew') : knotValue(knot, name);
		return (1 - share) * base(at) + share * base(next);
	}
	function direction(time: number): number {
		const { at, next, share } = locate(time);
		const from = knotValue(at, 'direction');
		// The short way round.
		const turn = ((((knotValue(next, 'direction') - from) % 360) + 540) % 360) - 180;
		return from + share * turn + 8 * smoothNoise(time, 2 * HOUR, seed, 5);
	}
	function gustiness(time: number): number {
		const { at, next, share } = locate(time);
		return (1 - share) * regimeAt(at).gustiness + share * regimeAt(next).gustiness;
	}
	const wind = (time: number): number =>
		Math.max(0.2, curve(time, 'wind') * (1 + 0.07 * smoothNoise(time, 2 * HOUR, seed, 1)));
	const cloud = (time: number): number =>
		percent(curve(time, 'cloud') + 4 * smoothNoise(time, 3 * HOUR, seed, 2));

	const suns = new Map<string, DaySun>();
	function sunsAt(place: Place): DaySun {
		const key = `${place.latitude} ${place.longitude}`;
		const known = suns.get(key) ?? daySuns(days, place);
		suns.set(key, known);
		return known;
	}

	const skies = new Map<string, ClearSky[]>();
	/** The clear sky over the hour before a stamp, the same for every member. */
	function skiesBefore(time: number, place: Place): ClearSky[] {
		const key = `${time} ${place.latitude} ${place.longitude}`;
		const known = skies.get(key) ?? BEFORE.map((offset) => clearSky(time + offset, place));
		skies.set(key, known);
		return known;
	}

	function hour(time: number, place: Place, nudge: Nudge = NO_NUDGE): HourWeather {
		const season = climate === 'mild' ? 0 : seasonalMean(time, place.latitude) - MILD_MEAN;
		const warm = season + nudge.temperature + 0.2 * smoothNoise(time, 4 * HOUR, seed, 3);
		const temperature = dailyTemperature(sunsAt(place), time) + warm;
		// The dew point follows the season as the air does; air holds no more than it can.
		const dewPoint = Math.min(temperature, curve(time, 'dew') + season + nudge.dewPoint);
		const synoptic = time + nudge.early;
		const sky = skiesBefore(time, place);
		let strongest = wind(synoptic);
		let rain = 0;
		const sun = { ghi: 0, dni: 0, dhi: 0 };
		for (let i = 0; i < STEPS; i++) {
			const then = synoptic + BEFORE[i];
			strongest = Math.max(strongest, wind(then));
			rain += (curve(then, 'rain') * nudge.rain) / STEPS;
			if (sky[i].cosine === 0) continue;
			const { ghi, dni, dhi } = underCloud(sky[i], percent(cloud(then) + nudge.cloud) / 100);
			sun.ghi += ghi / STEPS;
			sun.dni += dni / STEPS;
			sun.dhi += dhi / STEPS;
		}
		return {
			temperature,
			dewPoint,
			relativeHumidity: relativeHumidity(temperature, dewPoint),
			seaLevelPressure: curve(synoptic, 'pressure'),
			windSpeed: wind(synoptic) * nudge.wind,
			windGust: strongest * gustiness(synoptic) * nudge.wind,
			windDirection: (direction(synoptic) + nudge.direction + 720) % 360,
			// What would not wet a gauge is no rain.
			precipitation: rain < 0.05 ? 0 : rain,
			precipitationProbability: curve(synoptic, 'chance'),
			cloudCover: percent(cloud(synoptic) + nudge.cloud),
			...sun
		};
	}
	return { hour };
}

/** The generator's anchor for a clock: the local date at it. */
export const anchorAt = localDate;

/** °C: a made-up maritime climate, colder and more seasonal toward the poles. */
function seasonalMean(time: number, latitude: number): number {
	const season = declination(time - 30 * 86_400) / 0.409;
	return 27 - 0.006 * latitude ** 2 + 0.13 * Math.abs(latitude) * season * Math.sign(latitude || 1);
}

/** Low, high, sunrise and sunset of each day at a place. */
type DaySun = { low: number; high: number; sunrise: number; sunset: number }[];

function daySuns(days: Day[], place: Place): DaySun {
	return days.map((day) => ({ ...extremes(day), ...sunTimes(day.knots[4] ?? 0, place) }));
}

/**
 * Air temperature by Parton and Logan 1981: a sine from sunrise that peaks after noon, then an
 * exponential fall to the next sunrise's low.
 */
function dailyTemperature(days: DaySun, time: number): number {
	const lag = 1.86 * HOUR;
	const steepness = 2.2;
	let index = days.length - 2;
	while (index > 0 && (days[index]?.sunrise ?? 0) > time) index--;
	const day = days[index];
	const following = days[index + 1];
	if (day === undefined || following === undefined) return MILD_MEAN;
	const { low, high, sunrise, sunset } = day;
	const rise = (t: number) =>
		low + (high - low) * Math.sin((Math.PI * (t - sunrise)) / (sunset - sunrise + 2 * lag));
	if (time <= sunset) return rise(Math.max(sunrise, time));
	const night = Math.min(1, (time - sunset) / (following.sunrise - sunset));
	const fall = (Math.exp(-steepness * night) - Math.exp(-steepness)) / (1 - Math.exp(-steepness));
	return following.low + (rise(sunset) - following.low) * fall;
}
