import type { Forecast, Hourly, HourlyVariable, Member } from './forecast';
import { HOURLY_VARIABLES } from './forecast';
import type { Site } from './site';
import type { SlotWeather } from './slots';
import { slotWeather, weatherUnder, type SlotWeatherInput } from './weather';

/** The weather of a yard: the forecast, and the same hours as each member of the ensemble has them. */
export interface YardWeather {
	readonly site: Site;
	readonly weather: SlotWeather;
	/** Empty where the forecast has none. All on the grid of `weather`. */
	readonly members: readonly SlotWeather[];
}

const has = (values: Member, name: HourlyVariable): boolean =>
	values[name]?.some((value) => value !== null) === true;

/** The hours of a member: its own, and from the forecast what it lacks. */
function memberHours(hourly: Hourly, member: Member): Hourly {
	const own = HOURLY_VARIABLES.filter((name) => has(member, name));
	const hours = { ...hourly, ...Object.fromEntries(own.map((name) => [name, member[name]])) };
	// A humidity of its own stands for the dew point too, and the other way round.
	if (has(member, 'relativeHumidity') && !has(member, 'dewPoint')) delete hours.dewPoint;
	if (has(member, 'dewPoint') && !has(member, 'relativeHumidity')) delete hours.relativeHumidity;
	return hours;
}

/** Whether a member's light is the forecast's: it has none, and no cloud that would make another. */
function sharesLight(hourly: Hourly, member: Member): boolean {
	if (has(member, 'ghi') || has(member, 'dni') || has(member, 'dhi')) return false;
	return !has(member, 'cloudCover') || hourly.ghi?.includes(null) === false;
}

/** The forecast and its members on quarter-hours. Members are laid on the forecast's grid and sun. */
export function yardWeather(input: SlotWeatherInput): YardWeather {
	const { site, forecast } = input;
	const weather = slotWeather(input);
	const members = (forecast.members ?? []).map((member) => {
		const own: Forecast = {
			issuedAt: forecast.issuedAt,
			hourly: memberHours(forecast.hourly, member)
		};
		return weatherUnder(
			{ ...input, forecast: own },
			{ weather, light: sharesLight(forecast.hourly, member) }
		);
	});
	return { site, weather, members };
}
