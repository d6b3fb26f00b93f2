import { getPosition } from 'suncalc';
import { describe, expect, it } from 'vitest';
import { anchorAt, generator, type GeneratorOptions } from '../../../fakes/forecast/generator';
import { memberNudge } from '../../../fakes/forecast/nudges';
import { cosZenith, sunTimes } from '../../../fakes/forecast/sun';
import { NO_NUDGE, type HourWeather } from '../../../fakes/forecast/weather';
import { DAY, HOUR } from '../server/forecast/answers';

const HARBOUR = { latitude: 37.02, longitude: -7.86 };
const ZONE = 'Europe/Lisbon';
const options = (anchor: string, more: Partial<GeneratorOptions> = {}): GeneratorOptions => ({
	timeZone: ZONE,
	anchor,
	seed: 1,
	climate: 'mild',
	...more
});
/** Lisbon is on UTC in December: hours of the local day are hours of the date. */
const WINTER = '2026-12-01';
const midnight = (date: string) => Date.parse(`${date}T00:00:00Z`) / 1000;

type Sound = Record<keyof HourWeather, number>;
/** The hours [from, to) after the anchor's midnight, where nothing is missing. */
function hours(from: number, to: number, given = options(WINTER), place = HARBOUR): Sound[] {
	const weather = generator(given);
	return Array.from({ length: to - from }, (_, i) => {
		const hour = weather.hour(midnight(given.anchor) + (from + i) * HOUR, place, NO_NUDGE);
		for (const value of Object.values(hour)) expect(value).not.toBeNull();
		return hour as Sound;
	});
}
const values = (of: Sound[], name: keyof HourWeather) => of.map((hour) => hour[name]);
const most = (of: Sound[], name: keyof HourWeather) => Math.max(...values(of, name));
const least = (of: Sound[], name: keyof HourWeather) => Math.min(...values(of, name));
const sum = (of: Sound[], name: keyof HourWeather) => values(of, name).reduce((a, b) => a + b, 0);

