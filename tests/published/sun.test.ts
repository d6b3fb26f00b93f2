import { century, declination, equationOfTime } from 'solar-calculator';
import { describe, expect, test } from 'vitest';
import { civilNights, sunPosition, sunTrack, sunUpSpans } from '../../src/lib/engine/met/sun';
import { everyCase, has, near, num, type PublishedCase, type Ruling } from './cases';

const RADIANS = Math.PI / 180;
const seconds = (text: string): number => Date.parse(text) / 1000;
const text = (fields: PublishedCase['inputs'], name: string): string => String(fields[name]);

/** Refraction in degrees by Sæmundsson's formula, to bring a geometric altitude to an apparent one. */
const refraction = (h: number): number => 1.02 / 60 / Math.tan((h + 10.3 / (h + 5.11)) * RADIANS);

/** Sources of USNO print whole minutes: half of one more. */
const MINUTE = 30;

function checkSpan(
	it: PublishedCase,
	start: number,
	rise: number,
	set: number,
	tolerance: number
): void {
	const [latitude, longitude] = [num(it.inputs, 'lat'), num(it.inputs, 'lon')];
	const spans = sunUpSpans(latitude, longitude, start - 86_400, start + 2 * 86_400);
	const nearest = (edge: 'from' | 'to', at: number): number =>
		Math.min(...spans.map((span) => Math.abs(span[edge] - at)));
	near(nearest('from', rise), 0, tolerance, it);
	near(nearest('to', set), 0, tolerance, it);
}

describe('sun', () => {
	everyCase('04-sun-position.json', 110, (it): Ruling => {
		const { inputs, expected } = it;
		if (has(expected, 'julian_day')) return 'day numbers are the library’s own business';
		if (has(expected, 'sun_distance_au'))
			return 'the engine takes the distance from Spencer’s first term';
		const latitude = has(inputs, 'lat') ? num(inputs, 'lat') : NaN;
		const longitude = has(inputs, 'lon') ? num(inputs, 'lon') : NaN;
		if (has(expected, 'apparent_altitude_deg') || has(expected, 'apparent_elevation_deg')) {
			const apparent = num(
				expected,
				has(expected, 'apparent_altitude_deg') ? 'apparent_altitude_deg' : 'apparent_elevation_deg'
			);
			const azimuth = num(
				expected,
				has(expected, 'azimuth_deg') ? 'azimuth_deg' : 'azimuth_north_clockwise_deg'
			);
			if (apparent < -1) return 'the sun is down: refraction there is no matter of the engine';
			return () => {
				const position = sunPosition(seconds(text(inputs, 'utc')), latitude, longitude);
				near(position.altitude, apparent, apparent > 5 ? 0.02 : 0.1, it);
				const turn = Math.abs(((position.azimuth - azimuth + 540) % 360) - 180);
				near(turn, 0, 0.02 / Math.cos(apparent * RADIANS), it);
			};
		}
		if (typeof inputs.local_date === 'string') {
			const offset = text(inputs, 'utc_offset');
			const at = (value: unknown): number => {
				const given = String(value);
				return seconds(
					given.includes('T') ? given : `${text(inputs, 'local_date')}T${given}:00${offset}`
				);
			};
			const wholeMinutes = !text(expected, 'sunrise').includes('T');
			return () =>
				checkSpan(
					it,
					seconds(`${text(inputs, 'local_date')}T12:00:00${offset}`),
					at(expected.sunrise),
					at(expected.sunset),
					60 + (wholeMinutes ? MINUTE : 0)
				);
		}
		const start = seconds(`${text(inputs, 'utc_date')}T00:00:00Z`);
		if ('Object continuously above the Horizon' in expected)
			return () => {
				expect(sunUpSpans(latitude, longitude, start, start + 86_400)).toEqual([
					{ from: start, to: start + 86_400 }
				]);
			};
		if ('Object continuously below the Twilight Limit' in expected)
			return () => {
				expect(civilNights(latitude, longitude, start, start + 86_400)).toEqual([
					{ from: start, to: start + 86_400 }
				]);
			};
		const at = (name: string): number =>
			seconds(`${text(inputs, 'utc_date')}T${text(expected, name)}:00Z`);
		// Where the sun grazes the horizon a hair of altitude is many minutes.
		const grazing = Math.abs(latitude) > 65;
		const tolerance = grazing ? 240 : 60 + MINUTE;
		if (typeof expected.Rise === 'string' && typeof expected.Set === 'string')
			return () => checkSpan(it, start, at('Rise'), at('Set'), tolerance);
		if (
			typeof expected['Begin Civil Twilight'] === 'string' &&
			typeof expected['End Civil Twilight'] === 'string'
		)
			return () => {
				const nights = civilNights(latitude, longitude, start - 86_400, start + 2 * 86_400);
				const nearest = (edge: 'from' | 'to', instant: number): number =>
					Math.min(...nights.map((night) => Math.abs(night[edge] - instant)));
				near(nearest('to', at('Begin Civil Twilight')), 0, tolerance, it);
				near(nearest('from', at('End Civil Twilight')), 0, tolerance, it);
			};
		return 'only one of rise and set falls on this UTC day';
	});

	test('the published example of the solar position algorithm is met within 0.1°', () => {
		// Reda and Andreas 2004 (NREL): 17 October 2003, 12:30:30 at UTC−7, 39.742476 N, 105.1786 W.
		const position = sunPosition(seconds('2003-10-17T19:30:30Z'), 39.742476, -105.1786);
		expect(Math.abs(position.altitude - 39.88838)).toBeLessThan(0.1);
		expect(Math.abs(position.azimuth - 194.34024)).toBeLessThan(0.1);
	});

	test('the track is within 0.1° of an independent library over a year', () => {
		let worst = 0;
		let compared = 0;
		for (const latitude of [-52, -20, 8, 37, 59]) {
			for (let day = 0; day < 365; day += 9) {
				const start = seconds('2026-01-01T00:00:00Z') + day * 86_400;
				const longitude = -7.9;
				const track = sunTrack(latitude, longitude, start, 96, 900);
				for (let i = 0; i < 96; i += 3) {
					const date = new Date((start + (i + 0.5) * 900) * 1000);
					const t = century(date);
					const minutes = (date.getTime() / 60_000) % 1440;
					const hourAngle = (minutes + equationOfTime(t)) / 4 - 180 + longitude;
					const [phi, delta] = [latitude * RADIANS, declination(t) * RADIANS];
					const sinH =
						Math.sin(phi) * Math.sin(delta) +
						Math.cos(phi) * Math.cos(delta) * Math.cos(hourAngle * RADIANS);
					const geometric = Math.asin(sinH) / RADIANS;
					if (geometric < 1) continue;
					worst = Math.max(worst, Math.abs(geometric + refraction(geometric) - track.altitude[i]));
					compared++;
				}
			}
		}
		expect(compared).toBeGreaterThan(2_500);
		expect(worst).toBeLessThan(0.1);
	});
});
