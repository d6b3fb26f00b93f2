import { eq } from 'drizzle-orm';
import type { Database } from '../db/client';
import { PROVIDERS, yards, type ProviderName, type Yard } from '../db/schema';
import { afterFailure, attemptsAllowed, CLOSED, isOpen } from './circuit';
import type { ForecastConfig } from './config';
import { CREDITS } from './credit';
import { databaseStore } from './databaseStore';
import { withOwnKey, type KeyConfig } from './keys';
import { HTTP_TOOLS, type HttpTools } from './http/tools';
import { metNorway } from './metNorway/provider';
import { openMeteo } from './openMeteo/provider';
import { NO_VALIDATORS, type FetchAnswer, type Provider } from './provider';
import type { ForecastStore, ProviderState, RunHead } from './store';
import { ForecastTrouble, type TroubleCode } from './trouble';

/** What a refresh needs to know of a yard. */
export type ForecastYard = Pick<
	Yard,
	'id' | 'latitude' | 'longitude' | 'elevation' | 'forecastProvider'
>;

export interface ForecastDeps {
	db: Database;
	config: ForecastConfig & KeyConfig;
	/** Clock, waiting, chance and time limits of the HTTP client, where they are not the usual ones. */
	http?: Partial<HttpTools>;
}

/** `ForecastDeps` with the parts built; what tests put their own parts into. */
export interface ForecastParts {
	store: ForecastStore;
	providers: Record<ProviderName, Provider>;
}

export interface ProviderTrouble {
	provider: ProviderName;
	code: TroubleCode;
	sentence: string;
}

/** How a refresh ended. `troubles` lists what went wrong on the way, in the order it was tried. */
export type RefreshResult = { troubles: ProviderTrouble[] } & (
	| { outcome: 'stored'; provider: ProviderName; runId: string; issuedAt: Date }
	/** The provider says that the stored run is still its latest. */
	| { outcome: 'confirmed'; provider: ProviderName; runId: string; issuedAt: Date }
	/** The provider may not be asked again yet; its stored run is still its latest. */
	| { outcome: 'notDue'; provider: ProviderName; until: Date }
	/** Another process is refreshing this yard, or it is being moved. */
	| { outcome: 'busy' }
	/** No provider answered; the last good run stays. */
	| { outcome: 'lastGood'; provider: ProviderName; runId: string; issuedAt: Date }
	/** No provider answered and nothing was ever stored. */
	| { outcome: 'none' }
);

/**
 * A provider that does not say for how long its answer holds is asked once an hour; a little under,
 * so that an hourly job that comes early by chance is not turned away.
 */
const USUAL_LIFETIME_MS = 50 * 60_000;

const asDate = (epochSeconds: number): Date => new Date(epochSeconds * 1000);
const asSeconds = (date: Date): number => Math.floor(date.getTime() / 1000);

/**
 * Fetches a forecast for a yard: its own provider first, then the other one, else the last good run
 * stays. Safe to call from many processes at once: one of them does it, the others are told `busy`.
 * A database connection is held meanwhile, for about a minute at the very most.
 *
 * @throws what is no expected failure of a provider: a lost database, a fault of our own
 */
export async function refreshForecast(
	deps: ForecastDeps,
	yard: ForecastYard,
	now: Date
): Promise<RefreshResult> {
	const tools = { ...HTTP_TOOLS, ...deps.http };
	const config = await withOwnKey(deps.db, deps.config, yard.id);
	return refreshWith(
		{
			store: whereItStands(deps.db, yard),
			providers: {
				'open-meteo': openMeteo(config, tools),
				'met-norway': metNorway(config, tools)
			}
		},
		yard,
		now
	);
}

/** The store, shut to a yard that has moved since it was read: its weather would be another place's. */
function whereItStands(db: Database, yard: ForecastYard): ForecastStore {
	const store = databaseStore(db);
	return {
		...store,
		withYardLock: (id, work) =>
			store.withYardLock(id, async (locked) => {
				const [now] = await db.select().from(yards).where(eq(yards.id, id));
				const stands =
					now?.latitude === yard.latitude &&
					now.longitude === yard.longitude &&
					now.elevation === yard.elevation;
				return stands ? work(locked) : null;
			})
	};
}

