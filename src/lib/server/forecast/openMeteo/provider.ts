import { HOURLY_VARIABLES, type Forecast, type Hourly, type Member } from '../../../engine';
import { toCanonical } from '../canonical';
import type { ForecastConfig } from '../config';
import { CREDITS } from '../credit';
import { askJson, type Ask } from '../http/ask';
import type { HttpTools } from '../http/tools';
import { NO_VALIDATORS, type FetchAnswer, type FetchRequest, type Provider } from '../provider';
import { ForecastTrouble } from '../trouble';
import { userAgent } from '../userAgent';
import { readHours } from './answer';
import { MEMBER_NAMES, readMembers } from './members';
import { ensembleUrl, FORECAST_DAYS, forecastUrl, PAST_DAYS } from './request';
import { FORECAST_VARIABLES } from './variables';

const DAY_SECONDS = 86_400;
const HOUR_SECONDS = 3_600;
/** An answer that a cache on the way has kept longer than this is refused (default, no source). */
const MAX_ANSWER_AGE_SECONDS = 3 * HOUR_SECONDS;
/** Clocks may differ by this much before an answer counts as coming from the future. */
const CLOCK_TOLERANCE_SECONDS = 600;

const { label } = CREDITS['open-meteo'];

/**
 * Open-Meteo: the forecast, with the members of its ensemble service where that answers too.
 *
 * The service does not say when its models were run; the answer's own date stands for the time of
 * issue, which is also where its history ends and its forecast begins.
 */
export function openMeteo(config: ForecastConfig, tools: HttpTools): Provider {
	const key = config.OPEN_METEO_KEY;
	const ask = (url: URL, request: FetchRequest, more: Partial<Ask> = {}) =>
		askJson(
			{
				url,
				provider: label,
				userAgent: userAgent(config.FORECAST_CONTACT),
				validators: request.validators,
				attempts: request.attempts,
				...more
			},
			tools
		);

	async function fetch(request: FetchRequest): Promise<FetchAnswer> {
		const { place, now } = request;
		const names = HOURLY_VARIABLES.map((canonical) => FORECAST_VARIABLES[canonical][0]);
		const answer = await ask(
			forecastUrl({ base: config.OPEN_METEO_URL, key }, place, names),
			request
		);
		const head = { expiresAt: answer.expiresAt, validators: answer.validators };
		if (answer.kind === 'unchanged') return { ...head, kind: 'unchanged' };

		const hourly = readForecastHours(answer.body);
		const issuedAt = issueTime(answer.date, hourly.time, now);
		const { members, shortfall } = await fetchMembers(request, hourly.time);
		return {
			...head,
			kind: 'forecast',
			forecast: toCanonical({ issuedAt, hourly, members }, label),
			shortfall
		};
	}

	/** A forecast without members is still a forecast: their trouble is said, not thrown. */
	async function fetchMembers(
		request: FetchRequest,
		time: number[]
	): Promise<{ members: Member[]; shortfall: string | null }> {
		const provider = `${label}'s ensemble`;
		const url = ensembleUrl(
			{ base: config.OPEN_METEO_ENSEMBLE_URL, key },
			request.place,
			MEMBER_NAMES
		);
		try {
			const answer = await ask(url, request, { provider, validators: NO_VALIDATORS });
			if (answer.kind === 'unchanged') return { members: [], shortfall: null };
			return { members: readMembers(answer.body, provider, time), shortfall: null };
		} catch (error) {
			if (!(error instanceof ForecastTrouble)) throw error;
			return { members: [], shortfall: `${error.message} There are no members.` };
		}
	}

	return { name: 'open-meteo', fetch };
}

function readForecastHours(body: unknown): Hourly {
	const { time, series } = readHours(body, label, Object.values(FORECAST_VARIABLES));
	const hourly: Forecast['hourly'] = { time };
	for (const canonical of HOURLY_VARIABLES)
		hourly[canonical] = series.get(FORECAST_VARIABLES[canonical][0]);
	return hourly;
}

/**
 * When an answer was made, UTC epoch seconds, never later than now.
 *
 * @throws {ForecastTrouble} `staleIssue` when it was made too long ago or for other days than asked
 */
function issueTime(date: number | null, time: number[], now: number): number {
	const made = date ?? now;
	if (now - made > MAX_ANSWER_AGE_SECONDS)
		throw new ForecastTrouble(
			'staleIssue',
			`${label} sent an answer made ${Math.round((now - made) / HOUR_SECONDS)} h ago.`
		);
	if (made - now > CLOCK_TOLERANCE_SECONDS)
		throw new ForecastTrouble('staleIssue', `${label} sent an answer dated in the future.`);
	// Its day may just have ended, or not yet begun, by the provider's clock.
	const firstAsked = Math.floor(now / DAY_SECONDS) * DAY_SECONDS - PAST_DAYS * DAY_SECONDS;
	const first = time[0] ?? 0;
	const last = time.at(-1) ?? 0;
	if (Math.abs(first - firstAsked) > DAY_SECONDS || last <= now)
		throw new ForecastTrouble(
			'staleIssue',
			`${label} sent other days than the ${PAST_DAYS + FORECAST_DAYS} that were asked for.`
		);
	return Math.min(made, now);
}
