import { and, eq } from 'drizzle-orm';
import type { Membership } from '../access/roles';
import type { Database } from '../db/client';
import { forecastKeys } from '../db/schema';
import type { ForecastConfig } from './config';
import { seal, unseal } from './sealedKey';

/** A yard's own key of Open-Meteo's paid plan. No load or route tells it: only that there is one. */

const PROVIDER = 'open-meteo';
const purposeOf = (yardId: string): string => `${PROVIDER} ${yardId}`;
const ofYard = (yardId: string) =>
	and(eq(forecastKeys.yardId, yardId), eq(forecastKeys.provider, PROVIDER));

/** The installation's secret; without one no yard can give a key. */
export interface KeyConfig {
	KEYS_SECRET?: string | undefined;
}

/** Whether a yard has a key of its own, since when and by whom; null without one. */
export async function keyOfYard(db: Database, { yard }: Membership) {
	const { setAt, setBy } = forecastKeys;
	const [key] = await db.select({ setAt, setBy }).from(forecastKeys).where(ofYard(yard.id));
	return key ?? null;
}

/** Gives a yard a key, in place of any it had. */
export async function giveKey(
	db: Database,
	{ yard, user }: Membership,
	secret: string,
	key: string
): Promise<void> {
	const sealed = {
		sealed: seal(secret, purposeOf(yard.id), key),
		setAt: new Date(),
		setBy: user.name
	};
	await db
		.insert(forecastKeys)
		.values({ yardId: yard.id, provider: PROVIDER, ...sealed })
		.onConflictDoUpdate({ target: [forecastKeys.yardId, forecastKeys.provider], set: sealed });
}

/** Takes a yard's key away. */
export async function takeKey(db: Database, { yard }: Membership): Promise<void> {
	await db.delete(forecastKeys).where(ofYard(yard.id));
}

/** The configuration a yard's forecasts are asked with: its own key, at the address where that is good. */
export async function withOwnKey(
	db: Database,
	config: ForecastConfig & KeyConfig,
	yardId: string
): Promise<ForecastConfig> {
	if (config.KEYS_SECRET === undefined) return config;
	const [row] = await db
		.select({ sealed: forecastKeys.sealed })
		.from(forecastKeys)
		.where(ofYard(yardId));
	const key = row === undefined ? null : unseal(config.KEYS_SECRET, purposeOf(yardId), row.sealed);
	if (key === null) return config;
	return {
		...config,
		OPEN_METEO_KEY: key,
		OPEN_METEO_URL: config.OPEN_METEO_CUSTOMER_URL,
		OPEN_METEO_ENSEMBLE_URL: config.OPEN_METEO_CUSTOMER_ENSEMBLE_URL
	};
}