/** `refreshForecast` on given parts. */
export async function refreshWith(
	{ store, providers }: ForecastParts,
	yard: ForecastYard,
	now: Date
): Promise<RefreshResult> {
	const result = await store.withYardLock(yard.id, (locked) =>
		refreshLocked({ store: locked, providers }, yard, now)
	);
	return result ?? { outcome: 'busy', troubles: [] };
}

async function refreshLocked(
	{ store, providers }: ForecastParts,
	yard: ForecastYard,
	now: Date
): Promise<RefreshResult> {
	const states = await store.states(yard.id);
	const latest = await store.latestRuns(yard.id);
	const troubles: ProviderTrouble[] = [];
	const own = yard.forecastProvider;
	for (const name of [own, ...PROVIDERS.filter((other) => other !== own)]) {
		const state = states.find(({ provider }) => provider === name) ?? freshState(yard.id, name);
		const run = latest.find(({ provider }) => provider === name) ?? null;
		if (run !== null && state.expiresAt !== null && state.expiresAt > now)
			return { outcome: 'notDue', provider: name, until: state.expiresAt, troubles };
		try {
			return {
				...(await ask({ store, provider: providers[name], yard, state, run, now })),
				troubles
			};
		} catch (error) {
			if (!(error instanceof ForecastTrouble)) throw error;
			troubles.push({ provider: name, code: error.code, sentence: error.message });
			if (error.code === 'circuitOpen') continue;
			await store.saveState({
				...state,
				...afterFailure(state, error, now),
				trouble: error.message,
				troubleAt: now
			});
		}
	}
	const [good] = latest.sort((a, b) => b.fetchedAt.getTime() - a.fetchedAt.getTime());
	return good === undefined
		? { outcome: 'none', troubles }
		: { outcome: 'lastGood', ...identified(good), troubles };
}

const freshState = (yardId: string, provider: ProviderName): ProviderState => ({
	yardId,
	provider,
	...NO_VALIDATORS,
	...CLOSED,
	expiresAt: null,
	lastSuccessAt: null,
	trouble: null,
	troubleAt: null
});

const identified = ({ id, provider, issuedAt }: RunHead) => ({ provider, runId: id, issuedAt });

interface Asking {
	store: ForecastStore;
	provider: Provider;
	yard: ForecastYard;
	state: ProviderState;
	run: RunHead | null;
	now: Date;
}

/** @throws {ForecastTrouble} when the provider gives nothing to use */
async function ask({ store, provider, yard, state, run, now }: Asking) {
	if (isOpen(state, now))
		throw new ForecastTrouble(
			'circuitOpen',
			`${CREDITS[provider.name].label} is left alone until ${state.openUntil?.toISOString().slice(0, 16) ?? ''}Z after ${state.failures} failures: ${state.trouble ?? ''}`
		);
	const answer = await provider.fetch({
		place: { latitude: yard.latitude, longitude: yard.longitude, elevation: yard.elevation },
		now: asSeconds(now),
		validators: run === null ? NO_VALIDATORS : state,
		attempts: attemptsAllowed(state)
	});
	if (answer.kind === 'unchanged') {
		// Only a stored run makes a request conditional.
		if (run === null) throw new Error(`${provider.name} confirmed a run that is not stored.`);
		await store.saveState({ ...afterSuccess(state, answer, now), trouble: null, troubleAt: null });
		return { outcome: 'confirmed' as const, ...identified(run) };
	}
	const { forecast, shortfall } = answer;
	const issuedAt = asDate(forecast.issuedAt);
	const runId = await store.addRun({
		yardId: yard.id,
		provider: provider.name,
		issuedAt,
		fetchedAt: now,
		hourly: forecast.hourly,
		members: forecast.members ?? null
	});
	await store.saveState({
		...afterSuccess(state, answer, now),
		trouble: shortfall,
		troubleAt: shortfall === null ? null : now
	});
	await store.prune(yard.id, now);
	return { outcome: 'stored' as const, provider: provider.name, runId, issuedAt };
}

function afterSuccess(state: ProviderState, answer: FetchAnswer, now: Date): ProviderState {
	return {
		...state,
		...CLOSED,
		...answer.validators,
		expiresAt:
			answer.expiresAt === null
				? new Date(now.getTime() + USUAL_LIFETIME_MS)
				: asDate(answer.expiresAt),
		lastSuccessAt: now
	};
}
