import type { OutlookRequest } from '../../api/outlook/request';
import type { OutlookResponse } from '../../api/outlook/response';
import {
	flagNames,
	instantText,
	jobOutlook,
	LIMITERS,
	SAND_STATES,
	SLOT_SECONDS,
	STATES,
	workWind,
	yardWeather,
	type Job,
	type StepOutlook,
	type YardWeather
} from '../../engine';
import { tellPlan, tellRemedies, tellWarning } from './statelessPlans';

/** The slots an answer tells, and their names. */
interface AnswerSpan {
	readonly slots: readonly number[];
	readonly end: number;
	readonly at: (slot: number) => string;
	readonly series: (values: Float64Array | Float32Array) => (number | null)[];
}

function spanOf(
	{ weather: { grid } }: YardWeather,
	from: number,
	to: number | undefined
): AnswerSpan {
	const first = Math.max(0, Math.floor((from - grid.start) / SLOT_SECONDS));
	const end =
		to === undefined
			? grid.count
			: Math.min(grid.count, Math.ceil((to - grid.start) / SLOT_SECONDS));
	const slots = Array.from({ length: Math.max(0, end - first) }, (_, i) => first + i);
	return {
		slots,
		end,
		at: (slot) => instantText(grid.start + slot * SLOT_SECONDS),
		series: (values) => slots.map((slot) => (Number.isFinite(values[slot]) ? values[slot] : null))
	};
}

function tellSlots(
	{ weather, site }: YardWeather,
	{ faces, step }: StepOutlook,
	{ slots, at, series }: AnswerSpan
): OutlookResponse['slots'] {
	const [shown] = faces[0].sides;
	const wind = workWind(shown, site, step.limits.windHeight);
	return {
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
	};
}

function tellStep(
	{ hours, chances }: StepOutlook,
	{ slots, end, at, series }: AnswerSpan
): OutlookResponse['steps'][number] {
	const chanceOf = (start: number): number | null =>
		chances === null ? null : chances.starts[start] / chances.members;
	const { best } = hours;
	return {
		state: slots.map((slot) => STATES[hours.state[slot]]),
		limiter: slots.map((slot) => LIMITERS[hours.limiter[slot]]),
		room: series(hours.room),
		chance: chances === null ? null : slots.map((slot) => chances.slots[slot] / chances.members),
		stretches: hours.stretches
			.filter((stretch) => stretch.from < end)
			.map((stretch) => ({
				from: at(stretch.from),
				to: at(stretch.to),
				lastStart: at(stretch.lastStart),
				bestStart: at(stretch.bestStart),
				room: stretch.room,
				chance: chanceOf(stretch.bestStart)
			})),
		best:
			best === null || best.start >= end
				? null
				: {
						start: at(best.start),
						finish: at(best.finish),
						room: best.room,
						limiter: best.limiter,
						chance: chanceOf(best.start)
					},
		flags: [...hours.flags]
	};
}

/** The steps of a request as a job on its one face. */
function jobOf({ steps, face, shelter, readings, ...request }: OutlookRequest): Job {
	const under = { id: 'face', face, shelter, ...(readings === undefined ? {} : { readings }) };
	return {
		steps: steps.map(({ startAt, finishedAt, ...step }) => ({
			step,
			faces: [under],
			...(startAt === undefined ? {} : { startAt }),
			...(finishedAt === undefined ? {} : { finishedAt })
		})),
		launch: {
			launchBy: request.launchBy,
			launchSlots: request.launchSlots,
			dayRate: request.dayRate
		}
	};
}

/** A chain judged in a forecast that came with the request; nothing is read or stored. */
export function answerOutlook(request: OutlookRequest): OutlookResponse {
	const { site, forecast, usualErrors, looseSand } = request;
	const yard = yardWeather({
		site,
		forecast,
		looseSand: looseSand ?? null,
		from: request.from,
		to: request.to
	});
	const from = request.from ?? Math.max(forecast.issuedAt, forecast.hourly.time[0]);
	const job = jobOf(request);
	const outlook = jobOutlook(yard, job, { from, usualErrors });
	const span = spanOf(yard, from, request.to);
	const { soonest, surest, byDate } = outlook.plans;
	return {
		slots: tellSlots(yard, outlook.steps[0], span),
		steps: outlook.steps.map((step) => tellStep(step, span)),
		plans: { soonest: tellPlan(soonest), surest: tellPlan(surest), byDate: tellPlan(byDate) },
		warnings: outlook.warnings.map(tellWarning),
		remedies: tellRemedies(yard, outlook, request, from, span.end)
	};
}
