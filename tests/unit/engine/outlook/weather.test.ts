import { describe, expect, test } from 'vitest';
import {
	dewPointFromVapourPressure,
	saturationPressureOverIce
} from '../../../../src/lib/engine/met/humidity';
import { flagBit, flagNames } from '../../../../src/lib/engine/outlook/weather/flags';
import {
	missingVariables,
	slotWeather,
	VARIABLE
} from '../../../../src/lib/engine/outlook/weather/weather';
import { forecastOf, HOUR, SITE, slotAt, START, type Changes } from './flatWeather';

const weatherOf = (changes: Changes = {}) =>
	slotWeather({ site: SITE, forecast: forecastOf(changes), looseSand: null });

describe('hours onto quarter-hours', () => {
	test('an instant runs linearly between its stamps', () => {
		const weather = weatherOf({ temperature: (hour) => 10 + hour });
		expect(weather.airTemperature[slotAt(5)]).toBe(15);
		expect(weather.airTemperature[slotAt(5) + 1]).toBeCloseTo(15.25, 10);
	});

	test('a missing instant leaves the hour before and the hour after it unknown', () => {
		const weather = weatherOf({ temperature: (hour) => (hour === 6 ? null : 15) });
		expect(weather.airTemperature[slotAt(5) - 1]).toBe(15);
		expect(weather.airTemperature.subarray(slotAt(5), slotAt(7)).every(Number.isNaN)).toBe(true);
		expect(weather.airTemperature[slotAt(7)]).toBe(15);
		expect(missingVariables(weather, slotAt(6))).toEqual(['air temperature']);
	});

	test('a missing amount closes its own hour only', () => {
		const weather = weatherOf({ precipitation: (hour) => (hour === 6 ? null : 0) });
		expect(weather.precipitation[slotAt(5) - 1]).toBe(0);
		expect(weather.precipitation[slotAt(5)]).toBeNaN();
		expect(weather.precipitation[slotAt(6)]).toBe(0);
	});

	test('an amount belongs to the hour before its stamp and is spread over it', () => {
		const weather = weatherOf({ precipitation: (hour) => (hour === 6 ? 2 : 0) });
		expect(weather.precipitation[slotAt(5)]).toBeCloseTo(0.5, 10);
		expect(weather.hourlyPrecipitation[slotAt(5)]).toBe(2);
		expect(weather.precipitation[slotAt(6)]).toBe(0);
	});

	test('a gust is held over its hour, never interpolated', () => {
		const weather = weatherOf({ windGust: (hour) => hour });
		const held = weather.windGust.subarray(slotAt(5), slotAt(6));
		expect([...held]).toEqual([6, 6, 6, 6]);
	});

	test('direction turns the shorter way round', () => {
		const weather = weatherOf({ windDirection: (hour) => (hour % 2 === 0 ? 350 : 10) });
		expect(weather.windDirection[slotAt(4) + 2]).toBeCloseTo(0, 6);
	});

	test('a missing direction is variable in a light wind and missing in a fresh one', () => {
		const light = weatherOf({ windDirection: () => null, windSpeed: 2 });
		expect(light.windDirection[slotAt(5)]).toBe(VARIABLE);
		const fresh = weatherOf({ windDirection: () => null, windSpeed: 6 });
		expect(fresh.windDirection[slotAt(5)]).toBeNaN();
	});

	test('a missing gust is 1.5 times the mean and flagged derived', () => {
		const weather = weatherOf({ windGust: undefined, windSpeed: 4 });
		expect(weather.windGust[slotAt(5)]).toBe(6);
		expect(flagNames(weather.flags[slotAt(5)])).toContain('derived');
	});

	test('where dew point and humidity both come the dew point wins', () => {
		const weather = weatherOf({ dewPoint: 8, relativeHumidity: 99 });
		expect(weather.dewPoint[slotAt(5)]).toBe(8);
	});

	test('a dew point from humidity is derived at the hours and not flagged', () => {
		const weather = weatherOf({
			dewPoint: undefined,
			relativeHumidity: 60,
			ghi: 0,
			dni: 0,
			dhi: 0
		});
		expect(weather.dewPoint[slotAt(5)]).toBeCloseTo(10.1, 0);
		expect(flagNames(weather.flags[slotAt(5)])).not.toContain('derived');
	});

	test('a gust worked out takes the stronger end of its hour, the stamp that ends it', () => {
		const { windGust } = weatherOf({ windGust: undefined, windSpeed: (h) => (h === 5 ? 10 : 2) });
		expect(windGust[slotAt(4)]).toBe(15);
		expect(windGust[slotAt(5)]).toBe(15);
		expect(windGust[slotAt(6)]).toBe(3);
	});

	test('a humidity below freezing is over water and flagged, unless other hours tell', () => {
		const cold = { temperature: -8, relativeHumidity: 90 };
		const alone = weatherOf({ ...cold, dewPoint: undefined });
		expect(alone.relativeHumidity[8]).toBeCloseTo(90, 6);
		expect(alone.flags[8] & flagBit('assumed')).not.toBe(0);
		// Elsewhere 90 % comes with the dew point of 90 % over ice: 83 % over water.
		const overIce = dewPointFromVapourPressure(0.9 * saturationPressureOverIce(-8));
		const told = weatherOf({ ...cold, dewPoint: (h) => (h === 2 ? null : overIce) });
		expect(told.dewPoint[8]).toBeCloseTo(overIce, 6);
		expect(told.flags[8] & flagBit('assumed')).toBe(0);
		const mild = weatherOf({ temperature: 8, relativeHumidity: 90, dewPoint: undefined });
		expect(mild.flags[8] & flagBit('assumed')).toBe(0);
	});

	test('absent cloud is a clear sky, flagged assumed', () => {
		const weather = weatherOf({ cloudCover: undefined });
		expect(weather.cloudCover[slotAt(5)]).toBe(0);
		expect(flagNames(weather.flags[slotAt(5)])).toContain('assumed');
	});

	test('an hourly mean of irradiance is kept by the shape inside the hour', () => {
		const weather = weatherOf({ ghi: (hour) => (hour === 9 ? 400 : 300), dni: 500, dhi: 100 });
		const hour = weather.ghi.subarray(slotAt(8), slotAt(9));
		expect(hour.reduce((a, b) => a + b, 0) / 4).toBeCloseTo(400, 6);
		expect(hour[3]).toBeGreaterThan(hour[0]);
	});

	test('irradiance is zero with the sun down whatever the provider says', () => {
		expect(weatherOf({ ghi: 5, dni: 5, dhi: 5 }).ghi[slotAt(1)]).toBe(0);
	});

	test('nothing is extrapolated past the last hour', () => {
		const forecast = forecastOf({}, 25);
		const to = START + 30 * HOUR;
		const weather = slotWeather({ site: SITE, forecast, looseSand: null, to });
		expect(weather.grid.count).toBe(30 * 4);
		expect(weather.airTemperature[slotAt(24)]).toBeNaN();
		expect(missingVariables(weather, slotAt(25))).toEqual(['forecast']);
	});

	test('a stretch of six hours is bridged and flagged coarse beyond two days, a gap before', () => {
		const forecast = forecastOf({ precipitation: 6 }, 97);
		const kept = forecast.hourly.time
			.map((_, i) => i)
			.filter((i) => (i < 60 || i % 6 === 0) && (i < 20 || i > 24));
		const pick = <T>(values: T[]): T[] => kept.map((i) => values[i]);
		const hourly = Object.fromEntries(
			Object.entries(forecast.hourly).map(([name, values]) => [name, pick<number | null>(values)])
		);
		const thinned = { ...forecast, hourly: { ...hourly, time: pick(forecast.hourly.time) } };
		const weather = slotWeather({ site: SITE, forecast: thinned, looseSand: null });
		expect(weather.airTemperature[slotAt(22)]).toBeNaN();
		expect(weather.airTemperature[slotAt(70)]).toBe(18);
		expect(weather.hourlyPrecipitation[slotAt(70)]).toBe(1);
		expect(flagNames(weather.flags[slotAt(70)])).toContain('coarse');
		expect(flagNames(weather.flags[slotAt(10)])).not.toContain('coarse');
	});

	test('loose sand that nobody stated is flagged and sets no threshold', () => {
		const weather = weatherOf({ windGust: 20 });
		expect(flagNames(weather.flags[slotAt(5)])).toContain('noSandStated');
		expect(weather.sandLiftGust[slotAt(5)]).toBe(Infinity);
	});

	test('dry sand lifts in its sector and not out of it, and wet sand does not', () => {
		const looseSand = { sectors: [{ from: 20, to: 60 }], grainDiameter: 0.25, clayPercent: 0 };
		const sand = (changes: Changes) =>
			slotWeather({ site: SITE, forecast: forecastOf(changes), looseSand }).sand[slotAt(12)];
		expect(sand({ windSpeed: 5, windGust: 9, windDirection: 40 })).toBe(1);
		expect(sand({ windSpeed: 9, windGust: 12, windDirection: 40 })).toBe(2);
		expect(sand({ windSpeed: 9, windGust: 12, windDirection: 140 })).toBe(0);
		expect(sand({ windSpeed: 9, windGust: 12, windDirection: 40, precipitation: 3 })).toBe(0);
	});
});
