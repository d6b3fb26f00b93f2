import type { ForecastSource } from '../../api/hours';
import type { Forecast, Member } from '../../engine';
import type { Database } from '../db/client';
import { CREDITS } from './credit';
import { databaseStore } from './databaseStore';
import { HISTORY_SECONDS, missingHistory, withHistory, type EarlierRun } from './history';
import type { ForecastYard } from './refresh';
import type { ForecastStore, ProviderState, RunHead, RunHours, StoredRun } from './store';

export interface CurrentForecast {
	/** The stored run, with the hours before it from earlier runs; members only where asked for. */
	forecast: Forecast;
	/** Identifies the run. */
	runId: string;
	source: ForecastSource;
}

/** A forecast that was last known to be its provider's latest longer ago than this is stale. */
export const STALE_AFTER_MINUTES = 180;
/** A refresh is hourly and spread out: this much after its due time nobody is coming any more. */
const OVERDUE_MS = 45 * 60_000;
/** A run that began a few hours before the window can still fill its start. */
const EARLIEST_ISSUE_MS = (HISTORY_SECONDS + 6 * 3_600) * 1000;
const RUNS_AT_A_TIME = 8;

/**
 * The forecast a yard works with now: the latest run of its own provider while that one answers,
 * else of the other, else the last good one.
 *
 * `fetchedAt` and the age count from when the provider last said that this run is its latest, be
 * it by sending it or by confirming it.
 *
 * @param wanted - `members`: read the ensemble's members too, half a megabyte of them
 * @returns null when nothing was ever stored
 */
export function currentForecast(
	db: Database,
	yard: ForecastYard,
	now: Date,
	wanted?: Wanted
): Promise<CurrentForecast | null> {
	return currentFrom(databaseStore(db), yard, now, wanted);
}

interface Wanted {
	members: boolean;
}

/** `currentForecast` on a given store. */
export async function currentFrom(
	store: ForecastStore,
	yard: ForecastYard,
	now: Date,
	wanted: Wanted = { members: false }
): Promise<CurrentForecast | null> {
	const states = await store.states(yard.id);
	const candidates = (await store.latestRuns(yard.id)).map((run) =>
		known(
			run,
			states.find(({ provider }) => provider === run.provider),
			now
		)
	);
	const ownState = states.find(({ provider }) => provider === yard.forecastProvider);
	const chosen = choose(candidates, yard);
	if (chosen === undefined) return null;
	const run = await store.run(chosen.run.id);
	const asked = wanted.members && chosen.run.memberCount > 0;
	const members = asked ? await store.members(chosen.run.id) : null;
	// Pruned between two reads: only where a newer one has come.
	if (run === null || (asked && members === null)) return currentFrom(store, yard, now, wanted);
	return {
		forecast: await withStoredHistory(store, run, members),
		runId: run.id,
		source: describe(chosen, yard, ownState, now)
	};
}

interface Candidate {
	run: RunHead;
	confirmedAt: Date;
	/** Its provider should have been asked again by now and has not answered. */
	overdue: boolean;
}

function known(run: RunHead, state: ProviderState | undefined, now: Date): Candidate {
	const success = state?.lastSuccessAt ?? run.fetchedAt;
	const confirmedAt = success > run.fetchedAt ? success : run.fetchedAt;
	const due = state?.expiresAt ?? confirmedAt;
	return { run, confirmedAt, overdue: now.getTime() - due.getTime() > OVERDUE_MS };
}

function choose(candidates: Candidate[], yard: ForecastYard): Candidate | undefined {
	const isOwn = ({ run }: Candidate) => run.provider === yard.forecastProvider;
	const latestFirst = [...candidates].sort(
		(a, b) => b.confirmedAt.getTime() - a.confirmedAt.getTime()
	);
	const current = latestFirst.filter(({ overdue }) => !overdue);
	return current.find(isOwn) ?? current[0] ?? latestFirst[0];
}

async function withStoredHistory(
	store: ForecastStore,
	run: StoredRun,
	members: Member[] | null
): Promise<Forecast> {
	const seconds = (date: Date) => Math.floor(date.getTime() / 1000);
	const asEarlier = ({ issuedAt, hourly }: RunHours): EarlierRun => ({
		issuedAt: seconds(issuedAt),
		hourly
	});
	let forecast: Forecast = {
		...asEarlier(run),
		...(members === null ? {} : { members })
	};
	// Newest first and few at a time: one run of a provider with past hours fills the whole window.
	const since = new Date(run.issuedAt.getTime() - EARLIEST_ISSUE_MS);
	const earlier: EarlierRun[] = [];
	let before = run.fetchedAt;
	while (missingHistory(withHistory(forecast, earlier)).length > 0) {
		const runs = await store.earlierRuns(run.yardId, since, before, RUNS_AT_A_TIME);
		earlier.push(...runs.map(asEarlier));
		const oldest = runs.at(-1);
		if (oldest === undefined || runs.length < RUNS_AT_A_TIME) break;
		before = oldest.fetchedAt;
	}
	forecast = withHistory(forecast, earlier);
	return forecast;
}

function describe(
	{ run, confirmedAt, overdue }: Candidate,
	yard: ForecastYard,
	ownState: ProviderState | undefined,
	now: Date
): ForecastSource {
	const ageMinutes = Math.max(0, Math.floor((now.getTime() - confirmedAt.getTime()) / 60_000));
	const isOwn = run.provider === yard.forecastProvider;
	const origin = overdue ? 'lastGood' : isOwn ? 'provider' : 'fallback';
	const { label, attribution } = CREDITS[run.provider];
	const trouble =
		ownState?.trouble ??
		(isOwn
			? `No new forecast has been fetched from ${label}.`
			: `Nothing has been fetched from ${CREDITS[yard.forecastProvider].label} yet.`);
	return {
		provider: label,
		origin,
		issuedAt: run.issuedAt.toISOString(),
		fetchedAt: confirmedAt.toISOString(),
		ageMinutes,
		stale: ageMinutes > STALE_AFTER_MINUTES,
		attribution,
		members: run.memberCount,
		trouble: origin === 'provider' ? null : trouble
	};
}
