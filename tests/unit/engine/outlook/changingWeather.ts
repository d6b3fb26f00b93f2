import fc from 'fast-check';
import type { Forecast, Member } from '../../../../src/lib/engine/outlook/weather/forecast';
import { forecastOf } from './flatWeather';

/** Days with warm and cold hours, wind, showers and dew in them, reproducible from a few numbers. */
export interface Days {
	readonly warmth: number;
	readonly swing: number;
	readonly dryness: number;
	readonly wind: number;
	readonly cloud: number;
	readonly rainAt: number;
}

export const days: fc.Arbitrary<Days> = fc.record({
	warmth: fc.double({ min: 4, max: 26, noNaN: true }),
	swing: fc.double({ min: 0, max: 8, noNaN: true }),
	dryness: fc.double({ min: 0.5, max: 12, noNaN: true }),
	wind: fc.double({ min: 0, max: 9, noNaN: true }),
	cloud: fc.integer({ min: 0, max: 100 }),
	rainAt: fc.integer({ min: 0, max: 130 })
});

const seriesOf = (it: Days) => ({
	temperature: (h: number) => it.warmth + it.swing * Math.sin(((h - 9) / 24) * 2 * Math.PI),
	dewPoint: (h: number) => it.warmth - it.dryness + 0.5 * Math.sin(h),
	windSpeed: (h: number) => it.wind * (0.6 + 0.4 * Math.sin((h / 24) * 2 * Math.PI)),
	windGust: (h: number) => 1.6 * it.wind * (0.6 + 0.4 * Math.sin((h / 24) * 2 * Math.PI)),
	cloudCover: it.cloud,
	precipitation: (h: number) => (Math.abs(h - it.rainAt) < 2 ? 0.6 : 0)
});

export const HOURS = 121;

export function memberOf(it: Days): Member {
	const { hourly } = forecastOf(seriesOf(it), HOURS);
	const { time, ...member } = hourly;
	if (time.length !== HOURS) throw new Error('a member is as long as its forecast');
	return member;
}

export function ensembleOf(it: Days, members: readonly Days[]): Forecast {
	return { ...forecastOf(seriesOf(it), HOURS), members: members.map(memberOf) };
}
