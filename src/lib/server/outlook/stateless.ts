import type { OutlookRequest, OutlookResponse } from '../../api/outlook';
import {
	faceConditions,
	flagNames,
	LIMITERS,
	SAND_STATES,
	SLOT_SECONDS,
	slotWeather,
	STATES,
	stepHours,
	workWind
} from '../../engine';

const iso = (seconds: number): string => new Date(seconds * 1000).toISOString();

/** A step judged in a forecast that came with the request; nothing is read or stored. */
export function answerOutlook(request: OutlookRequest): OutlookResponse {
	const { site, forecast, face, shelter, usualErrors } = request;
	const weather = slotWeather({
		site,
		forecast,
		looseSand: request.looseSand ?? null,
		from: request.from,
		to: request.to
	});
	const conditions = faceConditions(weather, site, face, shelter);
	const { grid } = weather;
	const from = request.from ?? Math.max(forecast.issuedAt, forecast.hourly.time[0]);
	const first = Math.max(0, Math.floor((from - grid.start) / SLOT_SECONDS));
	const end =
		request.to === undefined
			? grid.count
			: Math.min(grid.count, Math.ceil((request.to - grid.start) / SLOT_SECONDS));
	const slots = Array.from({ length: Math.max(0, end - first) }, (_, i) => first + i);
	const at = (slot: number): string => iso(grid.start + slot * SLOT_SECONDS);
	const series = (values: Float64Array | Float32Array): (number | null)[] =>
		slots.map((slot) => (Number.isFinite(values[slot]) ? values[slot] : null));
	const [shown] = conditions;
	const [step] = request.steps;
	const wind = workWind(shown, site, step.limits.windHeight);
	const hours = stepHours(step, conditions, site, { usualErrors, from });
	return {
		slots: {
			time: slots.map(at),
			airTemperature: series(shown.airTemperature),
			dewPoint: series(shown.dewPoint),
			relativeHumidity: series(shown.relativeHumidity),
			surfaceTemperature: series(shown.surfaceShaded),
			surfaceTemperatureSun: series(shown.surfaceSunlit),
			spread: series(shown.spread),
			film: series(shown.film),
			windSpeed: series(wind.mean),
			windGust: series(wind.gust),
			windSpeed10: series(weather.windSpeed),
			windGust10: series(weather.windGust),
			precipitation: series(weather.precipitation),
			sand: slots.map((slot) => SAND_STATES[weather.sand[slot]] ?? null),
			flags: slots.map((slot) => flagNames(shown.flags[slot]))
		},
		steps: [
			{
				state: slots.map((slot) => STATES[hours.state[slot]]),
				limiter: slots.map((slot) => LIMITERS[hours.limiter[slot]]),
				room: series(hours.room),
				chance: null,
				stretches: hours.stretches
					.filter((stretch) => stretch.from < end)
					.map((stretch) => ({
						from: at(stretch.from),
						to: at(stretch.to),
						lastStart: at(stretch.lastStart),
						bestStart: at(stretch.bestStart),
						room: stretch.room
					})),
				best:
					hours.best === null || hours.best.start >= end
						? null
						: {
								start: at(hours.best.start),
								finish: at(hours.best.finish),
								room: hours.best.room,
								limiter: hours.best.limiter
							},
				flags: [...hours.flags]
			}
		]
	};
}
