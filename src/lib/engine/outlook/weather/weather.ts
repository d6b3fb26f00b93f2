import { saturationPressureOverWater } from '../../met/humidity';
import { skyLongwave } from '../../met/longwave';
import { sunTrack } from '../../met/sun';
import { flagBit } from './flags';
import { hourlyDewPoint } from './dewPoint';
import type { Forecast } from './forecast';
import {
	directionSlots,
	heldSlots,
	hourlyAmountSlots,
	instantSlots,
	periodsOf,
	valuesOf
} from './hours';
import { slotLight } from './light';
import { looseSandSlots } from './looseSand';
import type { LooseSand, Site } from './site';
import { SLOT_SECONDS, type SlotGrid, type SlotWeather } from './slots';

/** A gust the forecast lacks, as a share of the mean (common practice). */
const GUST_OF_MEAN = 1.5;
/** Under this mean, m/s, a missing direction means variable. */
const VARIABLE_BELOW = 3;
/** Direction code of a variable wind. */
export const VARIABLE = -1;

/** The quarter-hours that cover [from, to), UTC epoch seconds. */
export function slotGrid(from: number, to: number): SlotGrid {
	const start = Math.floor(from / SLOT_SECONDS) * SLOT_SECONDS;
	return { start, count: Math.max(0, Math.ceil((to - start) / SLOT_SECONDS)) };
}

/** Pressure of the standard atmosphere at an elevation in metres, hPa. Source: ICAO standard atmosphere. */
export function standardPressure(elevation: number): number {
	return 1013.25 * (1 - 2.25577e-5 * elevation) ** 5.25588;
}

export interface SlotWeatherInput {
	readonly site: Site;
	readonly forecast: Forecast;
	/** Null where nobody has said whether there is loose sand. */
	readonly looseSand: LooseSand | null;
	/** The forecast is older than it should be; every slot carries the flag. */
	readonly stale?: boolean;
	/** UTC epoch seconds; the grid reaches at least from here to there, unknown outside the forecast. */
	readonly from?: number;
	readonly to?: number;
}

/**
 * The forecast on quarter-hours, with the sun, the sky's long wave and the state of loose sand.
 * Never throws on a forecast its schema accepts: what is missing is NaN, what was worked out or
 * assumed is flagged.
 */
export function slotWeather(input: SlotWeatherInput): SlotWeather {
	return weatherUnder(input, null);
}

/**
 * As {@link slotWeather}, with the sun and (where `light` says so) the light of a weather already
 * laid on the same grid: for the members of an ensemble.
 */
