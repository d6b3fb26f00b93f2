import { checkUnits, formatTrouble, toCanonical } from '../canonical';
import type { ForecastConfig } from '../config';
import { CREDITS } from '../credit';
import { askJson } from '../http/ask';
import type { HttpTools } from '../http/tools';
import type { FetchAnswer, FetchRequest, ForecastPlace, Provider } from '../provider';
import { ForecastTrouble } from '../trouble';
import { userAgent } from '../userAgent';
import { answerSchema, UNITS, type Entry } from './answer';
import { toHours } from './hours';

const HOUR_SECONDS = 3_600;
/**
 * Outside the Nordic and Arctic areas a forecast is renewed four times a day (Locationforecast data
 * model); one that missed two renewals is refused.
 */
const MAX_ISSUE_AGE_SECONDS = 18 * HOUR_SECONDS;
/** Clocks may differ by this much before an issue counts as coming from the future. */
const CLOCK_TOLERANCE_SECONDS = 600;

const { label } = CREDITS['met-norway'];

/**
 * MET Norway's Locationforecast 2.0, "complete". No members, no past hours (history comes from
 * earlier runs), no irradiance.
 */
export function metNorway(config: ForecastConfig, tools: HttpTools): Provider {
	async function fetch(request: FetchRequest): Promise<FetchAnswer> {
		if (config.FORECAST_CONTACT === '')
			throw new ForecastTrouble(
				'noContact',
				`${label} asks for a contact address with every request, and FORECAST_CONTACT is not set.`
			);
		const answer = await askJson(
			{
				url: address(config.MET_NORWAY_URL, request.place),
				provider: label,
				userAgent: userAgent(config.FORECAST_CONTACT),
				validators: request.validators,
				attempts: request.attempts
			},
			tools
		);
		const head = { expiresAt: answer.expiresAt, validators: answer.validators };
		if (answer.kind === 'unchanged') return { ...head, kind: 'unchanged' };
		return {
			...head,
			kind: 'forecast',
			forecast: readForecast(answer.body, request),
			shortfall: answer.deprecated ? `${label} is about to end this version of its service.` : null
		};
	}

	return { name: 'met-norway', fetch };
}

/** Coordinates cut to four decimals and whole metres, as the terms of service ask. */
function address(base: string, place: ForecastPlace): URL {
	const cut = (degrees: number) => String(Math.trunc(degrees * 1e4) / 1e4);
	const url = new URL('/weatherapi/locationforecast/2.0/complete', base);
	url.searchParams.set('lat', cut(place.latitude));
	url.searchParams.set('lon', cut(place.longitude));
	url.searchParams.set('altitude', String(Math.round(place.elevation)));
	return url;
}

/** Names of the values that occur: a region without a variable need not declare its unit. */
function usedNames(entries: readonly Entry[]): Set<string> {
	return new Set(
		entries.flatMap(({ data }) =>
			[data.instant, data.next_1_hours, data.next_6_hours, data.next_12_hours].flatMap((part) =>
				Object.keys(part?.details ?? {})
			)
		)
	);
}

function readForecast(body: unknown, { place, now }: FetchRequest) {
	const parsed = answerSchema.safeParse(body);
	if (!parsed.success) throw formatTrouble(parsed.error, label);
	const { meta, timeseries } = parsed.data.properties;
	const used = usedNames(timeseries);
	checkUnits(
		meta.units,
		Object.entries(UNITS).filter(([name]) => used.has(name)),
		label
	);
	const issuedAt = Math.floor(Date.parse(meta.updated_at) / 1000);
	const forecast = toCanonical({ issuedAt, hourly: toHours(timeseries, place.elevation) }, label);
	const age = now - issuedAt;
	if (age > MAX_ISSUE_AGE_SECONDS || (forecast.hourly.time.at(-1) ?? 0) <= now)
		throw new ForecastTrouble(
			'staleIssue',
			`${label} sent a forecast issued ${Math.round(age / HOUR_SECONDS)} h ago.`
		);
	if (-age > CLOCK_TOLERANCE_SECONDS)
		throw new ForecastTrouble('staleIssue', `${label} sent a forecast issued in the future.`);
	return forecast;
}
