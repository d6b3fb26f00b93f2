import { sql } from 'drizzle-orm';
import type { YardDocument, YardPatch, YardSettings } from '../../api/yard/settings';
import { yardSettingsSchema } from '../../api/yard/settings';
import type { Membership } from '../access/roles';
import { changeRow, type ChangeResult } from '../db/changeRow';
import type { Database } from '../db/client';
import { yards, type Yard } from '../db/schema';
import { databaseStore, holdRefreshes } from '../forecast/databaseStore';

/** What a yard's managers settle, and what follows from changing it. */

const NAMES = Object.keys(yardSettingsSchema.shape) as (keyof YardSettings)[];

/** A yard as the API tells it. */
export function yardDocument(yard: Yard): YardDocument {
	const settings = Object.fromEntries(NAMES.map((name) => [name, yard[name]]));
	return { ...(settings as YardSettings), slug: yard.slug, revision: yard.revision };
}

export type YardChange = ChangeResult | { readonly outcome: 'busy'; readonly why: string };

const BUSY: YardChange = {
	outcome: 'busy',
	why: 'The forecast of the old place is being fetched just now. Nothing is saved yet: wait a minute and save again.'
};

/** Whether a change moves the yard, so that its weather is another's. */
const moves = (yard: Yard, { latitude, longitude, elevation }: Omit<YardPatch, 'revision'>) =>
	(latitude ?? yard.latitude) !== yard.latitude ||
	(longitude ?? yard.longitude) !== yard.longitude ||
	(elevation ?? yard.elevation) !== yard.elevation;

/**
 * Changes settings of a yard as its reader saw them. Kept hours are found again, since their keys
 * hold all they depend on; a yard that moves forgets its forecasts and asks for new ones.
 */
export async function changeYard(
	db: Database,
	{ yard }: Pick<Membership, 'yard'>,
	{ revision, ...values }: YardPatch
): Promise<YardChange> {
	const hasMoved = moves(yard, values);
	const provider = values.forecastProvider ?? yard.forecastProvider;
	const asksAnew = hasMoved || provider !== yard.forecastProvider;
	return db.transaction(async (tx) => {
		if (hasMoved && !(await holdRefreshes(tx, yard.id))) return BUSY;
		const result = await changeRow(tx, yards, yard.id, revision, values);
		if (result.outcome !== 'changed') return result;
		if (hasMoved) await databaseStore(tx).forget(yard.id);
		const payload = JSON.stringify({ yardId: yard.id });
		const task = asksAnew ? 'refreshForecast' : 'computeOutlook';
		const key = asksAnew ? `refresh ${yard.id}` : `outlook ${yard.id}`;
		await tx.execute(sql`select app_ask_worker(${task}, ${payload}::json, ${key})`);
		return result;
	});
}