describe('made-up weather', () => {
	it('is the same for the same seed, and another for another', () => {
		expect(hours(-48, 24 * 16)).toEqual(hours(-48, 24 * 16));
		expect(values(hours(0, 48), 'windSpeed')).not.toEqual(
			values(hours(0, 48, options(WINTER, { seed: 2 })), 'windSpeed')
		);
	});

	it.each([
		['a mild harbour in winter', HARBOUR, options(WINTER)],
		['a mild harbour in summer', HARBOUR, options('2026-07-01')],
		[
			'a northern yard by season',
			{ latitude: 58.9, longitude: 5.6 },
			options('2026-05-10', { climate: 'seasonal' })
		],
		[
			'a southern yard by season',
			{ latitude: -41.3, longitude: 174.8 },
			options('2026-01-15', { climate: 'seasonal', timeZone: 'Pacific/Auckland' })
		]
	] as const)('agrees with itself: %s', (_, place, given) => {
		for (const hour of hours(-48, 24 * 16, given, place)) {
			expect(hour.dewPoint).toBeLessThanOrEqual(hour.temperature);
			expect(hour.relativeHumidity).toBeGreaterThan(20);
			expect(hour.relativeHumidity).toBeLessThanOrEqual(100);
			expect(hour.windGust).toBeGreaterThanOrEqual(hour.windSpeed);
			expect(hour.windDirection).toBeGreaterThanOrEqual(0);
			expect(hour.windDirection).toBeLessThan(360);
			expect(hour.cloudCover).toBeGreaterThanOrEqual(0);
			expect(hour.cloudCover).toBeLessThanOrEqual(100);
			expect(hour.dhi).toBeGreaterThanOrEqual(0);
			expect(hour.ghi).toBeGreaterThanOrEqual(hour.dhi - 1e-9);
			// Rain falls from cloud, and with notice.
			if (hour.precipitation > 0.3) {
				expect(hour.cloudCover).toBeGreaterThan(60);
				expect(hour.precipitationProbability).toBeGreaterThan(40);
			}
		}
	});

	it('shines only while the sun is up: global is beam times sine plus diffuse', () => {
		const weather = generator(options(WINTER));
		for (let t = midnight(WINTER); t < midnight(WINTER) + 3 * DAY; t += HOUR) {
			const { ghi, dni, dhi } = weather.hour(t, HARBOUR, NO_NUDGE) as Sound;
			const up = Math.max(cosZenith(t - HOUR, HARBOUR), cosZenith(t, HARBOUR), 0);
			if (up === 0) expect([ghi, dni, dhi]).toEqual([0, 0, 0]);
			// The hour's mean of beam × sine lies under the beam times the hour's highest sun.
			expect(ghi - dhi).toBeLessThanOrEqual(
				dni * Math.max(up, cosZenith(t - HOUR / 2, HARBOUR)) + 1e-6
			);
		}
	});

	it('has the sun of the date and the place, within half a degree of an independent library', () => {
		for (const [latitude, longitude] of [
			[37, -8],
			[59, 6],
			[-41, 175]
		] as const)
			for (const date of ['2026-03-20', '2026-06-21', '2026-12-21'])
				for (const hour of [3, 9, 15, 21]) {
					const at = midnight(date) + hour * HOUR;
					const { altitude } = getPosition(new Date(at * 1000), latitude, longitude);
					const own = 90 - (Math.acos(cosZenith(at, { latitude, longitude })) * 180) / Math.PI;
					// That library bends the light near the horizon; compare where it does not.
					if (altitude > 10) expect(Math.abs(own - altitude)).toBeLessThan(0.5);
				}
	});

	it('has long days in summer and short ones in winter', () => {
		const length = (date: string) => {
			const { sunrise, sunset } = sunTimes(midnight(date) + 12 * HOUR, HARBOUR);
			return (sunset - sunrise) / HOUR;
		};
		expect(length('2026-06-21')).toBeCloseTo(14.6, 0);
		expect(length('2026-12-21')).toBeCloseTo(9.5, 0);
	});

	it('is warmest in the afternoon and coldest about sunrise', () => {
		const day = values(hours(24, 48), 'temperature');
		const at = (value: number) => day.indexOf(value);
		expect(at(Math.max(...day))).toBeGreaterThanOrEqual(13);
		expect(at(Math.max(...day))).toBeLessThanOrEqual(16);
		expect(at(Math.min(...day))).toBeGreaterThanOrEqual(5);
		expect(at(Math.min(...day))).toBeLessThanOrEqual(9);
	});

	it('follows latitude and date where it is told to', () => {
		const noon = (date: string, latitude: number) =>
			hours(12, 14, options(date, { climate: 'seasonal' }), { ...HARBOUR, latitude })[0]
				?.temperature ?? 0;
		expect(noon('2026-07-20', 37)).toBeGreaterThan(noon('2026-01-20', 37) + 6);
		expect(noon('2026-07-20', 60)).toBeLessThan(noon('2026-07-20', 37) - 6);
		expect(noon('2026-01-20', -37)).toBeGreaterThan(noon('2026-07-20', -37) + 6);
	});
});

