import { relativeHumidity } from './air';
import type { HourWeather } from './weather';

const HOUR = 3_600;

type Details = Record<string, number | string | null>;
interface Period {
	summary: { symbol_code: string };
	details: Details;
}
export interface Entry {
	/** ISO 8601, UTC. */
	time: string;
	data: {
		instant: { details: Details };
		next_1_hours?: Period;
		next_6_hours?: Period;
		next_12_hours?: Period;
	};
}

/** Stamps of the time series, UTC epoch seconds: hourly from start to turn, six-hourly to end. */
export interface Span {
	start: number;
	turn: number;
	end: number;
}

/**
 * The time series over a span: instants at each stamp; amounts over the hours that follow it, where
 * the same part of the series still has that many.
 */
export function entriesFrom(
	{ start, turn, end }: Span,
	weather: (time: number) => HourWeather
): Entry[] {
	const known = new Map<number, HourWeather>();
	const at = (time: number): HourWeather => {
		const hour = known.get(time) ?? weather(time);
		known.set(time, hour);
		return hour;
	};
	const entries: Entry[] = [];
	for (let time = start; time <= end; time += time < turn ? HOUR : 6 * HOUR) {
		const last = time < turn ? turn : end;
		const hours = (count: number): HourWeather[] =>
			Array.from({ length: count }, (_, i) => at(time + (i + 1) * HOUR));
		const entry: Entry = {
			time: new Date(time * 1000).toISOString().replace('.000Z', 'Z'),
			data: { instant: { details: instant(at(time), time <= turn) } }
		};
		if (time < turn) entry.data.next_1_hours = period(hours(1), 'amounts');
		if (time + 6 * HOUR <= last) entry.data.next_6_hours = period(hours(6), 'all');
		if (time + 12 * HOUR <= last) entry.data.next_12_hours = period(hours(12), 'chance');
		entries.push(entry);
	}
	return entries;
}

const round = (value: number, digits = 1): number => Number(value.toFixed(digits));

/** Only what there is: a value that a place or a lead does not have is left out. */
function present(values: Record<string, number | null | undefined>, digits = 1): Details {
	const details: Details = {};
	for (const [name, value] of Object.entries(values))
		if (value !== null && value !== undefined) details[name] = round(value, digits);
	return details;
}

function instant(hour: HourWeather, nearTerm: boolean): Details {
	const { temperature, dewPoint } = hour;
	return present({
		air_pressure_at_sea_level: hour.seaLevelPressure,
		air_temperature: temperature,
		cloud_area_fraction: hour.cloudCover,
		dew_point_temperature: dewPoint,
		relative_humidity:
			temperature === null || dewPoint === null
				? hour.relativeHumidity
				: relativeHumidity(temperature, dewPoint),
		wind_from_direction: hour.windDirection,
		wind_speed: hour.windSpeed,
		wind_speed_of_gust: nearTerm ? hour.windGust : null
	});
}

function period(hours: HourWeather[], what: 'amounts' | 'all' | 'chance'): Period {
	const of = (name: keyof HourWeather) => hours.map((hour) => hour[name]).filter((v) => v !== null);
	const complete = of('precipitation').length === hours.length;
	const amount = complete ? of('precipitation').reduce((sum, v) => sum + v, 0) : null;
	const chances = of('precipitationProbability');
	const temperatures = of('temperature');
	const chance = chances.length === 0 ? null : Math.max(...chances);
	const details = present({
		precipitation_amount: what === 'chance' ? null : amount,
		probability_of_precipitation: chance,
		air_temperature_max:
			what === 'all' && temperatures.length > 0 ? Math.max(...temperatures) : null,
		air_temperature_min:
			what === 'all' && temperatures.length > 0 ? Math.min(...temperatures) : null
	});
	return { summary: { symbol_code: symbol(hours, amount ?? 0) }, details };
}

function symbol(hours: HourWeather[], amount: number): string {
	if (amount >= 0.1) return amount >= hours.length ? 'rain' : 'lightrain';
	const night = (hours[0]?.ghi ?? 0) < 1 ? 'night' : 'day';
	const cloud = hours[0]?.cloudCover ?? 0;
	if (cloud > 85) return 'cloudy';
	if (cloud > 40) return `partlycloudy_${night}`;
	return cloud > 15 ? `fair_${night}` : `clearsky_${night}`;
}