export function weatherUnder(
	input: SlotWeatherInput,
	shared: { readonly weather: SlotWeather; readonly light: boolean } | null
): SlotWeather {
	const { site, forecast, looseSand } = input;
	const { hourly } = forecast;
	const firstHour = hourly.time[0];
	const lastHour = hourly.time[hourly.time.length - 1];
	const grid = slotGrid(
		Math.min(firstHour, input.from ?? firstHour),
		Math.max(lastHour, input.to ?? lastHour)
	);
	const { count } = grid;
	const periods = periodsOf(forecast, grid);
	const unknown = (): Float64Array => new Float64Array(count).fill(NaN);
	const instant = (values: Float64Array | null): Float64Array =>
		values === null ? unknown() : instantSlots(values, periods, grid);

	const airTemperature = instant(valuesOf(hourly, 'temperature'));
	const dewPoints = hourlyDewPoint(hourly);
	const dewPoint = instant(dewPoints?.values ?? null);
	const givenWinds = valuesOf(hourly, 'windSpeed');
	const windSpeed = instant(givenWinds);
	const winds = givenWinds ?? new Float64Array(hourly.time.length).fill(NaN);
	const givenPressure = valuesOf(hourly, 'pressure');
	const pressure = instant(givenPressure);
	const cloud = valuesOf(hourly, 'cloudCover');
	const cloudCover = instant(cloud);
	const gusts = valuesOf(hourly, 'windGust');
	const windGust = gusts === null ? unknown() : heldSlots(gusts, periods, grid);
	const directions = valuesOf(hourly, 'windDirection');
	const windDirection = directions === null ? unknown() : directionSlots(directions, periods, grid);
	const amounts = valuesOf(hourly, 'precipitation');
	const hourlyPrecipitation =
		amounts === null ? unknown() : hourlyAmountSlots(amounts, periods, grid);
	const chances = valuesOf(hourly, 'precipitationProbability');
	const precipitationProbability = chances === null ? unknown() : heldSlots(chances, periods, grid);

	const flags = new Uint8Array(count);
	const gustDerived = new Uint8Array(count);
	const relativeHumidity = new Float64Array(count);
	const precipitation = new Float64Array(count);
	const vapourPressure = new Float64Array(count);
	const skyLong = new Float64Array(count);
	const derived = flagBit('derived');
	const everywhere =
		(input.stale === true ? flagBit('stale') : 0) |
		(cloud === null ? flagBit('assumed') : 0) |
		(looseSand === null ? flagBit('noSandStated') : 0);
	const defaultPressure = standardPressure(site.elevation);

	for (let i = 0; i < count; i++) {
		const period = periods.ofSlot[i];
		const inForecast = period >= 0 && !periods.gap[period];
		if (period >= 0) flags[i] = everywhere | (periods.coarse[period] ? flagBit('coarse') : 0);
		if (dewPoints?.assumed[period] === 1 || dewPoints?.assumed[period + 1] === 1)
			flags[i] |= flagBit('assumed');
		if (inForecast && cloud === null) cloudCover[i] = 0;
		else cloudCover[i] = Math.min(1, cloudCover[i] / 100);
		if (inForecast && pressure[i] !== pressure[i]) pressure[i] = defaultPressure;
		if (windGust[i] !== windGust[i] && windSpeed[i] === windSpeed[i]) {
			// Held over the hour, so from the stronger end of it.
			windGust[i] = GUST_OF_MEAN * Math.max(winds[period], winds[period + 1]);
			gustDerived[i] = 1;
			flags[i] |= derived;
		}
		if (windDirection[i] !== windDirection[i] && windSpeed[i] < VARIABLE_BELOW)
			windDirection[i] = VARIABLE;
		precipitation[i] = (hourlyPrecipitation[i] * SLOT_SECONDS) / 3600;
		const vapour = saturationPressureOverWater(dewPoint[i]);
		vapourPressure[i] = vapour;
		relativeHumidity[i] = (100 * vapour) / saturationPressureOverWater(airTemperature[i]);
		skyLong[i] = skyLongwave(airTemperature[i], vapour, cloudCover[i]);
	}

	const sun =
		shared === null
			? sunTrack(site.latitude, site.longitude, grid.start, count, SLOT_SECONDS)
			: { altitude: shared.weather.sunAltitude, azimuth: shared.weather.sunAzimuth };
	let light: Pick<SlotWeather, 'ghi' | 'dni' | 'dhi'>;
	if (shared?.light === true) light = shared.weather;
	else {
		const laid = slotLight(hourly, periods, grid, sun, cloudCover);
		for (let i = 0; i < count; i++) if (laid.derived[i]) flags[i] |= derived;
		light = laid;
	}
	const slotOf = (t: number): number => Math.round((t - grid.start) / SLOT_SECONDS);

	const open = {
		grid,
		issuedAt: forecast.issuedAt,
		airTemperature,
		dewPoint,
		relativeHumidity,
		pressure,
		windSpeed,
		windGust,
		windDirection,
		precipitation,
		hourlyPrecipitation,
		precipitationProbability,
		cloudCover,
		ghi: light.ghi,
		dni: light.dni,
		dhi: light.dhi,
		sunAltitude: sun.altitude,
		sunAzimuth: sun.azimuth,
		vapourPressure,
		skyLongwave: skyLong,
		gustDerived,
		flags,
		knownFrom: slotOf(firstHour),
		knownTo: slotOf(lastHour)
	};
	return {
		...open,
		...looseSandSlots(open, looseSand, site.roughness),
		sandStated: looseSand !== null
	};
}

const NEEDED = [
	['airTemperature', 'air temperature'],
	['dewPoint', 'dew point'],
	['windSpeed', 'wind'],
	['windGust', 'gust'],
	['windDirection', 'wind direction'],
	['hourlyPrecipitation', 'rain'],
	['cloudCover', 'cloud']
] as const;

/** What the forecast lacks in a slot, as a person would say it. */
export function missingVariables(weather: SlotWeather, slot: number): string[] {
	if (slot < weather.knownFrom || slot >= weather.knownTo) return ['forecast'];
	const missing = NEEDED.filter(([name]) => Number.isNaN(weather[name][slot])).map(
		([, words]) => words
	);
	return missing.length >= 5 ? ['forecast'] : missing;
}