describe('the story', () => {
	it('has a clear, still, saturated night before tomorrow’s morning', () => {
		const night = hours(24 + 1, 24 + 7);
		expect(most(night, 'cloudCover')).toBeLessThan(25);
		expect(most(night, 'windSpeed')).toBeLessThan(1.5);
		expect(night.at(-1)?.relativeHumidity).toBeGreaterThan(97);
	});

	it('has a fair forenoon and a gusty sea breeze tomorrow', () => {
		expect(most(hours(24 + 9, 24 + 12), 'windGust')).toBeLessThan(7);
		const afternoon = hours(24 + 14, 24 + 17);
		expect(most(afternoon, 'windGust')).toBeGreaterThan(11);
		expect(most(afternoon, 'windGust')).toBeLessThan(14.4);
		for (const direction of values(afternoon, 'windDirection'))
			expect(Math.abs(direction - 160)).toBeLessThan(40);
		expect(sum(hours(24, 48), 'precipitation')).toBe(0);
	});

	it('has a quiet day after that', () => {
		expect(most(hours(48, 68), 'windGust')).toBeLessThan(7);
		expect(sum(hours(48, 72), 'precipitation')).toBe(0);
	});

	it('has a front on the fourth day: rain, a gale, a dip, a veering wind', () => {
		const front = hours(72, 96);
		expect(sum(front, 'precipitation')).toBeGreaterThan(8);
		expect(most(front, 'windGust')).toBeGreaterThanOrEqual(15);
		expect(least(front, 'seaLevelPressure')).toBeLessThan(1000);
		expect(
			values(front, 'seaLevelPressure').indexOf(least(front, 'seaLevelPressure'))
		).toBeGreaterThan(6);
		expect(front[6]?.windDirection).toBeLessThan(215);
		expect(front[18]?.windDirection).toBeGreaterThan(290);
	});

	it('clears behind it', () => {
		expect(sum(hours(96, 120), 'precipitation')).toBe(0);
		expect(most(hours(96 + 18, 120), 'cloudCover')).toBeLessThan(40);
		expect(least(hours(96 + 12, 120), 'seaLevelPressure')).toBeGreaterThan(1015);
	});

	it.each(Array.from({ length: 12 }, (_, month) => month + 1))(
		'reaches 15 to 21 °C by day in month %i',
		(month) => {
			const anchor = `2026-${String(month).padStart(2, '0')}-15`;
			for (let day = 0; day < 6; day++) {
				const warmest = most(hours(day * 24, day * 24 + 24, options(anchor)), 'temperature');
				expect(warmest).toBeGreaterThan(15);
				expect(warmest).toBeLessThan(21);
			}
		}
	);

	it('keeps the local clock through a change of clock', () => {
		// Spring forward in Lisbon on 29 March 2026: tomorrow is 23 hours long.
		const given = options('2026-03-28');
		const at = (hour: string) => Date.parse(hour) / 1000;
		const weather = generator(given);
		const gust = (t: number) => weather.hour(t, HARBOUR, NO_NUDGE).windGust ?? 0;
		// 15:00 on the local clock, which is 14:00 UTC from that day on.
		expect(gust(at('2026-03-29T14:00:00Z'))).toBeGreaterThan(11);
		for (const date of ['2026-03-28', '2026-10-24']) {
			const made = generator(options(date));
			for (let t = at(`${date}T00:00:00Z`); t < at(`${date}T00:00:00Z`) + 3 * DAY; t += HOUR) {
				const [a, b] = [t, t + HOUR].map((time) => made.hour(time, HARBOUR, NO_NUDGE) as Sound);
				expect(Math.abs((a?.temperature ?? 0) - (b?.temperature ?? 0))).toBeLessThan(4);
				expect(Math.abs((a?.windSpeed ?? 0) - (b?.windSpeed ?? 0))).toBeLessThan(4);
			}
		}
	});

	it('takes its today from the zone’s own date', () => {
		expect(anchorAt(Date.UTC(2026, 11, 1, 11) / 1000, 'Pacific/Auckland')).toBe('2026-12-02');
	});
});

describe('members', () => {
	const run = midnight(WINTER);
	const weather = generator(options(WINTER));
	const spread = (lead: number, name: keyof HourWeather) => {
		const t = run + lead * HOUR;
		const of = Array.from(
			{ length: 31 },
			(_, k) => weather.hour(t, HARBOUR, memberNudge(t, k, run, 1))[name] ?? 0
		);
		const mean = of.reduce((a, b) => a + b, 0) / of.length;
		return Math.sqrt(of.reduce((a, b) => a + (b - mean) ** 2, 0) / (of.length - 1));
	};
	it('spread as the lead grows', () => {
		const mean = (leads: number[]) =>
			leads.reduce((a, lead) => a + spread(lead, 'temperature'), 0) / leads.length;
		const [soon, later, late] = [
			[3, 6, 9],
			[45, 48, 51],
			[141, 144, 147]
		].map(mean);
		expect(soon).toBeLessThan(0.6);
		expect(later).toBeGreaterThan(0.6);
		expect(late).toBeGreaterThan(0.9);
		expect(late).toBeLessThan(3);
	});
	it('never hold more water than air can', () => {
		for (let lead = 0; lead < 200; lead += 5)
			for (let k = 0; k < 31; k++) {
				const t = run + lead * HOUR;
				const hour = weather.hour(t, HARBOUR, memberNudge(t, k, run, 1)) as Sound;
				expect(hour.dewPoint).toBeLessThanOrEqual(hour.temperature);
				expect(hour.precipitation).toBeGreaterThanOrEqual(0);
			}
	});
});
